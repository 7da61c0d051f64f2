import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { product, sum } from '@/engine/expression/expression';
import { canonicalForm, canonicalText, expectVerdict, normalText, readForm, verdict, whereDefined } from './kmw-engine';
import { fieldRows } from './kmw-fields';
import { fits, identities, integers, relations, sideOf } from './kmw-identities';
import { difference, substitute, word } from './kmw-words';

describe.each(fieldRows.map((row) => [row.label, row] as const))('canonical forms over %s', (_, row) => {
  const { name, unit, conditions, canonical } = row;
  const small = word(unit, { terms: 3, factors: 3, nested: false });
  const rows = [...relations, ...identities].filter((identity) => fits(identity, row));

  it('read back as the same element, and are their own canonical form where that is promised', () => {
    fc.assert(
      fc.property(word(unit), (u) => {
        const { text, canonical: promised } = normalText(name, u, conditions);
        const form = readForm(text);
        expectVerdict('equal', name, u, form, conditions);
        if (text !== '') expect(promised).toBe(canonical);
        if (canonical) expect(canonicalText(name, form, conditions)).toBe(text);
      }),
      { numRuns: 30 },
    );
  });

  if (canonical)
    it('agree after a relation or an identity was used inside a word', () => {
      const instance = fc.record({
        identity: fc.constantFrom(...rows),
        numbers: integers,
        at: fc.tuple(unit, unit, unit).map(
          ([a, b, c]) =>
            new Map([
              ['a', a],
              ['b', b],
              ['c', c],
            ]),
        ),
        u: small,
        w: small,
      });
      fc.assert(
        fc.property(instance, ({ identity, numbers, at, u, w }) => {
          const [left, right] = [identity.left, identity.right].map((side) => substitute(sideOf(side, numbers), at));
          const texts = whereDefined(() =>
            [left, right].map((side) => canonicalText(name, sum([w, product([u, side ?? w])]), conditions)),
          );
          fc.pre(texts !== undefined);
          expect(texts?.[0]).toBe(texts?.[1]);
        }),
        { numRuns: 25 },
      );
    });

  if (canonical)
    it('are the same texts exactly where the words are equal', () => {
      const rather = word(unit, { terms: 1, factors: 2, nested: false });
      const verdicts = { equal: 0, different: 0, undecided: 0 };
      fc.assert(
        fc.property(rather, rather, (u, v) => {
          const judged = verdict(name, u, v, conditions);
          verdicts[judged] += 1;
          const same = canonicalText(name, u, conditions) === canonicalText(name, v, conditions);
          expect(same).toBe(judged === 'equal');
        }),
        { numRuns: 60 },
      );
      expect(verdicts.undecided).toBe(0);
      expect(verdicts.different).toBeGreaterThan(10);
    });

  if (canonical)
    it('of a sum, a product and a difference are those of the canonical forms', () => {
      fc.assert(
        fc.property(small, small, (u, v) => {
          const [x, y] = [canonicalForm(name, u, conditions), canonicalForm(name, v, conditions)];
          const text = (e: typeof u): string => canonicalText(name, e, conditions);
          expect(text(sum([x, y]))).toBe(text(sum([u, v])));
          expect(text(product([x, y]))).toBe(text(product([u, v])));
          expect(text(difference(u, x))).toBe('');
        }),
        { numRuns: 15 },
      );
    });
});
