import { createHash, randomBytes } from 'node:crypto';

/** A new secret of 256 random bits, safe in an address and in a header. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** What is kept of a secret. It has 256 random bits, so a plain hash cannot be turned back. */
export const hashSecret = (secret: string): string => createHash('sha256').update(secret).digest('hex');
