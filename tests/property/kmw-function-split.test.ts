import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { negate, product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { expressionText } from '@/engine/expression/to-text';
import { readElement, readExpression } from '@/grammar/read';
import { canonicalText, expectVerdict, normalText, readForm, verdict } from './kmw-engine';
import { fieldRow } from './kmw-fields';
import { atPlace, functionRows, lifted, residuesOver, unitsOf } from './kmw-function-fields';
import { homogeneous } from './kmw-words';

const degreeOf = (place: string): number => Number(/\^(\d)/.exec(place)?.[1] ?? 1);
const above = (place: string, residue: Expression): Expression => product([symbol([readElement(place)]), residue]);

/**
 * 0 → K^MW_n(k) → K^MW_n(k(t)) → ⊕_P K^MW_{n−1}(k[t]/P) → 0 is split exact, by the specialisation at infinity (J. Milnor, Invent. Math. 9, 1970,
 * Theorem 2.3; F. Morel, LNM 2052, Theorem 3.24, number from memory).
 */
describe.each(functionRows.map((row) => [row.name, row] as const))('over %s', (_, row) => {
  const { name, base, top } = row;
  const finite = row.places.filter(({ t }) => t !== undefined);
  const downwards = [...finite].sort((a, b) => degreeOf(b.place) - degreeOf(a.place));
  const constantUnit = fieldRow(base).unit;
  const degrees = Array.from({ length: top + 3 }, (_unused, i) => i - 2);

  it.each(degrees)('in degree %i prescribed residues and constants are hit', (n) => {
    /** Classes over the residue fields, as the residues of symbols over k(t) that are units there. */
    const prescribed = fc.tuple(
      homogeneous(constantUnit, n),
      fc.tuple(...downwards.map(() => homogeneous(unitsOf(row), n))),
    );
    fc.assert(
      fc.property(prescribed, ([constant, classes]) => {
        const wanted = downwards.map(({ place }, i) => atPlace(name, place, classes[i]!).d);
        let alpha: Expression = constant;
        downwards.forEach(({ place, residueField }, i) => {
          const missing = sum([wanted[i]!, negate(atPlace(name, place, alpha).d)]);
          const lift = lifted(readForm(normalText(residueField, missing).text));
          alpha = sum([alpha, above(place, lift)]);
        });
        downwards.forEach(({ place, residueField }, i) =>
          expectVerdict('equal', residueField, atPlace(name, place, alpha).d, wanted[i]!),
        );
        expectVerdict('equal', base, atPlace(name, 'infinity', alpha).s, constant);
        const { text } = normalText(name, alpha);
        expectVerdict('equal', name, alpha, readForm(text));
      }),
      { numRuns: 5 },
    );
  });

  it.each(degrees)('in degree %i a class without residues is its constant', (n) => {
    fc.assert(
      fc.property(homogeneous(unitsOf(row), n), (alpha) => {
        let rest: Expression = alpha;
        for (;;) {
          const ramified = residuesOver(name, rest).residues.filter(({ place }) => place !== 'infinity');
          const last = ramified.at(-1);
          if (last === undefined) break;
          rest = sum([rest, negate(above(last.place, lifted(readExpression(expressionText(last.value)))))]);
        }
        expect(residuesOver(name, rest).residues).toEqual([]);
        const constant = atPlace(name, 'infinity', rest).s;
        expectVerdict('equal', name, rest, constant);
        expectVerdict('equal', base, atPlace(name, 'infinity', alpha).s, constant);
        if (base !== 'Q') expect(canonicalText(name, rest)).toBe(canonicalText(base, constant));
        // constants are told apart over k(t) as over k
        const other = sum([constant, homogeneousSample(n)]);
        expect(verdict(name, rest, other)).toBe(verdict(base, constant, other));
      }),
      { numRuns: 6 },
    );
  });
});

/** A constant of degree n that is not 0 over most fields. */
const homogeneousSample = (n: number): Expression =>
  readExpression(n > 0 ? `[-1]^${n}` : n === 0 ? '1 - <-1>' : `eta^${-n}`);
