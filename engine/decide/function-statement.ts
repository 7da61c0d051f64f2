import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { Refusal } from '../expression/refusal';
import type { Span } from '../expression/span';
import { factoredFunctions, type FactoredFunctions } from '../field/factored-function';
import type { FunctionField } from '../field/function-field';
import type { Polynomial } from '../field/polynomial';
import { functionSight, type FunctionEntry, type FunctionSight, type Prime } from '../place/function-entry';
import { lower } from '../ring/lower';
import type { Term } from '../ring/term';
import { unitReader } from './read-unit';
import { termsByIndex } from './terms-by-index';

/** What reading words over k(t) needs to know of k. */
export interface Constants<E> {
  readonly functions: FunctionField<E>;
  /** Different names for different constants, without commas. */
  nameOf(c: E): string;
  /** The irreducible factors of a monic polynomial of degree ≥ 2. */
  factor(f: Polynomial<E>): readonly Prime<E>[];
  /** The fixed order of monic irreducible polynomials: by degree first. */
  compare(f: Polynomial<E>, g: Polynomial<E>): number;
}

/** Words over k(t) in kernel form, with the places at which they ramify. */
export interface FunctionStatement<E> {
  readonly functions: FunctionField<E>;
  readonly written: FactoredFunctions<E>;
  readonly sides: readonly (readonly Term<FunctionEntry<E>>[])[];
  readonly sight: FunctionSight<E>;
  /** The indices of the places in sight, in the fixed order. */
  order(): readonly number[];
  /** The fixed order of places by their indices. */
  compare(i: number, j: number): number;
  /** The terms of a side that ramify at the place with this index, in order. */
  terms(side: number, index: number): readonly Term<FunctionEntry<E>>[];
}

/** Reads the entries of expressions as units of k(t). */
export function functionStatement<E>(
  { functions, nameOf, factor, compare }: Constants<E>,
  expressions: readonly Expression[],
  budget: Budget,
): FunctionStatement<E> {
  const written = factoredFunctions(functions);
  const sight = functionSight(functions.base, nameOf, (f, at) => placed(at, () => factor(f)));
  const read = unitReader(written, budget);
  const entry = (element: Element): FunctionEntry<E> => sight.entry(read(element), element.at);
  const sides = expressions.map((side) => lower(side, entry));
  const { places } = sight;
  const bySide = sides.map((side) => termsByIndex(side, places.length, ({ exponents }) => exponents));
  const byIndex = (i: number, j: number): number => compare(places[i] ?? [], places[j] ?? []);
  return {
    functions,
    written,
    sides,
    sight,
    order: () => [...places.keys()].sort(byIndex),
    compare: byIndex,
    terms: (side, index) => bySide[side]?.(index) ?? [],
  };
}

/** Runs a factorisation; a budget that ends inside it is about the entry at hand. */
function placed<T>(at: Span | undefined, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (error instanceof Refusal && error.code === 'budget' && error.at === undefined)
      throw new Refusal('budget', error.message, at);
    throw error;
  }
}
