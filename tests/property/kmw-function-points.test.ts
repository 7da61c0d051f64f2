import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readElement } from '@/grammar/read';
import { expectVerdict, normalText, readForm, verdict, whereDefined } from './kmw-engine';
import { functionRows, unitsOf } from './kmw-function-fields';
import { difference, substitute, word } from './kmw-words';

/** Points at which an equality over k(t) is looked at: elements of k and of extensions, as t ↦ value over a field. */
const points: Readonly<Record<string, readonly (readonly [field: string, t: string])[]>> = {
  'F_2(t)': [
    ['F_2', '1'],
    ['F_8', 'z'],
    ['F_2[y]/(y^5+y^2+1)', 'y^3+1'],
  ],
  'F_3(t)': [
    ['F_3', '2'],
    ['F_9', 'z+1'],
    ['F_3[y]/(y^3+2y+1)', 'y'],
    ['F_3(t)', 't^2-t+1'],
  ],
  'F_4(t)': [
    ['F_4', 'z'],
    ['F_4[y]/(y^2+y+z)', 'y+z'],
  ],
  'F_7(t)': [
    ['F_7', '3'],
    ['F_49', 'z'],
    ['F_7(t)', '1/(t^3+2)'],
  ],
  'F_9(t)': [
    ['F_9', 'z'],
    ['F_9[y]/(y^2+z+1)', 'y'],
  ],
  'Q(t)': [
    ['Q', '7/3'],
    ['Q', '-19'],
    ['R', '5/11'],
    ['Q_2', '6'],
    ['F_101', '17'],
    ['Q[w]/(w^2+5)', 'w+3'],
    ['Q(t)', '2t^2-3'],
  ],
};

/** An equality over k(t) holds at every point at which its entries are units: the specialisation is a ring map. */
describe.each(functionRows.map((row) => [row.name, row] as const))('over %s', (name, row) => {
  const small = word(unitsOf(row), { terms: 2, factors: 2, nested: false });

  it('a canonical form is the same element at every point', () => {
    let seen = 0;
    fc.assert(
      fc.property(small, (u) => {
        const form = readForm(normalText(name, u).text);
        for (const [field, t] of points[name] ?? []) {
          const at = new Map([['t', readElement(t)]]);
          const defined = whereDefined(() => verdict(field, substitute(u, at), substitute(form, at)));
          if (defined === undefined) continue;
          seen += 1;
          expect(defined).not.toBe('different');
        }
      }),
      { numRuns: 40 },
    );
    expect(seen).toBeGreaterThan(20);
  });

  it('what is called equal is equal at every point, and what differs at a point is not called equal', () => {
    const counts = { equal: 0, different: 0 };
    fc.assert(
      fc.property(small, small, fc.integer({ min: 0, max: 3 }), (u, v, n) => {
        // a multiple of a word that is often torsion, so that both verdicts are met
        const difference_ = {
          kind: 'product',
          factors: [{ kind: 'integer', value: BigInt(n) }, difference(u, v)],
        } as const;
        const judged = verdict(name, difference_, '0');
        if (judged !== 'undecided') counts[judged] += 1;
        for (const [field, t] of points[name] ?? []) {
          const at = new Map([['t', readElement(t)]]);
          const there = whereDefined(() => verdict(field, substitute(difference_, at), '0'));
          if (judged === 'equal' && there !== undefined) expect(there).not.toBe('different');
          if (there === 'different') expectVerdict('different', name, difference_, '0');
        }
      }),
      { numRuns: 40 },
    );
    expect(counts.equal).toBeGreaterThan(3);
    expect(counts.different).toBeGreaterThan(3);
  });
});
