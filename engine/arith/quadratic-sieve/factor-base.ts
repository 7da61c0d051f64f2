import { bitLength } from '../bits';
import { smallJacobi } from '../jacobi';
import { smallPower } from '../modular';
import { primesBelow, smallPrimes } from '../small-primes';

/** The primes p for which kN is a square modulo p, ascending, with what the sieve needs to know about each. */
export interface FactorBase {
  readonly primes: Int32Array;
  /** A square root of kN modulo p. */
  readonly roots: Int32Array;
  /** log₂ p, rounded. */
  readonly logs: Uint8Array;
}

/**
 * The squarefree multiplier k ≤ 73 for which kN has the most small primes in its factor base: the function of D. Knuth and
 * R. Schroeppel, as in R. Silverman, The multiple polynomial quadratic sieve, Math. Comp. 48 (1987), section 5 (from
 * memory). Logarithms are counted in sixteenths of a binary digit; the choice bears on the time alone.
 */
export function multiplier(n: bigint): number {
  const residues = scored.map(({ p }) => smallJacobi(Number(n % BigInt(p)), p));
  const atTwo = Number(n % 8n);
  let best = 1;
  let bestScore = Number.NEGATIVE_INFINITY;
  for (const { k, log, symbols } of candidates) {
    let score = scoreAtTwo[(k * atTwo) % 8]! - log / 2;
    for (let i = 0; i < scored.length; i++) {
      if (symbols[i] === 0) score += scored[i]!.log / scored[i]!.p;
      else if (symbols[i] === residues[i]) score += scored[i]!.twice;
    }
    if (score > bestScore) [best, bestScore] = [k, score];
  }
  return best;
}

/** log₂ n in sixteenths, from the length of n^16. */
const logarithm = (n: number): number => bitLength(BigInt(n) ** 16n) - 1;

const scoreAtTwo = [0, 32, 0, 8, 0, 16, 0, 8] as const;
const scored = [...smallPrimes.subarray(1, 60)].map((p) => {
  const log = logarithm(p);
  return { p, log, twice: (2 * log) / (p - 1) };
});
const candidates = Array.from({ length: 73 }, (_, i) => i + 1)
  .filter((k) => [4, 9, 25, 49].every((square) => k % square !== 0))
  .map((k) => ({ k, log: logarithm(k), symbols: Int8Array.from(scored, ({ p }) => smallJacobi(k, p)) }));

/** The factor base of kN with `size` primes. */
export function factorBase(kn: bigint, size: number): FactorBase {
  const primes: number[] = [];
  const roots: number[] = [];
  for (let from = 0, bound = 4096; primes.length < size; from = bound, bound *= 2) {
    for (const p of bound === 4096 ? smallPrimes : primesBelow(bound)) {
      if (p < from || primes.length === size) continue;
      const residue = Number(kn % BigInt(p));
      if (p !== 2 && residue !== 0 && smallJacobi(residue, p) !== 1) continue;
      primes.push(p);
      roots.push(squareRoot(residue, p));
    }
  }
  return {
    primes: Int32Array.from(primes),
    roots: Int32Array.from(roots),
    logs: Uint8Array.from(primes, (p) => bitLength(BigInt(p) ** 2n) >> 1),
  };
}

/** A square root of a square a modulo a prime p < 2^26. D. Shanks: Cohen, Algorithm 1.5.1. */
export function squareRoot(a: number, p: number): number {
  if (p === 2 || a === 0) return a;
  let odd = p - 1;
  let twos = 0;
  for (; odd % 2 === 0; odd /= 2) twos++;
  let nonSquare = 2;
  while (smallJacobi(nonSquare, p) !== -1) nonSquare++;
  let generator = smallPower(nonSquare, BigInt(odd), p);
  let root = smallPower(a, BigInt((odd + 1) / 2), p);
  let defect = smallPower(a, BigInt(odd), p);
  while (defect !== 1) {
    let order = 0;
    for (let t = defect; t !== 1; t = (t * t) % p) order++;
    let step = generator;
    for (let i = twos - order - 1; i > 0; i--) step = (step * step) % p;
    generator = (step * step) % p;
    twos = order;
    root = (root * step) % p;
    defect = (defect * generator) % p;
  }
  return root;
}
