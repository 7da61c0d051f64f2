import { EXACT, trailingZeros } from './bits';
import { modulo } from './modular';

/**
 * The Jacobi symbol (a/n) for odd n ≥ 1: −1, 0 or 1; for n prime the Legendre symbol. Throws a RangeError for other n.
 * Quadratic reciprocity with the supplements at −1 and 2: Cohen, Algorithm 1.4.12 (number from memory).
 */
export function jacobi(a: bigint, n: bigint): -1 | 0 | 1 {
  if (n <= 0n || (n & 1n) === 0n) throw new RangeError('the Jacobi symbol needs an odd positive modulus');
  let top = modulo(a, n);
  let bottom = n;
  let flips = 0;
  while (bottom >= EXACT) {
    if (top === 0n) return 0;
    const twos = trailingZeros(top);
    top >>= BigInt(twos);
    const low = Number(bottom & 7n);
    if (twos & 1 && (low === 3 || low === 5)) flips ^= 1;
    if ((low & 3) === 3 && (top & 3n) === 3n) flips ^= 1;
    [top, bottom] = [bottom % top, top];
  }
  const rest = smallJacobi(Number(top), Number(bottom));
  return rest === 0 ? 0 : flips === 0 ? rest : rest === 1 ? -1 : 1;
}

/** The Jacobi symbol for 0 ≤ a < 2^53 and odd 1 ≤ n < 2^53. */
export function smallJacobi(a: number, n: number): -1 | 0 | 1 {
  let top = a % n;
  let bottom = n;
  let flips = 0;
  while (top !== 0) {
    while (top % 2 === 0) {
      top /= 2;
      const low = bottom % 8;
      if (low === 3 || low === 5) flips ^= 1;
    }
    if (bottom % 4 === 3 && top % 4 === 3) flips ^= 1;
    const r = bottom % top;
    bottom = top;
    top = r;
  }
  return bottom !== 1 ? 0 : flips === 0 ? 1 : -1;
}
