import type { Budget } from '../budget';
import { bitLength } from '../bits';
import { gcd } from '../gcd';
import { seeded } from '../seeded';
import { dependencies } from './dependencies';
import { factorBase, multiplier, type FactorBase } from './factor-base';
import { parameters } from './parameters';
import { polynomials, type SievePolynomial } from './polynomials';
import { Relations, type Relation } from './relations';

/** More relations than primes, so that a factor is found with near certainty. */
const SURPLUS = 12;
/** Primes below this are not sieved with: they cost most and say least. */
const LEAST_SIEVED = 24;

/**
 * A proper divisor of an odd composite n that is no perfect power and has no small prime factor, by the self-initialising
 * quadratic sieve with one large prime; `undefined` when a short n has too few polynomials. C. Pomerance, The quadratic sieve factoring algorithm, EUROCRYPT 84; R. Crandall,
 * C. Pomerance, Prime Numbers, section 6.1. The sieve only proposes values: every relation is divided out exactly.
 */
export function quadraticSieve(n: bigint, budget: Budget, doing: string): bigint | undefined {
  const spend = (): void => budget.spend(doing);
  const kn = n * BigInt(multiplier(n));
  const { size, half, largePrime } = parameters(bitLength(kn));
  const base = factorBase(kn, size);
  for (const p of base.primes) if (n % BigInt(p) === 0n && n !== BigInt(p)) return BigInt(p);
  const bound = largePrime * base.primes[size - 1]!;
  const relations = new Relations(n, base, bound);
  const sieve = new Uint8Array(2 * half);
  const start = 128 - threshold(kn, base, half, bound);
  let wanted = size + 1 + SURPLUS;
  for (const polynomial of polynomials(kn, base, half, seeded(Number(n & 0x7fffffffn)))) {
    spend();
    sieve.fill(start);
    sieveWith(sieve, base, polynomial);
    collect(sieve, polynomial, half, relations);
    if (relations.divisor !== undefined) return relations.divisor;
    if (relations.full.length < wanted) continue;
    const divisor = divisorFrom(relations.full, n, base, spend);
    if (divisor !== undefined) return divisor;
    wanted = relations.full.length + SURPLUS;
  }
  return undefined;
}

/**
 * The sum of logarithms from which a value is tried: the length of the largest value, less the large prime and what the
 * primes not sieved with give on average. At most 120, so that the sum fits its byte.
 */
function threshold(kn: bigint, base: FactorBase, half: number, bound: number): number {
  const length = (bitLength(kn) >> 1) + bitLength(BigInt(half)) - 1;
  let unsieved = 0;
  base.primes.forEach((p, i) => {
    if (p < LEAST_SIEVED) unsieved += (2 * base.logs[i]!) / (p === 2 ? 2 : p - 1);
  });
  const wanted = length - bitLength(BigInt(bound)) - (unsieved - (unsieved % 1));
  return wanted > 120 ? 120 : wanted;
}

function sieveWith(sieve: Uint8Array, base: FactorBase, { first, second }: SievePolynomial): void {
  const { primes, logs } = base;
  const end = sieve.length;
  for (let i = 0; i < primes.length; i++) {
    const p = primes[i]!;
    if (p < LEAST_SIEVED || first[i]! < 0) continue;
    const log = logs[i]!;
    let one = first[i]!;
    let two = second[i]!;
    if (one > two) [one, two] = [two, one];
    while (two < end) {
      sieve[one]! += log;
      sieve[two]! += log;
      one += p;
      two += p;
    }
    if (one < end) sieve[one]! += log;
  }
}

/** Tries every value whose byte has reached 128, four bytes at a glance. */
function collect(sieve: Uint8Array, polynomial: SievePolynomial, half: number, relations: Relations): void {
  const words = new Uint32Array(sieve.buffer);
  for (let w = 0; w < words.length; w++) {
    if ((words[w]! & 0x80808080) === 0) continue;
    for (let i = 4 * w; i < 4 * w + 4; i++) if (sieve[i]! & 128) relations.test(polynomial, i, half);
  }
}

/** gcd(X − Y, n) for the dependencies X² ≡ Y² in turn, until it is proper. */
function divisorFrom(
  relations: readonly Relation[],
  n: bigint,
  base: FactorBase,
  spend: () => void,
): bigint | undefined {
  const rows = relations.map((relation) => relation.places);
  for (const chosen of dependencies(rows, base.primes.length + 1, spend)) {
    spend();
    const exponents = new Int32Array(base.primes.length + 1);
    let x = 1n;
    for (const i of chosen) {
      x = (x * relations[i]!.root) % n;
      for (const place of relations[i]!.places) exponents[place]!++;
    }
    let y = 1n;
    for (let place = 1; place < exponents.length; place++) {
      if (exponents[place]! > 0) y = (y * BigInt(base.primes[place - 1]!) ** BigInt(exponents[place]! >> 1)) % n;
    }
    if ((x * x - y * y) % n !== 0n) throw new Error('a dependency of the sieve is no congruence of squares');
    const divisor = gcd(x - y, n);
    if (divisor > 1n && divisor < n) return divisor;
  }
  return undefined;
}
