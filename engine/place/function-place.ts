import type { Element } from '../expression/element';
import { elementText } from '../expression/to-text';
import { extensionField } from '../field/extension-field';
import type { Field, FiniteField } from '../field/field';
import { constant, degree, valueAt, type Polynomial } from '../field/polynomial';
import type { PolynomialTools } from '../field/polynomial-tools';
import { writePolynomial } from '../field/write-polynomial';
import { fieldUnits } from '../ring/field-units';
import type { UnitGroup } from '../ring/residue-class-ring';
import { negateInt, type Int } from '../arith/int';
import type { FunctionEntry } from './function-entry';
import type { LocalEntry } from './theta-ring';
import { unitPower } from './unit-power';

/** A place of k(t) with its uniformizer, k finite. `K` is the type of elements of the residue field. */
export interface FunctionPlace<E, K> {
  /** The monic irreducible polynomial as it is written, or `infinity`. */
  readonly name: string;
  readonly uniformizer: Element;
  readonly field: FiniteField<K>;
  readonly units: UnitGroup<K>;
  local(entry: FunctionEntry<E>): LocalEntry<K>;
  /** The polynomial of degree < deg P that represents a residue. */
  lift(residue: K): Polynomial<E>;
}

/** The letter of a residue field of degree ≥ 2 over k: y, or the next letter before it that k does not have. */
export function residueLetter(base: Field<unknown>): string {
  return [...'yxwvutsrqponmlkjihgfedcba'].find((letter) => base.letter(letter) === undefined) ?? 'y';
}

/** The residue field k[y]/(P(y)) at a place of degree ≥ 2, and k itself at a place of degree 1, with the values there. */
interface Reduction<E, K> {
  readonly field: FiniteField<K>;
  constant(c: E): K;
  reduce(f: Polynomial<E>): K;
  lift(residue: K): Polynomial<E>;
}

/** The place of P, monic and irreducible, the one with this index among `places`; the uniformizer is P. */
export function finitePlace<E>(
  base: FiniteField<E>,
  letter: string,
  tools: PolynomialTools<E>,
  places: readonly Polynomial<E>[],
  index: number,
): FunctionPlace<E, unknown> {
  const place = places[index];
  if (place === undefined) throw new RangeError('no such place');
  return degree(place) === 1
    ? placeOf(base, letter, places, index, rationalReduction(base, place))
    : placeOf(base, letter, places, index, extensionReduction(base, tools, place));
}

function rationalReduction<E>(base: FiniteField<E>, place: Polynomial<E>): Reduction<E, E> {
  const root = base.negate(place[0]!);
  return {
    field: base,
    constant: (c) => c,
    reduce: (f) => valueAt(base, f, root),
    lift: (residue) => constant(base, residue),
  };
}

function extensionReduction<E>(
  base: FiniteField<E>,
  tools: PolynomialTools<E>,
  place: Polynomial<E>,
): Reduction<E, Polynomial<E>> {
  return {
    field: extensionField(base, residueLetter(base), place),
    constant: (c) => constant(base, c),
    reduce: (f) => (f.length < place.length ? f : tools.remainder(f, place)),
    lift: (residue) => residue,
  };
}

function placeOf<E, K>(
  base: FiniteField<E>,
  letter: string,
  places: readonly Polynomial<E>[],
  index: number,
  reduction: Reduction<E, K>,
): FunctionPlace<E, unknown> {
  const { field, reduce } = reduction;
  const uniformizer = writePolynomial(base, places[index]!, letter);
  const residues = new Map<number, K>();
  const residueOf = (i: number): K => {
    const known = residues.get(i);
    if (known !== undefined) return known;
    const made = reduce(places[i]!);
    residues.set(i, made);
    return made;
  };
  const place: FunctionPlace<E, K> = {
    name: elementText(uniformizer),
    uniformizer,
    field,
    units: fieldUnits(field),
    lift: reduction.lift,
    local({ lead, exponents }) {
      let valuation: Int = 0;
      let unit = reduction.constant(lead);
      for (let at = 0; at < exponents.length; at += 2) {
        const [i, e] = [Number(exponents[at]), exponents[at + 1] ?? 0];
        if (i === index) valuation = e;
        else unit = field.multiply(unit, unitPower(field, residueOf(i), e));
      }
      return { valuation, unit, squareClass: field.isSquare(unit) ? 0 : 1 };
    },
  };
  return place as FunctionPlace<E, unknown>;
}

/** The place at infinity with uniformizer 1/t: the unit part of an entry there reduces to its leading coefficient. */
export function infinitePlace<E>(base: FiniteField<E>, uniformizer: Element): FunctionPlace<E, E> {
  return {
    name: 'infinity',
    uniformizer,
    field: base,
    units: fieldUnits(base),
    lift: (residue) => constant(base, residue),
    local: ({ lead, degree: n }) => ({
      valuation: negateInt(n),
      unit: lead,
      squareClass: base.isSquare(lead) ? 0 : 1,
    }),
  };
}
