import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integerElement } from '@/engine/expression/element';
import { negate, product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { expressionText } from '@/engine/expression/to-text';
import { readExpression } from '@/grammar/read';
import { canonicalForm, canonicalText, expectVerdict } from './kmw-engine';
import { rationalUnit } from './kmw-fields';
import { at, residuesOf } from './kmw-residue-calls';
import { homogeneous } from './kmw-words';

const primes = [31, 29, 23, 19, 17, 13, 11, 7, 5, 3, 2];

/** Texts of classes of K^MW_m(𝔽_p). */
function residueClass(p: number, m: number): fc.Arbitrary<string> {
  const unit = fc.integer({ min: 1, max: p - 1 });
  if (m >= 2) return fc.constant('0');
  if (m === 1) return unit.map((u) => (u === 1 ? '0' : `[${u}]`));
  return fc
    .array(unit, { maxLength: 3 })
    .map((units) => (units.length === 0 ? '0' : `eta^${-m}*(${units.map((u) => `<${u}>`).join(' + ')})`));
}

const constant = (n: number): fc.Arbitrary<string> =>
  fc
    .tuple(fc.integer({ min: -5, max: 5 }), fc.integer({ min: -5, max: 5 }))
    .map(([c, y]) => (n > 0 ? `(${c})*[-1]^${n}` : n < 0 ? `(${c})*eta^${-n}` : `(${c}) + (${y})*eta*[-1]`));

/** [p] times a class over the residue field, lifted as it is written. */
const above = (p: number, residue: Expression): Expression => product([symbol([integerElement(BigInt(p))]), residue]);

/**
 * 0 → B_n → K^MW_n(ℚ) → ⊕_p K^MW_{n−1}(𝔽_p) → 0 is split exact (Tate, in J. Milnor, Introduction to Algebraic K-Theory, §11;
 * J. Milnor, D. Husemoller, Symmetric Bilinear Forms, IV.2).
 */
describe.each([-2, -1, 0, 1, 2, 3])('in degree %i', (n) => {
  it('a class with prescribed residues and constant exists, and they are read off again', () => {
    const prescribed = fc.tuple(constant(n), fc.tuple(...primes.map((p) => residueClass(p, n - 1))));
    fc.assert(
      fc.property(prescribed, ([b, classes]) => {
        let alpha: Expression = readExpression(b);
        primes.forEach((p, i) => {
          const missing = sum([readExpression(classes[i] ?? '0'), negate(at(p, alpha).d)]);
          const lift = canonicalForm(`F_${p}`, missing);
          alpha = sum([alpha, above(p, lift)]);
        });
        primes.forEach((p, i) => expectVerdict('equal', `F_${p}`, at(p, alpha).d, classes[i] ?? '0'));
        const listed = residuesOf(alpha).residues.map(({ place }) => Number(place));
        const expected = primes.filter((p, i) => canonicalText(`F_${p}`, classes[i] ?? '0') !== '').reverse();
        expect(listed).toEqual(expected);
        // the same class by its canonical form, whose part without primes has the signature of the class
        expectVerdict('equal', 'Q', alpha, canonicalForm('Q', alpha));
      }),
      { numRuns: 10 },
    );
  });

  it('an unramified class is its constant', () => {
    fc.assert(
      fc.property(homogeneous(rationalUnit([2, 3, 5, 7, 11]), n), (alpha) => {
        let rest: Expression = alpha;
        for (;;) {
          const top = residuesOf(rest).residues.at(-1);
          if (top === undefined) break;
          rest = sum([rest, negate(above(Number(top.place), readExpression(expressionText(top.value))))]);
        }
        expect(residuesOf(rest).residues).toEqual([]);
        const form = canonicalText('Q', rest);
        expect(form).not.toContain('<');
        for (const entry of form.matchAll(/\[([^\]]*)\]/g)) expect(entry[1]).toBe('-1');
        // where −1 is all there is, real numbers see everything
        expectVerdict('equal', 'R', rest, canonicalForm('Q', rest));
      }),
      { numRuns: 15 },
    );
  });
});
