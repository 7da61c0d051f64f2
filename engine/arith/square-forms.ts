import { smallGcd } from './gcd';
import { integerRoot } from './roots';

/** Every number that occurs is exact as a number as long as multiplier times n is below 2^53. */
const EXACT_LIMIT = 2 ** 53;

const multipliers: readonly number[] = [1, 3, 5, 7, 11, 15, 21, 33, 35, 55, 77, 105, 165, 231, 385, 1155];

/**
 * A proper divisor of an odd composite n < 2^52 that is no perfect square, or `undefined` when no multiplier finds one.
 * D. Shanks' square form factorisation with multipliers: J. Gower and S. Wagstaff, Square form factorization, Math. Comp. 77
 * (2008). It works with numbers of half the length of n and takes about n^(1/4) steps.
 */
export function squareForms(n: number): number | undefined {
  for (const multiplier of multipliers) {
    if (multiplier * n >= EXACT_LIMIT) break;
    const divisor = withMultiplier(n, multiplier * n);
    if (divisor !== undefined) return divisor;
  }
  return undefined;
}

function withMultiplier(n: number, discriminant: number): number | undefined {
  const root = Number(integerRoot(BigInt(discriminant), 2));
  let [p, qBefore, q] = [root, 1, discriminant - root * root];
  if (q === 0) return undefined;
  const steps = 6 * Number(integerRoot(4n * BigInt(root), 2));
  let square: number | undefined;
  for (let i = 2; i < steps; i += 1) {
    const b = ((root + p) / q) | 0;
    const pNext = b * q - p;
    const qNext = qBefore + b * (p - pNext);
    [qBefore, q, p] = [q, qNext, pNext];
    if (i % 2 === 0) {
      square = squareRoot(q);
      if (square !== undefined) break;
    }
  }
  if (square === undefined) return undefined;
  const first = ((root - p) / square) | 0;
  p = first * square + p;
  qBefore = square;
  q = (discriminant - p * p) / square;
  for (let i = 0; i < 2 * steps; i += 1) {
    const b = ((root + p) / q) | 0;
    const pNext = b * q - p;
    const qNext = qBefore + b * (p - pNext);
    if (pNext === p) break;
    [qBefore, q, p] = [q, qNext, pNext];
  }
  for (const candidate of [q, qBefore]) {
    const divisor = smallGcd(n, candidate);
    if (divisor !== 1 && divisor !== n) return divisor;
  }
  return undefined;
}

/** The squares modulo 64, as a table. */
const squareModulo64: readonly boolean[] = (() => {
  const table = new Array<boolean>(64).fill(false);
  for (let i = 0; i < 64; i += 1) table[(i * i) % 64] = true;
  return table;
})();

/** The root of a perfect square 0 ≤ q < 2^31. */
function squareRoot(q: number): number | undefined {
  if (squareModulo64[q & 63] !== true) return undefined;
  let root = 65536;
  for (;;) {
    const next = (root + ((q / root) | 0)) >> 1;
    if (next >= root) return root * root === q ? root : undefined;
    root = next;
  }
}
