import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bracketPartners, tokenize } from '@/grammar/tokens';

const kinds = (text: string): string =>
  tokenize(text)
    .filter((token) => token.kind !== 'blank')
    .map((token) => `${text.slice(token.start, token.end)}:${token.bracket ?? token.kind}`)
    .join(' ');

describe('pieces of a text', () => {
  it.each([
    ['2eta[t2]', '2:number eta:word [:symbol t2:letter ]:symbol'],
    ['<<a>>', '<<:pfister a:letter >>:pfister'],
    ['<a>>', '<:angle a:letter >:angle >:angle'],
    ['\\langle\\!\\langle a\\rangle\\!\\rangle', '\\langle\\!\\langle:pfister a:letter \\rangle\\!\\rangle:pfister'],
    ['\\langle ab\\rangle', '\\langle:angle a:letter b:letter \\rangle:angle'],
    ['h[h]', 'h:word [:symbol h:letter ]:symbol'],
    ['eta eps', 'eta:word eps:word'],
    ['[a] ; char != 2', '[:symbol a:letter ]:symbol ;:semicolon char:word !=:unequal 2:number'],
    ['foo', 'foo:letter'],
    ['@', '@:other'],
  ])('%s', (text, wanted) => {
    expect(kinds(text)).toBe(wanted);
  });

  it('entries are told from the rest', () => {
    const text = '2[a(b+1)] + <c>';
    const inside = tokenize(text)
      .filter((token) => token.inEntry && token.kind !== 'open' && token.kind !== 'close')
      .map((token) => text.slice(token.start, token.end));
    expect(inside).toEqual(['a', 'b', '+', '1', 'c']);
  });

  it('brackets find their partners, and a bracket left open has none', () => {
    const text = '([a) + <<b>>';
    const tokens = tokenize(text);
    const partners = bracketPartners(tokens);
    const pairs = partners.flatMap((partner, i) =>
      partner !== undefined && i < partner ? [text.slice(tokens[i]?.start, tokens[partner]?.end)] : [],
    );
    expect(pairs).toEqual(['<<b>>']);
    expect(bracketPartners(tokenize('([a]+(h))'))).toEqual([8, 3, undefined, 1, undefined, 7, undefined, 5, 0]);
  });

  it('any text is cut into pieces without gaps', () => {
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string({ unit: 'binary' }),
          fc
            .array(fc.constantFrom('[', ']', '<', '<<', '>', '\\', 'eta', 'a', '_', '^', '{', '$', ' ', '1', '.'))
            .map((p) => p.join('')),
        ),
        (text) => {
          const tokens = tokenize(text);
          expect(tokens.map((token) => text.slice(token.start, token.end)).join('')).toBe(text);
          expect(tokens.every((token) => token.end > token.start)).toBe(true);
        },
      ),
    );
  });
});
