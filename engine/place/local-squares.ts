import { jacobi } from '../arith/jacobi';
import { leastNonResidue } from '../arith/non-residue';
import { valuation } from '../arith/valuation';
import type { Rational } from '../field/rational';
import type { SquareClasses } from '../ring/local-witt-ring';
import { quadraticClass, unitModulo } from './rational-place';

/** The square classes of ℚ_p with their representatives, and the class of a rational number. */
export interface LocalSquares extends SquareClasses {
  /** A rational representative of each class, at the index of the class. */
  readonly representatives: readonly bigint[];
  classOf(a: Rational): number;
}

/**
 * ℚ_p^×/(ℚ_p^×)² with the Hilbert symbol of J.-P. Serre, A Course in Arithmetic, III.1.2, Theorem 1.
 *
 * p odd: four classes 1, s, p, sp with s the least non-residue; bit 0 is the quadratic character of the unit, bit 1 the parity
 * of the valuation. p = 2: eight classes ±1, ±5, ±2, ±10; bit 0 is (u − 1)/2, bit 1 (u² − 1)/8 modulo 2, bit 2 the parity of
 * the valuation (II.3.3).
 */
export function localSquares(p: bigint): LocalSquares {
  return p === 2n ? dyadicSquares : oddSquares(p);
}

const bit = (mask: number, i: number): number => (mask >> i) & 1;

/** The valuation of a ≠ 0 at p. */
export const orderAt = (a: Rational, p: bigint): number => valuation(a.num, p).exponent - valuation(a.den, p).exponent;

function oddSquares(p: bigint): LocalSquares {
  const s = leastNonResidue(p);
  const minusOne = jacobi(p - 1n, p) === 1 ? 0 : 1;
  return {
    size: 4,
    minusOne,
    representatives: [1n, s, p, s * p],
    classOf(a) {
      const order = orderAt(a, p);
      return quadraticClass(unitModulo(a, p, order), p) | ((order & 1) << 1);
    },
    hilbert: (a, b) =>
      ((bit(a, 1) & bit(b, 1) & minusOne) ^ (bit(a, 0) & bit(b, 1)) ^ (bit(b, 0) & bit(a, 1))) === 1 ? 1 : 0,
  };
}

const dyadicSquares: LocalSquares = {
  size: 8,
  minusOne: 1,
  representatives: [1n, -1n, 5n, -5n, 2n, -2n, 10n, -10n],
  classOf(a) {
    const order = orderAt(a, 2n);
    // the unit part modulo 8; an odd number is its own inverse modulo 8
    const odd = (n: bigint): number => Number(BigInt.asUintN(3, valuation(n, 2n).unit));
    const unit = (odd(a.num) * odd(a.den)) & 7;
    return bit(unit, 1) | ((unit === 3 || unit === 5 ? 1 : 0) << 1) | ((order & 1) << 2);
  },
  hilbert: (a, b) => (((bit(a, 0) & bit(b, 0)) ^ (bit(a, 2) & bit(b, 1)) ^ (bit(b, 2) & bit(a, 1))) === 1 ? 1 : 0),
};
