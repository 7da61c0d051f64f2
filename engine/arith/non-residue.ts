import { jacobi } from './jacobi';

/** The least quadratic non-residue modulo an odd prime p. */
export function leastNonResidue(p: bigint): bigint {
  let s = 2n;
  while (jacobi(s, p) !== -1) s += 1n;
  return s;
}
