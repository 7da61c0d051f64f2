import type { Budget } from '../arith/budget';
import type { FiniteField } from './field';
import { withFinitePolynomials } from './finite-polynomials';
import {
  dividePolynomials,
  gcdPolynomials,
  multiplyPolynomials,
  remainderPolynomial,
  type Polynomial,
} from './polynomial';

/** The operations on polynomials that take long for high degrees, in the way that is quickest over a field. */
export interface PolynomialTools<E> {
  multiply(f: Polynomial<E>, g: Polynomial<E>): Polynomial<E>;
  /** The quotient of f by a divisor g ≠ 0 of f. */
  quotient(f: Polynomial<E>, g: Polynomial<E>): Polynomial<E>;
  /** The remainder of f by g ≠ 0. */
  remainder(f: Polynomial<E>, g: Polynomial<E>): Polynomial<E>;
  /** The monic greatest common divisor; zero when both are zero. */
  gcd(f: Polynomial<E>, g: Polynomial<E>): Polynomial<E>;
}

/** Below this product of lengths the operations of the field are quicker than a change of shape. */
const SHORT = 64;

/** Over a finite field: long polynomials in the shape that is quickest there. */
export function finitePolynomialTools<E>(field: FiniteField<E>, budget: Budget): PolynomialTools<E> {
  const spend = (): void => budget.spend('multiplying polynomials');
  const short = (f: Polynomial<E>, g: Polynomial<E>): boolean => f.length * g.length < SHORT;
  return withFinitePolynomials(field, spend, ({ ring, read, write }): PolynomialTools<E> => ({
    multiply: (f, g) => (short(f, g) ? multiplyPolynomials(field, f, g) : write(ring.multiply(read(f), read(g)))),
    quotient: (f, g) =>
      short(f, g) ? dividePolynomials(field, f, g).quotient : write(ring.divide(read(f), read(g)).quotient),
    remainder: (f, g) =>
      short(f, g) ? remainderPolynomial(field, f, g) : write(ring.divide(read(f), read(g)).remainder),
    gcd: (f, g) => (short(f, g) ? gcdPolynomials(field, f, g) : write(ring.gcd(read(f), read(g)))),
  }));
}
