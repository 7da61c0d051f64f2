import bigInt from 'big-integer';

/**
 * A stream of pseudo-random numbers that is the same on every run: multiples of 2^−32 in [0, 1), exact as numbers.
 * Xorshift with period 2^32 − 1: G. Marsaglia, Xorshift RNGs, J. Stat. Softw. 8 (2003). Answers never depend on its quality.
 */
export function seeded(seed: number): () => number {
  let state = (seed ^ 0x9e3779b9) >>> 0 || 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 4294967296;
  };
}

/** An integer low ≤ n ≤ high from the stream. */
export function randomBetween(low: bigint, high: bigint, stream: () => number): bigint {
  return BigInt(bigInt.randBetween(bigInt(low), bigInt(high), stream).toString());
}
