import type { Budget } from '../arith/budget';
import { elementText } from '../expression/to-text';
import { degree } from '../field/polynomial';
import { rationals, type Rational } from '../field/rational';
import { writePolynomial } from '../field/write-polynomial';
import { reductionsAt, reductionsAtInfinity, type ReducedEntry } from '../place/reduced-entry';
import type { FunctionEntry } from '../place/function-entry';
import { total } from '../ring/write-word';
import type { Finding } from './finding';
import { residueClasses, specialisationClasses } from './function-classes';
import type { FunctionStatement } from './function-statement';
import type { NormalizedDegree } from './outcome';
import { overRationals, type OverRationals, type WriteSide } from './over-rationals-finding';
import type { RationalClasses } from './rational-classes';
import { rationalFindings } from './rational-findings';
import { rationalNormalForm } from './rational-normal-form';

/**
 * What decides equality in K^MW_n(ℚ(t)) as far as places of degree 1 and infinity go: the residues at t − a and the specialisation at
 * infinity, each by what decides over ℚ. J. Milnor, Algebraic K-theory and quadratic forms, Invent. Math. 9 (1970), Theorem 2.3;
 * F. Morel, LNM 2052, Theorem 3.24 (number from memory).
 */
export function rationalPlaceFindings(
  { sides, sight, terms, functions, order }: FunctionStatement<Rational>,
  budget: Budget,
): readonly Finding[] {
  const atInfinity = findingsOf(
    { map: 'specialisation', place: 'infinity', shift: 0 },
    specialisationClasses(sides, reductionsAtInfinity()),
    budget,
  );
  const residues = order()
    .filter((index) => degree(sight.places[index]!) === 1)
    .flatMap((index) =>
      findingsOf(
        {
          map: 'residue',
          place: elementText(writePolynomial(rationals, sight.places[index]!, functions.generator)),
          shift: 1,
        },
        residueClasses([terms(0, index), terms(1, index)], reductionsAt(sight.places, index)),
        budget,
      ),
    );
  return [...atInfinity, ...residues];
}

const findingsOf = (
  origin: Omit<OverRationals, 'write'>,
  classes: RationalClasses<FunctionEntry<Rational>, ReducedEntry>,
  budget: Budget,
): readonly Finding[] =>
  overRationals({ ...origin, write: formWriter(classes, budget) }, rationalFindings(classes, budget));

/** Writes canonical forms, each side at once when one of its degrees is asked for. */
export function formWriter(classes: RationalClasses<FunctionEntry<Rational>, ReducedEntry>, budget: Budget): WriteSide {
  const forms: (readonly NormalizedDegree[] | undefined)[] = [];
  return (side, own) => {
    const found = (forms[side] ??= rationalNormalForm(classes, side, budget));
    return found.find((part) => part.degree === own)?.normalForm ?? total([]);
  };
}
