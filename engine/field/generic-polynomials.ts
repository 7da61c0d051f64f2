import { randomBetween } from '../arith/seeded';
import type { FiniteField } from './field';
import type { FinitePolynomials } from './finite-polynomials';
import {
  addPolynomials,
  degree,
  derivativePolynomial,
  dividePolynomials,
  gcdPolynomials,
  monic,
  multiplyPolynomials,
  remainderPolynomial,
  subtractPolynomials,
  trimmed,
  type Polynomial,
} from './polynomial';

/** Rows of a linear map kept at once: an element may be long. */
const ROWS = 256;

/** Polynomials over any finite field by the operations of the field. */
export function genericPolynomials<E>(given: FiniteField<E>, spend: () => void): FinitePolynomials<Polynomial<E>> {
  const field = watched(given, spend);
  return {
    order: field.order,
    characteristic: field.characteristic,
    one: [field.one],
    x: [field.zero, field.one],
    degree,
    add: (f, g) => addPolynomials(field, f, g),
    subtract: (f, g) => subtractPolynomials(field, f, g),
    multiply: (f, g) => multiplyPolynomials(field, f, g),
    monic: (f) => monic(field, f),
    divide: (f, g) => dividePolynomials(field, f, g),
    gcd: (f, g) => gcdPolynomials(field, f, g),
    derivative: (f) => derivativePolynomial(field, f),
    root(f) {
      const p = Number(field.characteristic);
      // the inverse of the Frobenius map of 𝔽_q is its power q/p
      const exponent = field.order / field.characteristic;
      return f.filter((_, i) => i % p === 0).map((c) => field.power(c, exponent));
    },
    draw: (n, stream) =>
      trimmed(
        field,
        Array.from({ length: n }, () => field.element(randomBetween(0n, field.order - 1n, stream))),
      ),
    multiplyModulo: (m) => (f, g) => remainderPolynomial(field, multiplyPolynomials(field, f, g), m),
    combine(f, rows) {
      let sum: E[] = [];
      f.forEach((c, i) => {
        if (field.isZero(c)) return;
        const row = rows[i]!;
        if (sum.length < row.length) sum = sum.concat(new Array<E>(row.length - sum.length).fill(field.zero));
        for (let j = 0; j < row.length; j++) sum[j] = field.add(sum[j]!, field.multiply(c, row[j]!));
      });
      return trimmed(field, sum);
    },
    rowLimit: ROWS,
  };
}

/** Products are counted, so that a long operation can be stopped inside. */
function watched<E>(field: FiniteField<E>, spend: () => void): FiniteField<E> {
  let products = 0;
  return Object.create(field, {
    multiply: {
      value(a: E, b: E): E {
        if ((++products & 63) === 0) spend();
        return field.multiply(a, b);
      },
    },
  }) as FiniteField<E>;
}
