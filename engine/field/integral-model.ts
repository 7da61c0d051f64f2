import { valuation } from '../arith/valuation';
import { gcd } from '../arith/gcd';
import { smallPrimeDivisors } from '../arith/small-primes';
import type { IntegerPolynomial } from './integer-polynomial';
import type { Polynomial } from './polynomial';
import { rational, type Rational } from './rational';

/** ℚ[y]/(P) by a multiple w = scale·y of the variable that is an algebraic integer. */
export interface IntegralModel {
  readonly scale: Rational;
  /** The minimal polynomial of w, monic over ℤ. */
  readonly modulus: IntegerPolynomial;
  /** An element, given as a polynomial in y, as numerator(w)/denominator with a denominator ≥ 1. */
  integral(a: Polynomial<Rational>): { readonly numerator: IntegerPolynomial; readonly denominator: bigint };
  /** numerator(w)/denominator as a polynomial in y. */
  element(numerator: IntegerPolynomial, denominator: bigint): Polynomial<Rational>;
}

/** The model of a monic P of degree ≥ 1 over ℚ; primes below 2^12 are left out of the scale where they can be. */
export function integralModel(modulus: Polynomial<Rational>): IntegralModel {
  const n = modulus.length - 1;
  let denominator = 1n;
  for (const { den } of modulus) denominator *= den / gcd(denominator, den);
  const whole = modulus.map(({ num, den }, i) => (num * denominator ** BigInt(n - i)) / den);
  const below = whole.slice(0, n).filter((c) => c !== 0n);
  let divisor = 1n;
  for (const p of below.length === 0 ? [] : smallPrimeDivisors(below.reduce((common, c) => gcd(common, c), 0n))) {
    const spare = whole.slice(0, n).map((c, i) => {
      if (c === 0n) return Number.POSITIVE_INFINITY;
      const { exponent } = valuation(c, BigInt(p));
      return (exponent - (exponent % (n - i))) / (n - i);
    });
    divisor *= BigInt(p) ** BigInt(spare.reduce((least, k) => (k < least ? k : least)));
  }
  const scale = rational(denominator, divisor);
  const { num, den } = scale;
  return {
    scale,
    modulus: whole.map((c, i) => c / divisor ** BigInt(n - i)),
    integral(a) {
      // y = w·den/num
      const terms = a.map((c, i) => rational(c.num * den ** BigInt(i), c.den * num ** BigInt(i)));
      let common = 1n;
      for (const c of terms) common *= c.den / gcd(common, c.den);
      return { numerator: terms.map((c) => c.num * (common / c.den)), denominator: common };
    },
    element: (numerator, below) => numerator.map((c, i) => rational(c * num ** BigInt(i), below * den ** BigInt(i))),
  };
}
