import { addInt, isOddInt, moduloFour, multiplyInt, negateInt, xorInt, type Int } from '../arith/int';
import { boundedCoefficient } from './limits';
import type { ResidueRing } from './residue-ring';

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
export function residueClassRing<E>(units: UnitGroup<E>): ResidueRing<ClassedUnit<E>, ResidueClass<E>> {
  return new ResidueClassRing(units);
}

/** A class rather than closures: one is made for every place in sight. */
class ResidueClassRing<E> implements ResidueRing<ClassedUnit<E>, ResidueClass<E>> {
  constructor(private readonly units: UnitGroup<E>) {}

  get minusOne(): ResidueClass<E> | undefined {
    return this.symbolOf(this.units.minusOne, this.units.classOfMinusOne);
  }

  get epsilon(): ResidueClass<E> {
    return { rank: -1, squareClass: this.units.classOfMinusOne, unit: undefined };
  }

  integer(n: Int): ResidueClass<E> | undefined {
    return this.form(0, n, 0);
  }

  symbol(a: ClassedUnit<E>): ResidueClass<E> | undefined {
    return this.symbolOf(a.unit, a.squareClass);
  }

  angle(a: ClassedUnit<E>): ResidueClass<E> | undefined {
    return this.form(0, 1, a.squareClass);
  }

  eta(power: number): ResidueClass<E> | undefined {
    return this.form(-power, 1, 0);
  }

  add(degree: number, x: ResidueClass<E>, y: ResidueClass<E>): ResidueClass<E> | undefined {
    const squareClass = xorInt(x.squareClass, y.squareClass);
    return x.unit !== undefined && y.unit !== undefined
      ? this.symbolOf(this.units.multiply(x.unit, y.unit), squareClass)
      : this.form(degree, addInt(x.rank, y.rank), squareClass);
  }

  negate(degree: number, x: ResidueClass<E>): ResidueClass<E> | undefined {
    return x.unit !== undefined
      ? this.symbolOf(this.units.power(x.unit, -1), x.squareClass)
      : this.form(degree, negateInt(x.rank), x.squareClass);
  }

  multiply(m: number, x: ResidueClass<E>, n: number, y: ResidueClass<E>): ResidueClass<E> | undefined {
    if (x.unit !== undefined) return y.unit !== undefined ? undefined : this.act(n, y, x.unit, x.squareClass);
    if (y.unit !== undefined) return this.act(m, x, y.unit, y.squareClass);
    const squareClass = xorInt(ifOdd(x.rank, y.squareClass), ifOdd(y.rank, x.squareClass));
    return this.form(m + n, boundedCoefficient(multiplyInt(x.rank, y.rank)), squareClass);
  }

  /** The number of signs among the |n| summands of n_ε is odd iff n is 2 or 3 modulo 4. */
  epsilonMultiple(n: Int, a?: ClassedUnit<E>): ResidueClass<E> | undefined {
    const sign = moduloFour(n) > 1 ? this.units.classOfMinusOne : 0;
    const squareClass = a !== undefined && isOddInt(n) ? xorInt(sign, a.squareClass) : sign;
    return n === 0 ? undefined : { rank: n, squareClass, unit: undefined };
  }

  equal(_degree: number, x: ResidueClass<E>, y: ResidueClass<E>): boolean {
    if (x.unit !== undefined) return y.unit !== undefined && this.units.equal(x.unit, y.unit);
    return y.unit === undefined && x.rank === y.rank && x.squareClass === y.squareClass;
  }

  /** A class of degree ≤ 0 in canonical form. */
  private form(degree: number, rank: Int, squareClass: Int): ResidueClass<E> | undefined {
    if (degree < 0) {
      const { orderModFour } = this.units;
      if (orderModFour === 3) {
        rank = moduloFour(squareClass === 0 ? rank : addInt(rank, 2));
        squareClass = 0;
      } else if (orderModFour !== undefined) rank = isOddInt(rank) ? 1 : 0;
    }
    return rank === 0 && squareClass === 0 ? undefined : { rank, squareClass, unit: undefined };
  }

  /** [u] in degree 1. */
  private symbolOf(unit: E, squareClass: Int): ResidueClass<E> | undefined {
    return this.units.equal(unit, this.units.one) ? undefined : { rank: 0, squareClass, unit };
  }

  /** A form of degree ≤ 0 times [u]: u^rank in degree 1; in degree ≤ 0, where [u] counts as ⟨u⟩ − 1, its rank times that class. */
  private act(degree: number, form: ResidueClass<E>, unit: E, squareClass: Int): ResidueClass<E> | undefined {
    const parity = ifOdd(form.rank, squareClass);
    return degree === 0 ? this.symbolOf(this.units.power(unit, form.rank), parity) : this.form(degree + 1, 0, parity);
  }
}

const ifOdd = (rank: Int, squareClass: Int): Int => (isOddInt(rank) ? squareClass : 0);
