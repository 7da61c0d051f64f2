import type { Element } from '../expression/element';

/**
 * A field as a frozen record of operations, passed first to whatever computes over it. A new field changes no generic code.
 *
 * `E` is the type of its elements, always in canonical form: `equal` of two elements decides equality in the field.
 * `inverse` of zero throws a RangeError; callers test `isZero` first.
 */
export interface Field<E> {
  /** The name as it is typed, e.g. `Q`, `F_9`, `F_9[y]/(y^2+z+1)`. */
  readonly name: string;
  /** The name in TeX, e.g. `\mathbb{F}_{9}`. */
  readonly tex: string;
  /** 0, or the prime p. */
  readonly characteristic: bigint;
  readonly zero: E;
  readonly one: E;
  add(a: E, b: E): E;
  subtract(a: E, b: E): E;
  multiply(a: E, b: E): E;
  negate(a: E): E;
  inverse(a: E): E;
  isZero(a: E): boolean;
  equal(a: E, b: E): boolean;
  fromInteger(n: bigint): E;
  /** The element a letter stands for, `undefined` if the field does not have the letter. */
  letter(name: string): E | undefined;
  /** The element as it is written in canonical form; reading it back gives the same element. */
  write(a: E): Element;
  /**
   * How many binary digits an element takes, for a field whose elements grow, so that powers can be refused before they
   * are computed: size(aⁿ) is more than (size(a)−1)·|n|. Absent where all elements take the same room.
   */
  size?(a: E): number;
  /** a^n for any integer n (a a unit if n < 0), where the field knows a quicker way than repeated multiplication. */
  power?(a: E, n: bigint): E;
}

/** A finite field 𝔽_q. Its elements are ordered by their coefficients from the top, as integers 0…p−1. */
export interface FiniteField<E> extends Field<E> {
  readonly order: bigint;
  /** The element with this place in the order, 0 ≤ index < q: index 0 is zero, index 1 is one. */
  element(index: bigint): E;
  /** The place of an element in the order, the inverse of `element`. */
  index(a: E): bigint;
  /** a^n for any integer n (a a unit if n < 0). */
  power(a: E, n: bigint): E;
  /** Whether a unit is a square. In characteristic 2 every unit is. */
  isSquare(a: E): boolean;
  /** The least non-square in the order; `undefined` in characteristic 2. */
  readonly nonSquare: E | undefined;
}
