import type { FiniteField } from '../field/field';
import type { ClassedUnit, UnitGroup } from './residue-class-ring';

/** The units of a finite field, with one bit for the square class: 1 for a non-square. */
export function fieldUnits<E>(field: FiniteField<E>): UnitGroup<E> {
  const minusOne = field.negate(field.one);
  return {
    one: field.one,
    multiply: field.multiply,
    power: (a, n) => field.power(a, BigInt(n)),
    equal: field.equal,
    minusOne,
    classOfMinusOne: field.isSquare(minusOne) ? 0 : 1,
    orderModFour: orderModFour(field),
  };
}

/** A unit of a finite field with its square class. */
export function classedUnit<E>(field: FiniteField<E>, unit: E): ClassedUnit<E> {
  return { unit, squareClass: field.isSquare(unit) ? 0 : 1 };
}

/** q mod 4 for odd q, 2 in characteristic 2. */
export function orderModFour(field: { readonly order: bigint; readonly characteristic: bigint }): 1 | 2 | 3 {
  return field.characteristic === 2n ? 2 : field.order % 4n === 1n ? 1 : 3;
}
