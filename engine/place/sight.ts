import type { Budget } from '../arith/budget';
import { coprimeBase } from '../arith/coprime-base';
import { factor } from '../arith/factor';
import { perfectPower } from '../arith/perfect-power';
import { isPrime } from '../arith/prime';
import { smallPrimeDivisors, TRIAL_BOUND } from '../arith/small-primes';
import { valuation } from '../arith/valuation';
import { Refusal } from '../expression/refusal';
import type { RationalEntry } from './rational-entry';

/** An element of a coprime base: a prime, or a number that is composite but has not been split. */
export interface BaseElement {
  readonly value: bigint;
  readonly prime: boolean;
}

/** Composites below this are split at once: that costs less than asking whether one can do without. */
const SPLIT_AT_ONCE = 1n << 60n;

/** Which of the large composites to split into primes. */
export type Splitting = 'none' | 'all' | ReadonlySet<bigint>;

/**
 * The primes in sight: a coprime base of the numerators and denominators of all entries, ascending, in which every element
 * below 2^60 is prime and no element is a perfect power. Larger composites are split only if `split` says so, for equality
 * can often be settled without. Sets `exponents` of every entry.
 *
 * Throws a Refusal `budget` that points to the entry when a factorisation does not end in time.
 */
export function see(entries: readonly RationalEntry[], split: Splitting, budget: Budget): readonly BaseElement[] {
  const composites = new Set<bigint>();
  const primes = new Set<bigint>();
  const hard = new Set<bigint>();
  const stripped: { entry: RationalEntry; parts: readonly { sign: bigint; primes: Map<bigint, bigint>; rest: bigint }[] }[] = [];

  for (const entry of entries) {
    budget.spend('looking for the primes of the entries');
    const part = (n: bigint, sign: bigint) => {
      const found = new Map<bigint, bigint>();
      const rest = strip(n, found, entry, budget);
      for (const p of found.keys()) primes.add(p);
      if (rest > 1n) hard.add(rest);
      return { sign, primes: found, rest };
    };
    const size = entry.value.num < 0n ? -entry.value.num : entry.value.num;
    stripped.push({ entry, parts: [part(size, 1n), part(entry.value.den, -1n)].filter((p) => p.primes.size > 0 || p.rest > 1n) });
  }
  for (const { value, prime } of hardBase(hard, primes, split, entries, budget)) {
    if (prime) primes.add(value);
    else composites.add(value);
  }
  const base: BaseElement[] = [...primes].map((value) => ({ value, prime: true }));
  for (const value of composites) base.push({ value, prime: false });
  base.sort((a, b) => (a.value < b.value ? -1 : 1));
  const index = new Map(base.map(({ value }, i) => [value, i]));
  // what a composite is made of: none of its factors is found by trial division
  const large = hard.size === 0 ? [] : base.filter(({ value }) => value >= BigInt(TRIAL_BOUND));

  for (const { entry, parts } of stripped) {
    const exponents = new Map<number, bigint>();
    const add = (value: bigint, e: bigint): void => {
      const i = index.get(value);
      if (i !== undefined && e !== 0n) exponents.set(i, (exponents.get(i) ?? 0n) + e);
    };
    for (const { sign, primes: found, rest } of parts) {
      for (const [p, e] of found) add(p, sign * e);
      if (rest > 1n) for (const { value } of large) add(value, sign * BigInt(valuation(rest, value).exponent));
    }
    entry.exponents = exponents;
  }
  return base;
}

/** Puts the prime powers of n that are found at little cost into `found` and returns what is left. */
function strip(n: bigint, found: Map<bigint, bigint>, entry: RationalEntry, budget: Budget): bigint {
  let rest = n;
  if (rest === 1n) return rest;
  for (const p of smallPrimeDivisors(rest)) {
    const { exponent, unit } = valuation(rest, BigInt(p));
    if (exponent === 0) continue;
    found.set(BigInt(p), BigInt(exponent));
    rest = unit;
  }
  if (rest === 1n) return rest;
  if (rest >= SPLIT_AT_ONCE && !isPrime(rest)) return rest;
  for (const { prime, exponent } of rest >= SPLIT_AT_ONCE ? [{ prime: rest, exponent: 1 }] : factorEntry(rest, entry, budget))
    found.set(prime, BigInt(exponent));
  return 1n;
}

/** A coprime base of the composites that resisted, refined against the known primes and split as far as asked. */
function hardBase(
  hard: ReadonlySet<bigint>,
  primes: ReadonlySet<bigint>,
  split: Splitting,
  entries: readonly RationalEntry[],
  budget: Budget,
): readonly BaseElement[] {
  if (hard.size === 0) return [];
  const rests = new Set<bigint>();
  for (const n of hard) {
    let rest = n;
    for (const p of primes) if (rest % p === 0n) rest = valuation(rest, p).unit;
    if (rest > 1n) rests.add(rest);
  }
  const elements: BaseElement[] = [];
  for (const b of coprimeBase([...rests])) {
    const { root } = perfectPower(b);
    if (isPrime(root)) elements.push({ value: root, prime: true });
    else if (root < SPLIT_AT_ONCE || split === 'all' || (split !== 'none' && split.has(root))) {
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
