import type { Budget } from '../arith/budget';
import type { Rational } from '../field/rational';
import type { FunctionEntry } from '../place/function-entry';
import { reducedMinusOne, type ReducedEntry, type Reductions } from '../place/reduced-entry';
import { thetaRingOver, type ThetaPair } from '../place/theta-ring';
import { degreesOf } from '../ring/degrees';
import { evaluate } from '../ring/evaluate';
import type { Graded } from '../ring/graded-ring';
import type { ResidueRing } from '../ring/residue-ring';
import { forEachEntry, type Term } from '../ring/term';
import type { RationalClasses } from './rational-classes';

type Terms = readonly Term<FunctionEntry<Rational>>[];

/** The residues in K^MW_*(ℚ) of words over ℚ(t) at a place with residue field ℚ, as classes. */
export const residueClasses = (
  sides: readonly Terms[],
  reductions: Reductions,
): RationalClasses<FunctionEntry<Rational>, ReducedEntry> => classes(sides, reductions, (value) => value.d, 1);

/** The specialisations in K^MW_*(ℚ) of words over ℚ(t) at a place with residue field ℚ, as classes. */
export const specialisationClasses = (
  sides: readonly Terms[],
  reductions: Reductions,
): RationalClasses<FunctionEntry<Rational>, ReducedEntry> => classes(sides, reductions, (value) => value.s, 0);

/** `part` of the value in the Θ-ring, which lies `shift` degrees lower. */
function classes(
  sides: readonly Terms[],
  reductions: Reductions,
  part: <H>(value: ThetaPair<H>) => H | undefined,
  shift: number,
): RationalClasses<FunctionEntry<Rational>, ReducedEntry> {
  for (const side of sides) for (const term of side) forEachEntry(term, (entry) => void reductions.at(entry));
  return {
    sides,
    entries: reductions.met(),
    unit: (entry) => reductions.at(entry),
    rational: ({ rational }) => rational,
    minusOne: reducedMinusOne(),
    image<H>(terms: Terms, ring: ResidueRing<ReducedEntry, H>, budget: Budget): Graded<H> {
      const values: Graded<H> = new Map();
      const theta = thetaRingOver<FunctionEntry<Rational>, ReducedEntry, H>(ring, (entry) => reductions.at(entry));
      for (const [degree, value] of evaluate(terms, theta, budget)) {
        const found = part(value);
        if (found !== undefined) values.set(degree - shift, found);
      }
      return values;
    },
    degrees: (terms) => degreesOf(terms).map((degree) => degree - shift),
  };
}
