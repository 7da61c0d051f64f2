/** 2^53: integers below it are exact as numbers. */
export const EXACT = 1n << 53n;

/** The number of binary digits of |n|; 0 has none. */
export function bitLength(n: bigint): number {
  const a = n < 0n ? -n : n;
  if (a < EXACT) return smallBitLength(Number(a));
  // Writing in base 16 is linear in the length; the first digit says how many of its four bits count.
  const hex = a.toString(16);
  return 4 * (hex.length - 1) + smallBitLength(Number.parseInt(hex[0]!, 16));
}

/** The number of binary digits of an integer 0 ≤ n < 2^53. */
export function smallBitLength(n: number): number {
  const low = n % 4294967296;
  const high = (n - low) / 4294967296;
  return high > 0 ? 64 - Math.clz32(high) : 32 - Math.clz32(low);
}

/** The number of zeros at the end of the binary form of n ≠ 0. */
export function trailingZeros(n: bigint): number {
  let shift = 0;
  let width = 32;
  let rest = n;
  while (BigInt.asUintN(width, rest) === 0n) {
    rest >>= BigInt(width);
    shift += width;
    width *= 2;
  }
  while (width > 32) {
    width /= 2;
    if (BigInt.asUintN(width, rest) !== 0n) continue;
    rest >>= BigInt(width);
    shift += width;
  }
  const low = Number(BigInt.asUintN(32, rest));
  return shift + (low === 0 ? 32 + trailingZeros(rest >> 32n) : 31 - Math.clz32(low & -low));
}
