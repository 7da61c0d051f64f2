import type { Budget } from './budget';
import { bitLength } from './bits';
import { ellipticCurves } from './elliptic-curves';
import { perfectPower } from './perfect-power';
import { isPrimeWithoutSmallFactor } from './prime';
import { quadraticSieve } from './quadratic-sieve/quadratic-sieve';
import { rho } from './rho';
import { squareForms } from './square-forms';
import { smallPrimeDivisors, TRIAL_BOUND } from './small-primes';
import { valuation } from './valuation';

export interface PrimePower {
  readonly prime: bigint;
  readonly exponent: number;
}

/**
 * The prime factorisation of |n| for n ≠ 0, primes ascending; empty for ±1. Throws a RangeError for 0.
 *
 * Trial division to 2^12, perfect powers, rho, elliptic curves for long numbers, then the quadratic sieve. Primes are primes
 * in the sense of `isPrime`; the product is compared with n before the answer is given. The same n always takes the same
 * way. `budget.spend` is called all along, so that the caller can stop it.
 */
export function factor(n: bigint, budget: Budget): readonly PrimePower[] {
  if (n === 0n) throw new RangeError('0 has no prime factorisation');
  const whole = n < 0n ? -n : n;
  const found = new Map<bigint, number>();
  let rest = whole;
  for (const p of smallPrimeDivisors(whole)) {
    const { exponent, unit } = valuation(rest, BigInt(p));
    found.set(BigInt(p), exponent);
    rest = unit;
  }
  const doing = `factoring ${named(whole)}`;
  split(rest, 1, found, { spend: () => budget.spend(doing) }, doing);
  const factors = [...found].map(([prime, exponent]) => ({ prime, exponent }));
  factors.sort((a, b) => (a.prime < b.prime ? -1 : 1));
  const product = factors.reduce((value, { prime, exponent }) => value * prime ** BigInt(exponent), 1n);
  if (product !== whole) throw new Error(`the factors found do not multiply back to ${named(whole)}`);
  return factors;
}

/** Adds the prime factors of n^multiplicity to `found`; n ≥ 1 has no prime factor below 2^12. */
function split(n: bigint, multiplicity: number, found: Map<bigint, number>, budget: Budget, doing: string): void {
  if (n === 1n) return;
  budget.spend(doing);
  if (n < BigInt(TRIAL_BOUND) ** 2n || isPrimeWithoutSmallFactor(n, budget)) {
    found.set(n, (found.get(n) ?? 0) + multiplicity);
    return;
  }
  const { root, exponent } = perfectPower(n);
  if (exponent > 1) return split(root, multiplicity * exponent, found, budget, doing);
  const divisor = properDivisor(n, budget, doing);
  split(divisor, multiplicity, found, budget, doing);
  split(n / divisor, multiplicity, found, budget, doing);
}

/** Up to this length rho alone is quickest where square forms do not settle it; up to the second the quadratic sieve ends in a time worth waiting for. */
const RHO_BITS = 52;
const SIEVE_BITS = 280;

/** Elliptic curves against factors of about 12, 15, 20, 25, … digits: how long n must be for them, the bound B₁, how many. */
const stages: readonly { readonly bits: number; readonly bound: number; readonly curves: number }[] = [
  { bits: 150, bound: 500, curves: 10 },
  { bits: 175, bound: 2000, curves: 25 },
  { bits: 205, bound: 11000, curves: 90 },
  { bits: 240, bound: 50000, curves: 240 },
  { bits: 280, bound: 250000, curves: 500 },
];

/** A divisor other than 1 and n of a composite n that is no perfect power and has no prime factor below 2^12. */
function properDivisor(n: bigint, budget: Budget, doing: string): bigint {
  const bits = bitLength(n);
  const small = bits < 53 ? squareForms(Number(n)) : undefined;
  if (small !== undefined) return BigInt(small);
  let divisor = rho(n, bits <= RHO_BITS ? Number.POSITIVE_INFINITY : bits < 100 ? 2048 : 8192, budget, doing);
  for (const stage of stages) {
    if (bits < stage.bits) break;
    divisor ??= ellipticCurves(n, stage.bound, stage.curves, budget, doing);
  }
  if (bits <= SIEVE_BITS) divisor ??= quadraticSieve(n, budget, doing);
  divisor ??= ellipticCurves(n, 1_000_000, Number.POSITIVE_INFINITY, budget, doing);
  if (divisor === undefined) throw new Error(`no factor found of ${named(n)}`);
  return divisor;
}

/** A number as it is named in a message. */
function named(n: bigint): string {
  const bits = bitLength(n);
  return bits <= 200 ? n.toString() : `a number of ${n.toString().length} digits`;
}
