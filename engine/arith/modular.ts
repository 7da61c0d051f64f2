import { EXACT } from './bits';

/** Below this modulus a product of two residues is below 2^52, so that it is exact as a number. */
const SMALL = 1n << 26n;

/** The residue of a modulo m, 0 ≤ residue < m, for m ≥ 1. */
export function modulo(a: bigint, m: bigint): bigint {
  const r = a % m;
  return r < 0n ? r + m : r;
}

/**
 * The inverse of a modulo m ≥ 1, in 0…m−1 (0 for m = 1). Throws a RangeError when a and m have a common factor.
 * Extended Euclidean algorithm: H. Cohen, A Course in Computational Algebraic Number Theory, Algorithm 1.3.6.
 */
export function inverseModulo(a: bigint, m: bigint): bigint {
  const reduced = modulo(a, m);
  if (m < SMALL) return BigInt(smallInverse(Number(reduced), Number(m)));
  let [r0, r1] = [m, reduced];
  let [s0, s1] = [0n, 1n];
  while (r1 !== 0n) {
    const q = r0 / r1;
    [r0, r1] = [r1, r0 - q * r1];
    [s0, s1] = [s1, s0 - q * s1];
  }
  if (r0 !== 1n) throw new RangeError('no inverse: the element and the modulus have a common factor');
  return s0 < 0n ? s0 + m : s0;
}

/** The inverse of 0 ≤ a < m modulo m < 2^26, in 0…m−1. Throws a RangeError when there is none. */
export function smallInverse(a: number, m: number): number {
  let r0 = m;
  let r1 = a;
  let s0 = 0;
  let s1 = 1;
  while (r1 !== 0) {
    const r = r0 % r1;
    const q = (r0 - r) / r1;
    const s = s0 - q * s1;
    r0 = r1;
    r1 = r;
    s0 = s1;
    s1 = s;
  }
  if (r0 !== 1) throw new RangeError('no inverse: the element and the modulus have a common factor');
  return m === 1 ? 0 : s0 < 0 ? s0 + m : s0;
}

/**
 * b^e modulo m ≥ 1, in 0…m−1, for any integer e; a negative exponent inverts first (RangeError when b is no unit).
 * 0^0 = 1. Left-to-right powering with windows of four bits: Cohen, Algorithm 1.2.4.2 (number from memory).
 * `spend` is called along a long exponent.
 */
export function powerModulo(b: bigint, e: bigint, m: bigint, spend?: () => void): bigint {
  if (m === 1n) return 0n;
  if (e < 0n) return powerModulo(inverseModulo(b, m), -e, m, spend);
  const base = modulo(b, m);
  if (m < SMALL) return BigInt(smallPower(Number(base), e, Number(m)));
  if (e < 65536n) return binaryPower(base, Number(e), m);
  const table = [1n, base];
  for (let i = 2; i < 16; i++) table.push((table[i - 1]! * base) % m);
  let result = 1n;
  for (const digit of e.toString(16)) {
    spend?.();
    const square = (result * result) % m;
    const fourth = (square * square) % m;
    const eighth = (fourth * fourth) % m;
    result = (eighth * eighth) % m;
    const window = Number.parseInt(digit, 16);
    if (window !== 0) result = (result * table[window]!) % m;
  }
  return result;
}

function binaryPower(base: bigint, exponent: number, m: bigint): bigint {
  let result = 1n;
  for (let bit = 31 - Math.clz32(exponent); bit >= 0; bit--) {
    result = (result * result) % m;
    if ((exponent >>> bit) & 1) result = (result * base) % m;
  }
  return result;
}

/** base^e modulo m for 0 ≤ base < m < 2^26 and e ≥ 0. */
export function smallPower(base: number, e: number | bigint, m: number): number {
  let result = 1 % m;
  if (e < EXACT) {
    let square = base;
    let rest = Number(e);
    while (rest > 0) {
      const odd = rest % 2;
      if (odd === 1) result = (result * square) % m;
      square = (square * square) % m;
      rest = (rest - odd) / 2;
    }
    return result;
  }
  for (const digit of e.toString(2)) {
    result = (result * result) % m;
    if (digit === '1') result = (result * base) % m;
  }
  return result;
}
