import { addInt, isOddInt, moduloFour, multiplyInt, negateInt, xorInt, type Int } from '../arith/int';
import { boundedCoefficient } from './limits';
import type { GradedRing } from './graded-ring';

/**
 * What K^MW of a finite field needs to know of its units: the group, the square class of each unit as a bit mask (multiplied
 * by exclusive or), and whether −1 is a square. A finite field has one bit, the class of the non-squares. The same formulas
 * serve an integer modulus that has not been split into primes, where a mask names a formal product of classes.
 */
export interface UnitGroup<E> {
  readonly one: E;
  multiply(a: E, b: E): E;
  /** a^n for any integer n. */
  power(a: E, n: Int): E;
  equal(a: E, b: E): boolean;
  readonly minusOne: E;
  readonly classOfMinusOne: Int;
  /** q mod 4 for odd q; 2 for a field of characteristic 2; `undefined` when it is not known. */
  readonly orderModFour: 1 | 2 | 3 | undefined;
}

/** A unit together with its square class. */
export interface ClassedUnit<E> {
  readonly unit: E;
  readonly squareClass: Int;
}

/**
 * A homogeneous class. Degree 1: the unit u of [u] and its square class (rank is 0). Degree ≤ 0: rank and discriminant of a
 * form, in degree < 0 reduced modulo the hyperbolic plane.
 */
export interface ResidueClass<E> {
  readonly rank: Int;
  readonly squareClass: Int;
  readonly unit: E | undefined;
}

/**
 * K^MW_*(𝔽_q): 0 in degree ≥ 2, 𝔽_q^× in degree 1, GW(𝔽_q) = {(rank, discriminant)} in degree 0, W(𝔽_q) in degree < 0.
 *
 * GW(𝔽_q) = ℤ[σ]/(2σ, σ²) with σ = ⟨s⟩ − 1, s a non-square, since forms over 𝔽_q are classified by rank and discriminant
 * (T. Y. Lam, Introduction to Quadratic Forms over Fields, II.3.5, number from memory); K^M_2(𝔽_q) = 0 (J. Milnor, Introduction
 * to Algebraic K-Theory, 9.9, from memory) and I²(𝔽_q) = 0, so K^MW_n(𝔽_q) = 0 for n ≥ 2 by the pull-back theorem (F. Morel,
 * Comment. Math. Helv. 79, 2004). η[u] = ⟨u⟩ − 1, and ⟨a⟩[u] = [u].
 * Canonical form in degree < 0: rank in {0, 1} if −1 is a square; else rank in {0, 1, 2, 3} and trivial square class
 * (W(𝔽_q) = ℤ/4 by multiples of ⟨1⟩); if the order is not known modulo 4, the rank is kept as it is.
 */
export function residueClassRing<E>(units: UnitGroup<E>): GradedRing<ClassedUnit<E>, ResidueClass<E>> {
  const make = (degree: number, rank: Int, squareClass: Int): ResidueClass<E> | undefined => {
    if (degree < 0) {
      if (units.orderModFour === 3) {
        rank = moduloFour(squareClass === 0 ? rank : addInt(rank, 2));
        squareClass = 0;
      } else if (units.orderModFour !== undefined) rank = isOddInt(rank) ? 1 : 0;
    }
    return rank === 0 && squareClass === 0 ? undefined : { rank, squareClass, unit: undefined };
  };
  const makeUnit = (unit: E, squareClass: Int): ResidueClass<E> | undefined =>
    units.equal(unit, units.one) ? undefined : { rank: 0, squareClass, unit };

  /** A form of degree ≤ 0 times [u]: u^rank in degree 1; in degree ≤ 0, where [u] counts as ⟨u⟩ − 1, its rank times that class. */
  const act = (degree: number, form: ResidueClass<E>, unit: E, squareClass: Int): ResidueClass<E> | undefined => {
    const parity = odd(form.rank, squareClass);
    return degree === 0 ? makeUnit(units.power(unit, form.rank), parity) : make(degree + 1, 0, parity);
  };

  return {
    integer: (n) => make(0, n, 0),
    symbol: (a) => makeUnit(a.unit, a.squareClass),
    angle: (a) => make(0, 1, a.squareClass),
    eta: (power) => make(-power, 1, 0),
    add: (degree, x, y) =>
      x.unit !== undefined && y.unit !== undefined
        ? makeUnit(units.multiply(x.unit, y.unit), xorInt(x.squareClass, y.squareClass))
        : make(degree, addInt(x.rank, y.rank), xorInt(x.squareClass, y.squareClass)),
    negate: (degree, x) =>
      x.unit !== undefined ? makeUnit(units.power(x.unit, -1), x.squareClass) : make(degree, negateInt(x.rank), x.squareClass),
    multiply: (degreeX, x, degreeY, y) => {
      if (x.unit !== undefined) return y.unit !== undefined ? undefined : act(degreeY, y, x.unit, x.squareClass);
      if (y.unit !== undefined) return act(degreeX, x, y.unit, y.squareClass);
      const squareClass = xorInt(odd(x.rank, y.squareClass), odd(y.rank, x.squareClass));
      return make(degreeX + degreeY, boundedCoefficient(multiplyInt(x.rank, y.rank)), squareClass);
    },
    equal: (_degree, x, y) =>
      x.unit !== undefined
        ? y.unit !== undefined && units.equal(x.unit, y.unit)
        : y.unit === undefined && x.rank === y.rank && x.squareClass === y.squareClass,
  };
}

const odd = (rank: Int, squareClass: Int): Int => (isOddInt(rank) ? squareClass : 0);
