import { EXACT } from './bits';

/** The greatest common divisor of two integers, never negative; gcd(0, 0) = 0. */
export function gcd(a: bigint, b: bigint): bigint {
  let x = a < 0n ? -a : a;
  let y = b < 0n ? -b : b;
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
