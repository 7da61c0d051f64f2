import type { Budget } from '../arith/budget';
import type { Int } from '../arith/int';
import { powerOf } from './frobenius';
import { multiplyIntegers } from './integer-polynomial';
import { remainderByMonic } from './integer-residues';
import { residuesModulo } from './modular-gcd';
import type { NumberField, NumberFieldElement } from './number-field';
import { SmallPrimePolynomials } from './small-prime-polynomials';
import { wordPrime } from './word-primes';

/** Primes below 2^25 at which a product is looked at before it is multiplied out. */
const TRIALS = 3;

/**
 * Whether ∏ aᵉ = 1 in a number field, the a ≠ 0 and the e of any sign. "No" is seen modulo a prime as a rule; "yes" is proved over ℤ,
 * the powers with e > 0 against those with e < 0, so that nothing is inverted.
 */
export function isProductOne(
  field: NumberField,
  factors: readonly (readonly [NumberFieldElement, Int])[],
  budget: Budget,
): boolean {
  const doing = `comparing products of elements of ${field.name}`;
  const spend = (): void => budget.spend(doing);
  const { modulus } = field.model;
  const powers = factors.map(([a, e]) => ({ ...field.model.integral(a), exponent: BigInt(e) }));
  for (let place = 0, seen = 0; seen < TRIALS; place++) {
    spend();
    const p = wordPrime(place);
    if (powers.some(({ denominator }) => denominator % BigInt(p) === 0n)) continue;
    seen++;
    const ring = new SmallPrimePolynomials(p, spend);
    const image = residuesModulo(modulus, p);
    const multiply = ring.multiplyModulo(image);
    const sides = [1, -1].map((sign) =>
      powers.reduce<readonly number[]>((product, { numerator, denominator, exponent }) => {
        // the denominators stand on the other side
        const own = exponent > 0n === sign > 0 ? residuesModulo(numerator, p) : residuesModulo([denominator], p);
        const size = exponent < 0n ? -exponent : exponent;
        return size === 0n ? product : multiply(product, powerOf(multiply, own, size));
      }, ring.one),
    );
    if (ring.degree(ring.subtract(sides[0]!, sides[1]!)) >= 0) return false;
  }
  const multiply = (f: readonly bigint[], g: readonly bigint[]): readonly bigint[] => {
    spend();
    return remainderByMonic(multiplyIntegers(f, g), modulus);
  };
  const [above, below] = [1, -1].map((sign) =>
    powers.reduce<readonly bigint[]>(
      (product, { numerator, denominator, exponent }) => {
        const own = exponent > 0n === sign > 0 ? numerator : [denominator];
        const size = exponent < 0n ? -exponent : exponent;
        return size === 0n ? product : multiply(product, powerOf(multiply, own, size));
      },
      [1n],
    ),
  );
  return above!.length === below!.length && above!.every((c, i) => c === below![i]);
}
