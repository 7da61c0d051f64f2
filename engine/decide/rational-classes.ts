import type { Budget } from '../arith/budget';
import { rationalEntry, type RationalEntry } from '../place/rational-entry';
import type { Visited } from '../place/theta-ring';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import type { ResidueRing } from '../ring/residue-ring';
import type { Term } from '../ring/term';
import type { RationalStatement } from './rational-statement';

/**
 * Classes of K^MW_*(ℚ) that are known by their images in graded rings: words with rational entries, or residues of words over a
 * field that has ℚ as a residue field, which are never written out. `A` is an entry of the words, `B` the unit of ℚ it becomes.
 */
export interface RationalClasses<A, B extends Visited> {
  readonly sides: readonly (readonly Term<A>[])[];
  /** All units of ℚ that occur. */
  readonly entries: readonly RationalEntry[];
  unit(entry: A): B;
  rational(unit: B): RationalEntry;
  readonly minusOne: B;
  /** The image of the class of some terms; it is linear in the terms. */
  image<H>(terms: readonly Term<A>[], ring: ResidueRing<B, H>, budget: Budget): Graded<H>;
  /** The degrees in which the class of some terms can be other than 0, highest first. */
  degrees(terms: readonly Term<A>[]): readonly number[];
}

/** Words with rational entries as classes. */
export function wordClasses({ sides, entries }: RationalStatement): RationalClasses<RationalEntry, RationalEntry> {
  return {
    sides,
    entries,
    unit: (entry) => entry,
    rational: (unit) => unit,
    minusOne: rationalEntry({ num: -1n, den: 1n }),
    image: evaluate,
    degrees: degreesOf,
  };
}
