import { integerRoot } from '../roots';
import { smallInverse } from '../modular';
import type { FactorBase } from './factor-base';

/** Q(x) = (ax + b)² − kN = a·(ax² + 2bx + c) with a a product of primes of the base, and its zeros modulo each prime. */
export interface SievePolynomial {
  readonly a: bigint;
  readonly b: bigint;
  readonly c: bigint;
  /** The places in the base of the primes of a. */
  readonly divisors: readonly number[];
  /** The zeros of Q modulo p, counted from x = −half; −1 where p divides a. */
  readonly first: Int32Array;
  readonly second: Int32Array;
}

/**
 * The polynomials of the self-initialising quadratic sieve: for each a with s primes the 2^(s−1) values of b, in the order
 * of a Gray code, so that the zeros for the next b are one addition away. S. Contini, Factoring integers with the
 * self-initializing quadratic sieve (1997); R. Crandall, C. Pomerance, Prime Numbers, section 6.1.6 (number from memory).
 * The arrays of zeros are the same for every polynomial and change under the reader's hands.
 */
export function* polynomials(
  kn: bigint,
  base: FactorBase,
  half: number,
  stream: () => number,
): Generator<SievePolynomial> {
  const { primes, roots } = base;
  const first = new Int32Array(primes.length);
  const second = new Int32Array(primes.length);
  for (const divisors of leadingCoefficients(integerRoot(2n * kn, 2) / BigInt(half), base, stream)) {
    const a = divisors.reduce((product, i) => product * BigInt(primes[i]!), 1n);
    // b = ±B₁ ± … ± B_s with B_l² ≡ kN modulo its prime and B_l ≡ 0 modulo the others.
    const parts = divisors.map((i) => {
      const p = primes[i]!;
      const rest = a / BigInt(p);
      const gamma = (roots[i]! * smallInverse(Number(rest % BigInt(p)), p)) % p;
      return rest * BigInt(2 * gamma > p ? p - gamma : gamma);
    });
    let b = parts.reduce((sum, part) => sum + part, 0n);
    const steps = parts.map(() => new Int32Array(primes.length));
    for (let i = 0; i < primes.length; i++) {
      const p = primes[i]!;
      const residue = Number(a % BigInt(p));
      if (residue === 0 || p === 2) {
        first[i] = second[i] = -1;
        continue;
      }
      const inverse = smallInverse(residue, p);
      parts.forEach((part, l) => (steps[l]![i] = (2 * Number(part % BigInt(p)) * inverse) % p));
      const shift = half - Number(b % BigInt(p)) * inverse;
      const spread = roots[i]! * inverse;
      first[i] = residueOf(shift + spread, p);
      second[i] = residueOf(shift - spread, p);
    }
    for (let count = 1; ; count++) {
      yield { a, b, c: (b * b - kn) / a, divisors, first, second };
      if (count === 2 ** (parts.length - 1)) break;
      const l = 31 - Math.clz32(count & -count);
      const down = ((count >> (l + 1)) & 1) === 0;
      b += down ? -2n * parts[l]! : 2n * parts[l]!;
      move(first, second, steps[l]!, primes, down);
    }
  }
}

function residueOf(n: number, p: number): number {
  const r = n % p;
  return r < 0 ? r + p : r;
}

/** b has gone down by 2B: every zero goes up by 2B/a, and the other way round. */
function move(first: Int32Array, second: Int32Array, step: Int32Array, primes: Int32Array, up: boolean): void {
  for (let i = 0; i < primes.length; i++) {
    if (first[i]! < 0) continue;
    const p = primes[i]!;
    const by = up ? step[i]! : p - step[i]!;
    const one = first[i]! + by;
    const two = second[i]! + by;
    first[i] = one >= p ? one - p : one;
    second[i] = two >= p ? two - p : two;
  }
}

/**
 * Sets of places in the base whose primes multiply to about `target`, never the same twice: all but the last are drawn from
 * around the place where equal primes would do, and the last makes up for them. The more often a set has come before, the wider the
 * draw; it ends when even the whole base gives nothing new.
 */
function* leadingCoefficients(target: bigint, base: FactorBase, stream: () => number): Generator<number[]> {
  const { primes } = base;
  const last = primes.length - 1;
  const from = primes.findIndex((p) => p > (primes.length < 150 ? 20 : 100));
  const draw = (low: number, high: number): number => {
    const [bottom, top] = [low > from ? low : from, high < last ? high : last];
    return bottom >= top ? top : bottom + ((stream() * 4294967296) % (top - bottom + 1));
  };
  // So many primes that each is nearest to one two thirds of the way up the base, in proportion.
  const typical = BigInt(primes[last - (last - (last % 3)) / 3]!);
  let count = 2;
  while (typical ** BigInt(2 * count + 1) < target ** 2n || BigInt(primes[last]!) ** BigInt(count) < target) count++;
  const centre = primes.findIndex((p) => BigInt(p) ** BigInt(count) >= target);
  const seen = new Set<string>();
  for (let spread = 15, misses = 0; spread - 15 <= primes.length;) {
    const chosen = new Set<number>();
    let product = 1n;
    for (let tries = 0; chosen.size < count - 1 && tries < 1000; tries++) {
      const place = draw(centre - spread, centre + spread);
      if (!chosen.has(place)) product *= BigInt(primes[place]!);
      chosen.add(place);
    }
    const wanted = target / product;
    const nearest = primes.findIndex((p) => BigInt(p) >= wanted);
    const slack = (spread - 15) / 5;
    chosen.add(draw((nearest === -1 ? last : nearest) - slack, (nearest === -1 ? last : nearest) + slack));
    const places = [...chosen].sort((x, y) => x - y);
    if (chosen.size < count || seen.has(places.join())) {
      if (++misses > 50) [misses, spread] = [0, spread + 5];
      continue;
    }
    seen.add(places.join());
    misses = 0;
    yield places;
  }
}
