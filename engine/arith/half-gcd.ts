import { bitLength } from './bits';

/** Integers below this length go through the Euclidean algorithm as numbers, with cofactors of half the length. */
const WORD_BITS = 50;
const HALF_WORD = 33554432;

/** (x, y) ↦ (ax + by, cx + dy) with ad − bc = ±1, so that the common divisors of x and y stay the same. */
interface Step {
  readonly a: bigint;
  readonly b: bigint;
  readonly c: bigint;
  readonly d: bigint;
}

/**
 * A pair with the same greatest common divisor as x ≥ y > 0, both about a quarter of the length of x shorter, larger first.
 *
 * The quotients are guessed from the leading halves (D. Lehmer 1938; recursively: A. Schönhage, Schnelle Berechnung von
 * Kettenbruchentwicklungen, Acta Inf. 1 (1971)). A wrong guess costs time only: every step is unimodular.
 */
export function reducedPair(x: bigint, y: bigint): readonly [bigint, bigint] {
  const half = BigInt(bitLength(x) >> 1);
  const top = y >> half;
  if (top > 0n) {
    const { pair } = applied(halfStep(x >> half, top), x, y);
    if (pair[0] < x) return pair;
  }
  return [y, x % y];
}

/** A step that makes x ≥ y > 0 about half as long. */
function halfStep(x: bigint, y: bigint): Step {
  const bits = bitLength(x);
  if (bits <= WORD_BITS) return wordStep(Number(x), Number(y));
  const half = bits >> 1;
  const top = y >> BigInt(half);
  let step: Step = { a: 1n, b: 0n, c: 0n, d: 1n };
  let pair: readonly [bigint, bigint] = [x, y];
  if (top > 0n) ({ step, pair } = applied(halfStep(x >> BigInt(half), top), x, y));
  let [long, short] = pair;
  if (bitLength(short) <= half) return step;
  const quotient = long / short;
  step = { a: step.c, b: step.d, c: step.a - quotient * step.c, d: step.b - quotient * step.d };
  [long, short] = [short, long - quotient * short];
  const left = bitLength(long);
  const shift = 2 * half > left ? BigInt(2 * half - left) : 0n;
  const rest = short >> shift;
  if (bitLength(short) <= half || rest === 0n) return step;
  return composed(halfStep(long >> shift, rest), step);
}

/** The step applied to a pair, with signs and order put right in the step as well. */
function applied(step: Step, x: bigint, y: bigint): { step: Step; pair: readonly [bigint, bigint] } {
  let { a, b, c, d } = step;
  let first = a * x + b * y;
  let second = c * x + d * y;
  if (first < 0n) [first, a, b] = [-first, -a, -b];
  if (second < 0n) [second, c, d] = [-second, -c, -d];
  return first >= second
    ? { step: { a, b, c, d }, pair: [first, second] }
    : { step: { a: c, b: d, c: a, d: b }, pair: [second, first] };
}

const composed = (after: Step, before: Step): Step => ({
  a: after.a * before.a + after.b * before.c,
  b: after.a * before.b + after.b * before.d,
  c: after.c * before.a + after.d * before.c,
  d: after.c * before.b + after.d * before.d,
});

function wordStep(x: number, y: number): Step {
  let [a, b, c, d] = [1, 0, 0, 1];
  let [long, short] = [x, y];
  while (short !== 0) {
    const rest = long % short;
    const quotient = (long - rest) / short;
    const nextC = a - quotient * c;
    const nextD = b - quotient * d;
    if (nextC > HALF_WORD || nextC < -HALF_WORD || nextD > HALF_WORD || nextD < -HALF_WORD) break;
    [a, b, c, d] = [c, d, nextC, nextD];
    [long, short] = [short, rest];
  }
  return { a: BigInt(a), b: BigInt(b), c: BigInt(c), d: BigInt(d) };
}
