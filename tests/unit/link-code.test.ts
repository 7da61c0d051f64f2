import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { isCode, linkCode } from '@/lib/links/code';

describe('codes of links', () => {
  test('the same statement over the same field has the same code, ten letters of the alphabet', () => {
    fc.assert(
      fc.property(fc.string(), fc.string(), (field, statement) => {
        const code = linkCode(field, statement);
        expect(code).toMatch(/^[0-9abcdefghjkmnpqrstvwxyz]{10}$/);
        expect(isCode(code)).toBe(true);
        expect(linkCode(field, statement)).toBe(code);
      }),
    );
  });

  test('a longer code begins with the shorter one', () => {
    for (const length of [11, 20, 51])
      expect(linkCode('Q', '[2] = [2]', length).startsWith(linkCode('Q', '[2] = [2]'))).toBe(true);
  });

  test('where the field ends and the statement begins makes a difference', () => {
    expect(linkCode('Q', '_2')).not.toBe(linkCode('Q_2', ''));
  });

  test('the letters are the leading bits of the digest, five each', () => {
    // SHA-256 of ["Q","h"] by coreutils: printf '["Q","h"]' | sha256sum
    const digest = BigInt('0x286bd08fdd7236c7e0a58710bdadb43acaedf0ee6e56cf07eafa985bd548f069');
    const alphabet = '0123456789abcdefghjkmnpqrstvwxyz';
    const bits = digest.toString(2).padStart(256, '0');
    const letters = Array.from(
      { length: 10 },
      (_, index) => alphabet[parseInt(bits.slice(5 * index, 5 * index + 5), 2)],
    );
    expect(linkCode('Q', 'h')).toBe(letters.join(''));
  });

  test.each(['', 'short', 'yzkaaz5e9', 'YZKAAZ5E95', 'yzkaaz5e9i', 'yzkaaz5e9u', '../../etc0', 'a'.repeat(52)])(
    '%j is none',
    (text) => {
      expect(isCode(text)).toBe(false);
    },
  );
});
