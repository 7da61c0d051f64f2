import type { IntegerPolynomial } from '../field/integer-polynomial';

/**
 * The square classes of the completion of a number field at a prime ideal: bit masks, multiplied by exclusive or. Elements are given as
 * polynomials over ℤ in the integral generator of the field; they are not 0, and their order at the prime is below `bound`.
 */
export interface NumberPlace {
  classOf(a: IntegerPolynomial, bound: number): bigint;
  /** The Hilbert symbol is (−1)^hilbert(x, y). */
  hilbert(x: bigint, y: bigint): 0 | 1;
}

/** The parity of the number of common bits. */
export function parity(x: bigint, y: bigint): 0 | 1 {
  let count = 0;
  for (let common = x & y; common !== 0n; common &= common - 1n) count ^= 1;
  return count === 1 ? 1 : 0;
}
