import type { Budget } from '../arith/budget';
import { exactQuotient, monicRational, multiplyIntegers, primitiveOfRational } from './integer-polynomial';
import { gcdIntegers } from './modular-gcd';
import { remainderPolynomial, scalePolynomial, type Polynomial } from './polynomial';
import type { PolynomialTools } from './polynomial-tools';
import { rational, rationals, type Rational } from './rational';

/** Polynomials over ℚ by their primitive multiples over ℤ, so that no fractions are added. */
export function rationalPolynomialTools(budget: Budget): PolynomialTools<Rational> {
  type P = Polynomial<Rational>;
  const spend = (): void => budget.spend('multiplying polynomials');
  const isOne = (f: P): boolean => f.length === 1 && f[0]!.num === 1n && f[0]!.den === 1n;
  return {
    multiply(f, g) {
      if (f.length === 0 || g.length === 0) return [];
      spend();
      const [a, b] = [primitiveOfRational(f), primitiveOfRational(g)];
      const unit = rationals.multiply(a.unit, b.unit);
      const product = multiplyIntegers(a.primitive, b.primitive);
      return product.map((c) => rational(c * unit.num, unit.den));
    },
    quotient(f, g) {
      if (f.length === 0 || isOne(g)) return f;
      const [a, b] = [primitiveOfRational(f), primitiveOfRational(g)];
      const found = exactQuotient(a.primitive, b.primitive, spend);
      if (found === undefined) throw new RangeError('no divisor');
      const unit = rationals.multiply(a.unit, rationals.inverse(b.unit));
      return scalePolynomial(
        rationals,
        unit,
        found.map((c) => rational(c)),
      );
    },
    remainder: (f, g) => remainderPolynomial(rationals, f, g),
    gcd(f, g) {
      if (f.length === 0 && g.length === 0) return [];
      const [a, b] = [f, g].map((h) => (h.length === 0 ? [] : primitiveOfRational(h).primitive));
      return monicRational(gcdIntegers(a ?? [], b ?? [], spend));
    },
  };
}
