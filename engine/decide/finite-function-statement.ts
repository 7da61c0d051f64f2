import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import { factoredFunctions, type FactoredFunction } from '../field/factored-function';
import { comparePolynomials, factorOverFinite } from '../field/factor-finite';
import type { Field, FiniteField } from '../field/field';
import { functionField, type FunctionField } from '../field/function-field';
import type { Polynomial } from '../field/polynomial';
import { finitePolynomialTools } from '../field/polynomial-tools';
import { functionSight, type FunctionEntry, type FunctionSight } from '../place/function-entry';
import { finitePlace, type FunctionPlace } from '../place/function-place';
import { classedUnit } from '../ring/field-units';
import { lower } from '../ring/lower';
import { mappedRing } from '../ring/mapped-ring';
import { residueClassRing, type ResidueClass } from '../ring/residue-class-ring';
import type { GradedRing } from '../ring/graded-ring';
import type { Term } from '../ring/term';
import { fieldUnits } from '../ring/field-units';
import { unitReader } from './read-unit';
import { termsByIndex } from './terms-by-index';

/** Words over k(t), k finite, in kernel form, with the places at which they ramify. */
export interface FiniteFunctionStatement<E> {
  readonly base: FiniteField<E>;
  readonly functions: FunctionField<E>;
  readonly written: Field<FactoredFunction<E>>;
  readonly sides: readonly (readonly Term<FunctionEntry<E>>[])[];
  readonly sight: FunctionSight<E>;
  /** The indices of the places in sight, by degree and then by the coefficients from the top. */
  order(): readonly number[];
  place(index: number): FunctionPlace<E, unknown>;
  /** The terms of a side that ramify at the place with this index, in order. */
  terms(side: number, index: number): readonly Term<FunctionEntry<E>>[];
  /** [f] ↦ [leading coefficient]: the specialisation at infinity with uniformizer 1/t. */
  readonly atInfinity: GradedRing<FunctionEntry<E>, ResidueClass<E>>;
}

/** Reads the entries of expressions as units of k(letter). */
export function finiteFunctionStatement<E>(
  base: FiniteField<E>,
  letter: string,
  expressions: readonly Expression[],
  budget: Budget,
): FiniteFunctionStatement<E> {
  const functions = functionField(base, letter, finitePolynomialTools(base, budget));
  const written = factoredFunctions(functions);
  const sight = functionSight(
    base,
    (c) => base.index(c).toString(36),
    (f, at) => placed(at, () => factorOverFinite(base, f, budget).factors),
  );
  const read = unitReader(written, budget);
  const entry = (element: Element): FunctionEntry<E> => sight.entry(read(element), element.at);
  const sides = expressions.map((side) => lower(side, entry));
  const { places } = sight;
  const bySide = sides.map((side) => termsByIndex(side, places.length));
  return {
    base,
    functions,
    written,
    sides,
    sight,
    order: () => [...places.keys()].sort((i, j) => comparePlaces(base, places, i, j)),
    place: (index) => finitePlace(base, letter, functions.tools, places, index),
    terms: (side, index) => bySide[side]?.(index) ?? [],
    atInfinity: mappedRing(residueClassRing(fieldUnits(base)), ({ lead }) => classedUnit(base, lead)),
  };
}

/** The fixed order of places: by degree, then by the coefficients from the top. */
export const comparePlaces = <E>(
  base: FiniteField<E>,
  places: readonly Polynomial<E>[],
  i: number,
  j: number,
): number => comparePolynomials(base, places[i] ?? [], places[j] ?? []);

/** Runs a factorisation; a budget that ends inside it is about the entry at hand. */
export function placed<T>(at: Span | undefined, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (error instanceof Refusal && error.code === 'budget' && error.at === undefined)
      throw new Refusal('budget', error.message, at);
    throw error;
  }
}
