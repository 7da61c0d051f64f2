import type { Budget } from './budget';
import { gcd } from './gcd';
import { inverseModulo, modulo } from './modular';
import { randomBetween, seeded } from './seeded';
import { primesBelow } from './small-primes';

/** A point of a Montgomery curve by its x-coordinate X/Z. */
interface Point {
  readonly x: bigint;
  readonly z: bigint;
}

/** Giant steps of the second stage; it looks at primes mD ± j with j coprime to D. */
const D = 210;
const babySteps = Array.from({ length: D / 2 }, (_, j) => j).filter((j) => gcd(BigInt(j), BigInt(D)) === 1n);

/**
 * A proper divisor of n by `curves` elliptic curves with the bounds B₁ and 60·B₁ (20·B₁ from
 * B₁ = 100000 on), or `undefined`. A prime factor p is found by a
 * curve whose order modulo p is smooth: the time depends on p much more than on n.
 *
 * H. W. Lenstra, Factoring integers with elliptic curves, Ann. of Math. 126 (1987); arithmetic and second stage:
 * P. Montgomery, Speeding the Pollard and elliptic curve methods of factorization, Math. Comp. 48 (1987); curves of
 * H. Suyama with group order divisible by 12: R. Crandall, C. Pomerance, Prime Numbers, Algorithm 7.4.4 (number from memory).
 * The curves come from a stream seeded by n and B₁.
 */
export function ellipticCurves(
  n: bigint,
  bound: number,
  curves: number,
  budget: Budget,
  doing: string,
): bigint | undefined {
  const stream = seeded(Number(n & 0x3fffffffn) + bound);
  const limit = bound < 100_000 ? 60 * bound : 20 * bound;
  const primes = primesBelow(limit);
  const isPrime = new Uint8Array(limit + D);
  for (const p of primes) isPrime[p] = 1;
  for (let i = 0; i < curves; i++) {
    const divisor = oneCurve(n, randomBetween(6n, (1n << 31n) - 1n, stream), bound, primes, isPrime, () =>
      budget.spend(doing),
    );
    if (divisor > 1n && divisor < n) return divisor;
  }
  return undefined;
}

/** The gcd of n with what one curve gives; 1 or n when the curve has failed. */
function oneCurve(
  n: bigint,
  sigma: bigint,
  bound: number,
  primes: Uint32Array,
  isPrime: Uint8Array,
  spend: () => void,
): bigint {
  const u = modulo(sigma * sigma - 5n, n);
  const v = modulo(4n * sigma, n);
  const bottom = (16n * (((u * u) % n) * u) * v) % n;
  const common = gcd(bottom, n);
  if (common !== 1n) return common;
  // (A + 2)/4 of the curve y² = x³ + Ax² + x.
  const a24 = (modulo((v - u) ** 3n, n) * (3n * u + v) * inverseModulo(bottom, n)) % n;

  const double = ({ x, z }: Point): Point => {
    const plus = (x + z) ** 2n % n;
    const minus = (x - z) ** 2n % n;
    const cross = plus - minus;
    return { x: (plus * minus) % n, z: modulo(cross * (minus + a24 * cross), n) };
  };
  /** P + Q from P, Q and P − Q. */
  const add = (p: Point, q: Point, difference: Point): Point => {
    const one = ((p.x - p.z) * (q.x + q.z)) % n;
    const two = ((p.x + p.z) * (q.x - q.z)) % n;
    return { x: (((one + two) ** 2n % n) * difference.z) % n, z: (((one - two) ** 2n % n) * difference.x) % n };
  };
  const multiply = (k: number, p: Point): Point => {
    if (k === 1) return p;
    let low = p;
    let high = double(p);
    for (let bit = 30 - Math.clz32(k); bit >= 0; bit--) {
      const between = add(low, high, p);
      if ((k >>> bit) & 1) [low, high] = [between, double(high)];
      else [low, high] = [double(low), between];
    }
    return low;
  };

  let q: Point = { x: (((u * u) % n) * u) % n, z: (((v * v) % n) * v) % n };
  for (let i = 0; primes[i]! <= bound; i++) {
    if (i % 16 === 0) spend();
    for (let power = primes[i]!; power <= bound; power *= primes[i]!) q = multiply(primes[i]!, q);
  }
  const divisor = gcd(q.z, n);
  if (divisor !== 1n) return divisor;

  // Second stage: the order is smooth but for one prime mD ± j: then x(mDQ) = x(jQ) modulo the factor.
  const steps = babySteps.map((j) => multiply(j, q));
  const crosses = steps.map(({ x, z }) => (x * z) % n);
  const giant = multiply(D, q);
  let m = (bound - (bound % D)) / D;
  if (m < 2) m = 2;
  let before = multiply(m - 1, giant);
  let here = multiply(m, giant);
  let product = 1n;
  for (; m * D < isPrime.length - D; m++) {
    spend();
    const cross = (here.x * here.z) % n;
    for (let i = 0; i < babySteps.length; i++) {
      const j = babySteps[i]!;
      if (!isPrime[m * D + j] && !isPrime[m * D - j]) continue;
      const { x, z } = steps[i]!;
      product = (product * ((here.x - x) * (here.z + z) - cross + crosses[i]!)) % n;
    }
    [before, here] = [here, add(here, giant, before)];
  }
  return gcd(product, n);
}
