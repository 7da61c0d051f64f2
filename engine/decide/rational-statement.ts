import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import { rationals } from '../field/rational';
import { forEachExponent, rationalEntries, type RationalEntry } from '../place/rational-entry';
import { see, type BaseElement, type Splitting } from '../place/sight';
import { lower } from '../ring/lower';
import { forEachEntry, type Term } from '../ring/term';
import { unitReader } from './read-unit';

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
export interface Incidence {
  readonly base: readonly BaseElement[];
  readonly entries: readonly RationalEntry[];
  /** The terms of a side that ramify at the base element with this index, in order. */
  terms(side: number, index: number): readonly Term<RationalEntry>[];
}

/** Finds the primes in sight and which terms ramify where: linear in the number of pairs of a term and a prime in it. */
export function incidence({ sides, entries }: RationalStatement, split: Splitting, budget: Budget): Incidence {
  const base = see(entries, split, budget);
  const bySide = sides.map((side) => termsByIndex(side, base.length));
  return { base, entries, terms: (side, index) => bySide[side]?.(index) ?? [] };
}

/** Sorts terms by the base elements at which they ramify: counted first, so that one list holds them all. */
function termsByIndex(
  side: readonly Term<RationalEntry>[],
  size: number,
): (index: number) => readonly Term<RationalEntry>[] {
  const forEachRamified = (visit: (term: Term<RationalEntry>, index: number) => void): void => {
    const last = new Array<Term<RationalEntry> | undefined>(size).fill(undefined);
    let term: Term<RationalEntry>;
    const atIndex = (index: number): void => {
      if (last[index] !== term) visit(term, index);
      last[index] = term;
    };
    const atEntry = (entry: RationalEntry): void => forEachExponent(entry, atIndex);
    for (term of side) forEachEntry(term, atEntry);
  };
  // where the terms of an index begin and end; while they are counted, shifted by one
  const starts = new Uint32Array(size + 1);
  forEachRamified((_, index) => (starts[index + 1] = (starts[index + 1] ?? 0) + 1));
  for (let i = 1; i <= size; i += 1) starts[i] = (starts[i] ?? 0) + (starts[i - 1] ?? 0);
  const sorted = new Array<Term<RationalEntry>>(starts[size] ?? 0);
  const next = starts.slice();
  forEachRamified((term, index) => {
    const at = next[index] ?? 0;
    next[index] = at + 1;
    sorted[at] = term;
  });
  return (index) => sorted.slice(starts[index], starts[index + 1]);
}
