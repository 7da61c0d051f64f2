import 'server-only';
import { hash, verify } from '@node-rs/argon2';
import { longestPassword } from './password-length';

/** The package's number for argon2id; its enum is not there at run time. */
const argon2id = 2;

// 19 MiB, two passes, one lane: the least that the OWASP password storage notes ask of argon2id.
const settings = { algorithm: argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string): Promise<string> => hash(password.normalize('NFC'), settings);

/** Whether a password is the one that was hashed. Without a hash it takes as long and says no. */
export async function isPassword(password: string, hashed: string | undefined): Promise<boolean> {
  decoy ??= hashPassword('no account has this password');
  const right = await verify(hashed ?? (await decoy), password.slice(0, longestPassword + 1).normalize('NFC'));
  return right && hashed !== undefined;
}

let decoy: Promise<string> | undefined;
