import { createHash } from 'node:crypto';

/** Digits and letters without i, l, o and u: nothing that is misread, nothing that spells a word by accident. */
const alphabet = '0123456789abcdefghjkmnpqrstvwxyz';

export const shortestCode = 10;
/** A SHA-256 has 256 bits, so 51 letters of five bits each. */
export const longestCode = 51;

/** Whether a text can be a code at all. */
export const isCode = (text: string): boolean => /^[0-9a-hjkmnp-tv-z]{10,51}$/.test(text);

/**
 * The code of a statement over a field: the first `length` letters (10 to 51) of the SHA-256 of both, in base 32.
 * The same two texts have the same code on every machine.
 */
export function linkCode(field: string, statement: string, length = shortestCode): string {
  const digest = createHash('sha256')
    .update(JSON.stringify([field, statement]))
    .digest('hex');
  const number = BigInt(`0x${digest}`);
  let code = '';
  for (let index = 0; index < length; index += 1) {
    code += alphabet[Number((number >> BigInt(251 - 5 * index)) & 31n)];
  }
  return code;
}
