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
  const stripped = new Map<Int, Stripped>();
  const primes = new Set<Int>();
  const hard = new Set<bigint>();
  const strip = (n: bigint, entry: RationalEntry): Stripped => {
    const key = toInt(n);
    const known = stripped.get(key);
    if (known !== undefined) return known;
    budget.spend('looking for the primes of the entries');
    const made = n < EXACT ? stripSmall(Number(n), entry, budget) : stripLarge(n, entry, budget);
    for (const [p] of made.factors) primes.add(p);
    if (made.rest > 1n) hard.add(made.rest);
    stripped.set(key, made);
    return made;
  };
  const parts = entries.map((entry) => ({
    entry,
    above: strip(entry.negative ? -entry.value.num : entry.value.num, entry),
    below: entry.value.den === 1n ? undefined : strip(entry.value.den, entry),
  }));

  const base: BaseElement[] = hardBase(hard, primes, split, entries, budget).filter(
    ({ value }) => !primes.has(toInt(value)),
  );
  for (const p of primes) base.push({ value: BigInt(p), prime: true });
  base.sort((a, b) => (a.value < b.value ? -1 : 1));
  const index = new Map<Int, number>(base.map(({ value }, i) => [toInt(value), i]));
  // what a composite is made of: none of its factors is found by trial division
  const large =
    hard.size === 0 ? [] : base.flatMap(({ value }, i) => (value >= BigInt(TRIAL_BOUND) ? [{ value, i }] : []));

  for (const { entry, above, below } of parts) {
    const exponents = new Map<number, Int>();
    for (const [part, sign] of [[above, 1] as const, [below, -1] as const]) {
      if (part === undefined) continue;
      for (const [p, e] of part.factors) exponents.set(index.get(p) ?? -1, sign * e);
      if (part.rest === 1n) continue;
      for (const { value, i } of large) {
        const e = valuation(part.rest, value).exponent;
        if (e !== 0) exponents.set(i, sign * e + Number(exponents.get(i) ?? 0));
      }
    }
    entry.exponents = exponents;
  }
  return base;
}

/** Strips 1 ≤ n < 2^53. */
function stripSmall(n: number, entry: RationalEntry, budget: Budget): Stripped {
  const factors: [Int, number][] = [];
  let rest = n;
  for (const p of smallPrimes) {
    if (p * p > rest) break;
    if (rest % p !== 0) continue;
    let exponent = 0;
    do {
      rest /= p;
      exponent += 1;
    } while (rest % p === 0);
    factors.push([p, exponent]);
  }
  if (rest === 1) return { factors, rest: 1n };
  if (rest < TRIAL_BOUND * TRIAL_BOUND) factors.push([rest, 1]);
  else
    for (const { prime, exponent } of factorEntry(BigInt(rest), entry, budget)) factors.push([toInt(prime), exponent]);
  return { factors, rest: 1n };
}

/** Strips n ≥ 2^53: primes below the trial bound, then what is prime or below 2^60. */
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
  primes: ReadonlySet<Int>,
  split: Splitting,
  entries: readonly RationalEntry[],
  budget: Budget,
): readonly BaseElement[] {
  if (hard.size === 0) return [];
  const rests = new Set<bigint>();
  for (const n of hard) {
    let rest = n;
    for (const p of primes) if (rest % BigInt(p) === 0n) rest = valuation(rest, BigInt(p)).unit;
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
