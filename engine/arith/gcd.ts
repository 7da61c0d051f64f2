import { EXACT } from './bits';
import { reducedPair } from './half-gcd';

/** Above this size the Euclidean algorithm works on leading digits. */
const LONG = 1n << 512n;

/**
 * The greatest common divisor of two integers, never negative; gcd(0, 0) = 0.
 * The Euclidean algorithm: on leading digits while the numbers are long, on numbers when they are short.
 */
export function gcd(a: bigint, b: bigint): bigint {
  let x = a < 0n ? -a : a;
  let y = b < 0n ? -b : b;
  if (x < y) [x, y] = [y, x];
  while (y >= LONG) [x, y] = reducedPair(x, y);
  while (y >= EXACT) {
    const r = x % y;
    x = y;
    y = r;
  }
  if (y === 0n) return x;
  return BigInt(smallGcd(Number(y), Number(x % y)));
}

/** The greatest common divisor of two integers 0 ≤ a, b < 2^53. */
export function smallGcd(a: number, b: number): number {
  let x = a;
  let y = b;
  while (y !== 0) {
    const r = x % y;
    x = y;
    y = r;
  }
  return x;
}
