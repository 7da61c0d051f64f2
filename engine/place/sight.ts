import { EXACT } from '../arith/bits';
import type { Budget } from '../arith/budget';
import { coprimeBase } from '../arith/coprime-base';
import { factor } from '../arith/factor';
import { toInt, type Int } from '../arith/int';
import { perfectPower } from '../arith/perfect-power';
import { isPrime } from '../arith/prime';
import { smallPrimeDivisors, smallPrimes, TRIAL_BOUND } from '../arith/small-primes';
import { valuation } from '../arith/valuation';
import { Refusal } from '../expression/refusal';
import type { RationalEntry } from './rational-entry';

/** An element of a coprime base: a prime, or a number that has not been split, most often a composite. */
export interface BaseElement {
  readonly value: bigint;
  readonly prime: boolean;
}

/** Composites below this are split at once: that costs less than asking whether one can do without. */
const SPLIT_AT_ONCE = 1n << 60n;

/** Larger numbers are taken for composites until they have to be split: the test would cost more than it can save. */
const TESTED_FOR_PRIMALITY = 1n << 2048n;

/** Which of the large composites to split into primes. */
export type Splitting = 'none' | 'all' | ReadonlySet<bigint>;

/** A positive integer as far as it is taken apart at little cost: primes with exponents, and a composite without small factors. */
interface Stripped {
  readonly factors: readonly (readonly [prime: Int, exponent: number])[];
  readonly rest: bigint;
}

/**
 * The primes in sight: a coprime base of the numerators and denominators of all entries, ascending, in which every element
 * below 2^60 is prime and no element is a perfect power. Larger composites are split only if `split` says so, for equality
 * can often be settled without. Sets `exponents` of every entry.
 *
 * Throws a Refusal `budget` that points to the entry when a factorisation does not end in time.
 */
export function see(entries: readonly RationalEntry[], split: Splitting, budget: Budget): readonly BaseElement[] {
  const primes = new Map<Int, number>();
  const stripped = new Map<bigint, Stripped>();
  const rests = new Map<RationalEntry, { readonly above: bigint; readonly below: bigint }>();
  /** Appends the primes of n with sign times their exponents, and gives the composite that is left. */
  const strip = (n: bigint, sign: 1 | -1, entry: RationalEntry, exponents: Int[]): bigint => {
    budget.spend('looking for the primes of the entries');
    if (n < EXACT) {
      stripSmall(Number(n), sign, entry, exponents, budget);
      return 1n;
    }
    const known = stripped.get(n) ?? stripLarge(n, entry, budget);
    stripped.set(n, known);
    for (const [p, e] of known.factors) exponents.push(p, sign * e);
    return known.rest;
  };
  for (const entry of entries) {
    const { num, den } = entry.value;
    const exponents: Int[] = [];
    const above = strip(entry.negative ? -num : num, 1, entry, exponents);
    const below = strip(den, -1, entry, exponents);
    if (above !== 1n || below !== 1n) rests.set(entry, { above, below });
    for (let i = 0; i < exponents.length; i += 2) primes.set(exponents[i] ?? 1, -1);
    entry.exponents = exponents; // by the primes themselves until all are known
  }

  const hard = new Set([...rests.values()].flatMap(({ above, below }) => [above, below].filter((n) => n !== 1n)));
  const base: BaseElement[] = hardBase(hard, primes, split, entries, budget).filter(
    ({ value }) => !primes.has(toInt(value)),
  );
  for (const p of primes.keys()) base.push({ value: BigInt(p), prime: true });
  base.sort((a, b) => (a.value < b.value ? -1 : 1));
  base.forEach(({ value }, i) => primes.set(toInt(value), i));
  // what a composite is made of: none of its factors is found by trial division
  const large =
    hard.size === 0 ? [] : base.flatMap(({ value }, i) => (value >= BigInt(TRIAL_BOUND) ? [{ value, i }] : []));

  for (const entry of entries) {
    const exponents = entry.exponents.map((x, i) => (i % 2 === 0 ? (primes.get(x) ?? -1) : x));
    entry.exponents = exponents;
    const rest = rests.get(entry);
    if (rest === undefined) continue;
    for (const { value, i } of large) {
      const e = valuation(rest.above, value).exponent - valuation(rest.below, value).exponent;
      if (e !== 0) exponents.push(i, e);
    }
  }
  return base;
}

/** Appends the primes of 1 ≤ n < 2^53 with sign times their exponents. */
function stripSmall(n: number, sign: 1 | -1, entry: RationalEntry, exponents: Int[], budget: Budget): void {
  let rest = n;
  for (const p of smallPrimes) {
    if (p * p > rest) break;
    if (rest % p !== 0) continue;
    let exponent = 0;
    do {
      rest /= p;
      exponent += sign;
    } while (rest % p === 0);
    exponents.push(p, exponent);
  }
  if (rest === 1) return;
  if (rest < TRIAL_BOUND * TRIAL_BOUND) exponents.push(rest, sign);
  else
    for (const { prime, exponent } of factorEntry(BigInt(rest), entry, budget))
      exponents.push(toInt(prime), sign * exponent);
}

/** Takes n ≥ 2^53 apart: primes below the trial bound, then what is prime or below 2^60. */
function stripLarge(n: bigint, entry: RationalEntry, budget: Budget): Stripped {
  const factors: [Int, number][] = [];
  let rest = n;
  for (const p of smallPrimeDivisors(n)) {
    const { exponent, unit } = valuation(rest, BigInt(p));
    factors.push([p, exponent]);
    rest = unit;
  }
  if (rest === 1n) return { factors, rest };
  if (rest >= TESTED_FOR_PRIMALITY || (rest >= SPLIT_AT_ONCE && !isPrime(rest, budget))) return { factors, rest };
  const split = rest >= SPLIT_AT_ONCE ? [{ prime: rest, exponent: 1 }] : factorEntry(rest, entry, budget);
  for (const { prime, exponent } of split) factors.push([toInt(prime), exponent]);
  return { factors, rest: 1n };
}

/** A coprime base of the composites that resisted, refined against the known primes and split as far as asked. */
function hardBase(
  hard: ReadonlySet<bigint>,
  primes: ReadonlyMap<Int, number>,
  split: Splitting,
  entries: readonly RationalEntry[],
  budget: Budget,
): readonly BaseElement[] {
  if (hard.size === 0) return [];
  const rests = new Set<bigint>();
  for (const n of hard) {
    let rest = n;
    for (const p of primes.keys()) if (rest % BigInt(p) === 0n) rest = valuation(rest, BigInt(p)).unit;
    if (rest > 1n) rests.add(rest);
  }
  const elements: BaseElement[] = [];
  for (const b of coprimeBase([...rests])) {
    const { root } = perfectPower(b);
    const toSplit = root < SPLIT_AT_ONCE || split === 'all' || (split !== 'none' && split.has(root));
    if ((toSplit || root < TESTED_FOR_PRIMALITY) && isPrime(root, budget)) elements.push({ value: root, prime: true });
    else if (toSplit) {
      const owner = entries.find(({ value }) => value.num % root === 0n || value.den % root === 0n);
      for (const { prime } of factorEntry(root, owner, budget)) elements.push({ value: prime, prime: true });
    } else elements.push({ value: root, prime: false });
  }
  return elements;
}

function factorEntry(n: bigint, entry: RationalEntry | undefined, budget: Budget): ReturnType<typeof factor> {
  try {
    return factor(n, budget);
  } catch (error) {
    if (error instanceof Refusal && error.code === 'budget' && error.at === undefined)
      throw new Refusal('budget', error.message, entry?.at);
    throw error;
  }
}
