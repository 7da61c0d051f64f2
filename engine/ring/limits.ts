import type { Int } from '../arith/int';
import { Refusal } from '../expression/refusal';

/** Coefficients have at most 10⁵ digits. */
const LARGEST = 10n ** 100_000n;
const LEAST = -LARGEST;

/** Degrees lie between −10⁴ and 10⁴. */
export const DEGREE_LIMIT = 10_000;

/** Returns `n`, or refuses it when it is past the limit on coefficients. */
export function boundedCoefficient<N extends Int>(n: N): N {
  if (typeof n === 'bigint' && (n > LARGEST || n < LEAST))
    throw new Refusal(
      'size',
      'A coefficient has more than 100 000 digits. Use smaller powers or smaller coefficients.',
    );
  return n;
}

/** Refuses a word whose degree is past the limit. */
export function checkDegree(degree: number): void {
  if (degree > DEGREE_LIMIT || degree < -DEGREE_LIMIT)
    throw new Refusal('size', 'A word has a degree past 10 000. Use smaller powers.');
}
