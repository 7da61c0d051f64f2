import type { Budget } from '../arith/budget';
import type { Int } from '../arith/int';
import type { NumberField, NumberFieldElement } from '../field/number-field';
import type { Visited } from '../place/theta-ring';
import type { Graded } from '../ring/graded-ring';
import type { ResidueRing } from '../ring/residue-ring';
import type { Term } from '../ring/term';

/** A unit of a number field as a product of powers of generators: the number of a generator and its exponent, in turn. */
export interface NumberUnit extends Visited {
  readonly exponents: readonly Int[];
}

/**
 * Classes of K^MW_*(L), L a number field, that are known by their images in graded rings: words over L, or residues of words over ℚ(t).
 * The units that occur are products of generators; generator 0 is −1.
 */
export interface NumberClasses<A, B extends NumberUnit> {
  readonly field: NumberField;
  /** Those that were met so far, by their numbers. */
  readonly generators: readonly NumberFieldElement[];
  readonly sides: readonly (readonly Term<A>[])[];
  readonly minusOne: B;
  /** The image of the class of some terms; it is linear in the terms. */
  image<H>(terms: readonly Term<A>[], ring: ResidueRing<B, H>, budget: Budget): Graded<H>;
  /** The degrees in which the class of some terms can be other than 0, highest first. */
  degrees(terms: readonly Term<A>[]): readonly number[];
}

/** −1 as a unit. */
export const numberMinusOne = (): NumberUnit => ({
  exponents: [0, 1],
  visitor: undefined,
  symbolThere: undefined,
  angleThere: undefined,
});

/** Calls `visit` for the generators of a unit with their exponents. */
export function forEachGenerator({ exponents }: NumberUnit, visit: (generator: number, exponent: Int) => void): void {
  for (let i = 0; i < exponents.length; i += 2) visit(Number(exponents[i]), exponents[i + 1] ?? 0);
}
