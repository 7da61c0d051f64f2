import { isOddInt, moduloFour, xorInt, type Int } from '../arith/int';
import type { GradedRing } from '../ring/graded-ring';
import { residueClassRing, type ClassedUnit, type ResidueClass, type UnitGroup } from '../ring/residue-class-ring';

/** An entry as a place sees it: a = πⁿu, with the reduction of the unit u. */
export interface LocalEntry<E> extends ClassedUnit<E> {
  readonly valuation: Int;
}

/** Specialisation s (degree n) and residue ∂ (degree n − 1) of a class of degree n; at least one is not zero. */
export interface Theta<E> {
  readonly s: ResidueClass<E> | undefined;
  readonly d: ResidueClass<E> | undefined;
}

type Part<E> = ResidueClass<E> | undefined;

/**
 * An entry remembers how it looked at the place visited last: places are visited one after the other, and a table at every
 * place would be most of what a decision keeps in memory.
 */
export interface Visited {
  visitor: object | undefined;
  symbolThere: unknown;
  angleThere: unknown;
}

/**
 * The Θ-ring K^MW_*(κ)[ξ] at a discrete valuation with uniformizer π: ξ of degree 1, ξ² = ξ[−1], xξ = εⁿξx for x of degree n.
 * The ring map Θ_π([πⁿu]) = [ū] + ξ·n_ε⟨ū⟩, Θ(η) = η gives Θ_π(α) = s_v^π(α) + ξ·∂_v^π(α)
 * (F. Morel, LNM 2052, Theorem 3.15 and Lemma 3.16, numbers from memory).
 * `local` describes an entry at the place and is asked once for each entry and kind of use.
 */
export function thetaRing<A extends Visited, E>(
  units: UnitGroup<E>,
  local: (entry: A) => LocalEntry<E>,
): GradedRing<A, Theta<E>> {
  return new ThetaRing(units, local);
}

/** The unit of every Θ-ring: most words have no coefficient and start with it. */
const one: Theta<never> = { s: { rank: 1, squareClass: 0, unit: undefined }, d: undefined };

/** A class rather than closures: one is made for every place in sight. */
class ThetaRing<A extends Visited, E> implements GradedRing<A, Theta<E>> {
  private readonly kappa: GradedRing<ClassedUnit<E>, ResidueClass<E>>;

  constructor(
    private readonly units: UnitGroup<E>,
    private readonly local: (entry: A) => LocalEntry<E>,
  ) {
    this.kappa = residueClassRing(units);
  }

  integer(n: Int): Theta<E> | undefined {
    return n === 1 ? one : pair(this.kappa.integer(n), undefined);
  }

  eta(power: number): Theta<E> | undefined {
    return pair(this.kappa.eta(power), undefined);
  }

  symbol(entry: A): Theta<E> | undefined {
    this.visit(entry);
    if (entry.symbolThere === undefined) {
      const at = this.local(entry);
      entry.symbolThere =
        pair(this.kappa.symbol(at), at.valuation === 0 ? undefined : this.epsilonMultiple(at)) ?? null;
    }
    return (entry.symbolThere as Theta<E> | null) ?? undefined;
  }

  angle(entry: A): Theta<E> | undefined {
    this.visit(entry);
    if (entry.angleThere === undefined) {
      // ⟨πⁿu⟩ = 1 + η[πⁿu]: s is ⟨ū⟩, and η·n_ε⟨ū⟩ is η⟨ū⟩ for n odd, 0 for n even
      const at = this.local(entry);
      const form = this.kappa.angle(at);
      entry.angleThere =
        pair(form, isOddInt(at.valuation) ? this.times(-1, this.kappa.eta(1), 0, form) : undefined) ?? null;
    }
    return (entry.angleThere as Theta<E> | null) ?? undefined;
  }

  private visit(entry: A): void {
    if (entry.visitor === this) return;
    entry.visitor = this;
    entry.symbolThere = undefined;
    entry.angleThere = undefined;
  }

  add(degree: number, x: Theta<E>, y: Theta<E>): Theta<E> | undefined {
    return pair(this.plus(degree, x.s, y.s), this.plus(degree - 1, x.d, y.d));
  }

  negate(degree: number, x: Theta<E>): Theta<E> | undefined {
    return pair(x.s && this.kappa.negate(degree, x.s), x.d && this.kappa.negate(degree - 1, x.d));
  }

  /** (s + ξd)(s′ + ξd′) = ss′ + ξ(ds′ + εᵐsd′ + [−1]dd′), m the degree of the left factor. */
  multiply(m: number, x: Theta<E>, n: number, y: Theta<E>): Theta<E> | undefined {
    if (x === one) return y;
    const s = this.times(m, x.s, n, y.s);
    const left = this.times(m - 1, x.d, n, y.s);
    if (y.d === undefined) return pair(s, left);
    const degree = m + n - 1;
    const straight = this.times(m, x.s, n - 1, y.d);
    const right = m % 2 === 0 ? straight : this.times(0, this.epsilon(), degree, straight);
    const both = x.d && this.times(1, this.minusOne(), degree - 1, this.times(m - 1, x.d, n - 1, y.d));
    return pair(s, this.plus(degree, this.plus(degree, left, right), both));
  }

  equal(degree: number, x: Theta<E>, y: Theta<E>): boolean {
    return this.same(degree, x.s, y.s) && this.same(degree - 1, x.d, y.d);
  }

  private plus(degree: number, x: Part<E>, y: Part<E>): Part<E> {
    return x === undefined ? y : y === undefined ? x : this.kappa.add(degree, x, y);
  }

  private times(m: number, x: Part<E>, n: number, y: Part<E>): Part<E> {
    return x === undefined || y === undefined ? undefined : this.kappa.multiply(m, x, n, y);
  }

  private same(degree: number, x: Part<E>, y: Part<E>): boolean {
    return x === undefined || y === undefined ? x === y : this.kappa.equal(degree, x, y);
  }

  private minusOne(): Part<E> {
    return this.kappa.symbol({ unit: this.units.minusOne, squareClass: this.units.classOfMinusOne });
  }

  private epsilon(): Part<E> {
    return { rank: -1, squareClass: this.units.classOfMinusOne, unit: undefined };
  }

  /** n_ε⟨ū⟩: n_ε is ⟨1⟩ + ⟨−1⟩ + … with |n| summands, times −⟨−1⟩ for n < 0; the number of signs is odd iff n is 2 or 3 modulo 4. */
  private epsilonMultiple({ valuation: n, squareClass }: LocalEntry<E>): ResidueClass<E> {
    const sign = moduloFour(n) > 1 ? this.units.classOfMinusOne : 0;
    return { rank: n, squareClass: isOddInt(n) ? xorInt(sign, squareClass) : sign, unit: undefined };
  }
}

const pair = <E>(s: Part<E>, d: Part<E>): Theta<E> | undefined =>
  s === undefined && d === undefined ? undefined : { s, d };
