import type { Budget } from '../arith/budget';
import type { Expression } from '../expression/expression';
import { comparePolynomials, factorOverFinite } from '../field/factor-finite';
import type { FiniteField } from '../field/field';
import { functionField } from '../field/function-field';
import { finitePolynomialTools } from '../field/polynomial-tools';
import type { FunctionEntry } from '../place/function-entry';
import { finitePlace, type FunctionPlace } from '../place/function-place';
import { classedUnit, fieldUnits } from '../ring/field-units';
import type { GradedRing } from '../ring/graded-ring';
import { mappedRing } from '../ring/mapped-ring';
import { residueClassRing, type ResidueClass } from '../ring/residue-class-ring';
import { functionStatement, type Constants, type FunctionStatement } from './function-statement';

/** Words over k(t), k finite. */
export interface FiniteFunctionStatement<E> extends FunctionStatement<E> {
  readonly base: FiniteField<E>;
  place(index: number): FunctionPlace<E, unknown>;
  /** [f] ↦ [leading coefficient]: the specialisation at infinity with uniformizer 1/t. */
  readonly atInfinity: GradedRing<FunctionEntry<E>, ResidueClass<E>>;
}

/** A finite field as constants. */
export const finiteConstants = <E>(base: FiniteField<E>, letter: string, budget: Budget): Constants<E> => ({
  functions: functionField(base, letter, finitePolynomialTools(base, budget)),
  nameOf: (c) => base.index(c).toString(36),
  factor: (f) => factorOverFinite(base, f, budget).factors,
  compare: (f, g) => comparePolynomials(base, f, g),
});

/** Reads the entries of expressions as units of k(letter). */
export function finiteFunctionStatement<E>(
  base: FiniteField<E>,
  letter: string,
  expressions: readonly Expression[],
  budget: Budget,
): FiniteFunctionStatement<E> {
  const statement = functionStatement(finiteConstants(base, letter, budget), expressions, budget);
  const { sight, functions } = statement;
  return {
    ...statement,
    base,
    place: (index) => finitePlace(base, letter, functions.tools, sight.places, index),
    atInfinity: mappedRing(residueClassRing(fieldUnits(base)), ({ lead }) => classedUnit(base, lead)),
  };
}
