import { inverseModulo, modulo } from '../modular';
import type { FactorBase } from './factor-base';
import type { SievePolynomial } from './polynomials';

/** root² ≡ ∏ of the listed primes modulo N: places in the base counted from 1, with repetitions; 0 stands for −1. */
export interface Relation {
  readonly root: bigint;
  readonly places: readonly number[];
}

/** The relations found so far, those with one large prime joined in pairs. */
export class Relations {
  readonly full: Relation[] = [];
  /** A factor of N that happened to turn up as a large prime. */
  divisor: bigint | undefined;
  private readonly partial = new Map<number, Relation>();
  private readonly seen = new Set<bigint>();

  constructor(
    private readonly n: bigint,
    private readonly base: FactorBase,
    private readonly bound: number,
  ) {}

  /** Divides the value at x = index − half by the primes of the base; keeps it if at most one large prime is left. */
  test(polynomial: SievePolynomial, index: number, half: number): void {
    const { a, b, c, divisors, first, second } = polynomial;
    const { primes } = this.base;
    const x = BigInt(index - half);
    let rest = (a * x + 2n * b) * x + c;
    const places = divisors.map((i) => i + 1);
    if (rest < 0n) {
      places.push(0);
      rest = -rest;
    }
    if (rest === 0n) return;
    for (let i = 0; i < primes.length; i++) {
      const p = primes[i]!;
      if (first[i]! >= 0) {
        const residue = index % p;
        if (residue !== first[i] && residue !== second[i]) continue;
      }
      const prime = BigInt(p);
      while (rest % prime === 0n) {
        rest /= prime;
        places.push(i + 1);
      }
    }
    if (rest <= BigInt(this.bound)) this.keep({ root: modulo(a * x + b, this.n), places }, Number(rest));
  }

  private keep(relation: Relation, large: number): void {
    if (this.seen.has(relation.root)) return;
    this.seen.add(relation.root);
    if (large === 1) {
      this.full.push(relation);
      return;
    }
    const before = this.partial.get(large);
    if (before === undefined) {
      this.partial.set(large, relation);
      return;
    }
    const prime = BigInt(large);
    if (this.n % prime === 0n) {
      this.divisor = prime;
      return;
    }
    const root = (((relation.root * before.root) % this.n) * inverseModulo(prime, this.n)) % this.n;
    this.full.push({ root, places: [...relation.places, ...before.places] });
  }
}
