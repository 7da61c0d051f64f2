import { EXACT } from './bits';

/**
 * An integer in canonical form: a number below 2^53 in size, a bigint beyond. Small ones are as quick as numbers and none is
 * ever rounded. Two are equal iff they are `===`.
 */
export type Int = number | bigint;

const LARGEST = Number.MAX_SAFE_INTEGER;

/** The canonical form of a bigint. */
export const toInt = (n: bigint): Int => (n < EXACT && n > -EXACT ? Number(n) : n);

export function addInt(a: Int, b: Int): Int {
  if (typeof a === 'number' && typeof b === 'number') {
    const sum = a + b;
    if (sum <= LARGEST && sum >= -LARGEST) return sum;
  }
  return toInt(BigInt(a) + BigInt(b));
}

export function multiplyInt(a: Int, b: Int): Int {
  if (typeof a === 'number' && typeof b === 'number') {
    // a product that is rounded at all is past the largest number, rounded or not
    const product = a * b;
    if (product <= LARGEST && product >= -LARGEST) return product === 0 ? 0 : product;
  }
  return toInt(BigInt(a) * BigInt(b));
}

export const negateInt = (a: Int): Int => (a === 0 ? 0 : -a);

export const isOddInt = (a: Int): boolean => (typeof a === 'number' ? a % 2 !== 0 : (a & 1n) === 1n);

/** a modulo 4, in 0 … 3. */
export const moduloFour = (a: Int): number => (typeof a === 'number' ? ((a % 4) + 4) % 4 : Number(a & 3n));

/** Masks below this are combined as numbers, for JavaScript's bit operations see 32 bits only. */
const SMALL_MASK = 2 ** 31;

/** Bit masks (integers ≥ 0), combined by exclusive or. */
export function xorInt(a: Int, b: Int): Int {
  if (typeof a === 'number' && typeof b === 'number' && a < SMALL_MASK && b < SMALL_MASK) return a ^ b;
  return toInt(BigInt(a) ^ BigInt(b));
}
