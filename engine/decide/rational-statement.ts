import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import { rationals } from '../field/rational';
import { rationalEntries, type RationalEntry } from '../place/rational-entry';
import { see, type BaseElement, type Splitting } from '../place/sight';
import type { Visited } from '../place/theta-ring';
import { lower } from '../ring/lower';
import type { Term } from '../ring/term';
import type { RationalClasses } from './rational-classes';
import { unitReader } from './read-unit';
import { termsByIndex } from './terms-by-index';

/** Words with rational entries in kernel form, and all entries that occur in them. */
export interface RationalStatement {
  readonly sides: readonly (readonly Term<RationalEntry>[])[];
  readonly entries: readonly RationalEntry[];
}

/** Reads the entries of expressions as non-zero rationals. */
export function rationalStatement(expressions: readonly Expression[], budget: Budget): RationalStatement {
  const entries = rationalEntries();
  const read = unitReader(rationals, budget);
  const sides = expressions.map((side) => lower(side, (entry) => entries.intern(read(entry), entry.at)));
  return { sides, entries: entries.all() };
}

/** The terms of each side that ramify at each element of the base, by its index. */
export interface Incidence<A> {
  readonly base: readonly BaseElement[];
  /** The terms of a side that ramify at the base element with this index, in order. */
  terms(side: number, index: number): readonly Term<A>[];
}

/** Finds the primes in sight and which terms ramify where: linear in the number of pairs of a term and a prime in it. */
export function incidence<A, B extends Visited>(
  { sides, entries, unit, rational }: RationalClasses<A, B>,
  split: Splitting,
  budget: Budget,
): Incidence<A> {
  const base = see(entries, split, budget);
  const bySide = sides.map((side) => termsByIndex(side, base.length, (entry) => rational(unit(entry)).exponents));
  return { base, terms: (side, index) => bySide[side]?.(index) ?? [] };
}
