import type { Budget } from '../arith/budget';
import { elementText } from '../expression/to-text';
import { degree } from '../field/polynomial';
import { rationals, type Rational } from '../field/rational';
import { writePolynomial } from '../field/write-polynomial';
import type { FunctionEntry } from '../place/function-entry';
import { reductionsAt, reductionsAtInfinity, type ReducedEntry } from '../place/reduced-entry';
import { total } from '../ring/write-word';
import type { Decision } from './decidable-field';
import type { Finding } from './finding';
import { residueClasses, specialisationClasses } from './function-classes';
import { numberPlaces } from './function-number-classes';
import type { FunctionStatement } from './function-statement';
import { NumberArithmetic } from './number-arithmetic';
import { numberFindings, type NumberDecision } from './number-findings';
import type { NormalizedDegree } from './outcome';
import { overRationals, type OverRationals, type WriteSide } from './over-rationals-finding';
import type { RationalClasses } from './rational-classes';
import { rationalFindings } from './rational-findings';
import { writtenOverRationals } from './rational-writing';

/**
 * What decides equality in K^MW_n(ℚ(t)): the specialisation at infinity and the residues at t − a, by what decides over ℚ; the residues at
 * places of higher degree, by what decides over number fields. J. Milnor, Algebraic K-theory and quadratic forms, Invent. Math. 9
 * (1970), Theorem 2.3; F. Morel, LNM 2052, Theorem 3.24 (number from memory). No residue is written out to be decided.
 */
export function rationalFunctionDecision(
  statement: FunctionStatement<Rational>,
  budget: Budget,
): Pick<Decision, 'findings' | 'open'> {
  const { sides, sight, terms, functions, order } = statement;
  const atInfinity = overQ(
    { map: 'specialisation', place: 'infinity', shift: 0 },
    specialisationClasses(sides, reductionsAtInfinity()),
    budget,
  );
  const numbers = numberPlaces(statement, budget);
  const residues = order().map((index): NumberDecision => {
    const ramified = [terms(0, index), terms(1, index)];
    const place = elementText(writePolynomial(rationals, sight.places[index]!, functions.generator));
    const origin = { map: 'residue', place, shift: 1 } as const;
    if (degree(sight.places[index]!) === 1) {
      const classes = residueClasses(ramified, reductionsAt(sight.places, index));
      return { findings: overQ(origin, classes, budget), open: [] };
    }
    const classes = numbers.residues(ramified, index);
    return numberFindings(origin, classes, new NumberArithmetic(classes.field, classes.generators, budget), budget);
  });
  return {
    findings: [...atInfinity, ...residues.flatMap(({ findings }) => findings)],
    open: residues.flatMap(({ open }) => open),
  };
}

type Classes = RationalClasses<FunctionEntry<Rational>, ReducedEntry>;

const overQ = (origin: Omit<OverRationals, 'write'>, classes: Classes, budget: Budget): readonly Finding[] =>
  overRationals({ ...origin, write: formWriter(classes, budget) }, rationalFindings(classes, budget));

/** Writes each side at once when one of its degrees is asked for. */
function formWriter(classes: Classes, budget: Budget): WriteSide {
  const forms: (readonly NormalizedDegree[] | undefined)[] = [];
  return (side, own) => {
    const found = (forms[side] ??= writtenOverRationals(classes, side, budget));
    return found.find((part) => part.degree === own)?.normalForm ?? total([]);
  };
}
