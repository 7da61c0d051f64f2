import { isOddInt, type Int } from '../arith/int';
import { residueClassRing, type ClassedUnit, type ResidueClass, type UnitGroup } from '../ring/residue-class-ring';
import type { ResidueRing } from '../ring/residue-ring';

/** An entry as a place sees it: a = πⁿu. */
export interface Valued {
  readonly valuation: Int;
}

/** An entry as a place with finite residue field sees it: a = πⁿu, with the reduction of the unit u. */
export interface LocalEntry<E> extends ClassedUnit<E>, Valued {}

/** Specialisation s (degree n) and residue ∂ (degree n − 1) of a class of degree n; at least one is not zero. */
export interface ThetaPair<H> {
  readonly s: H | undefined;
  readonly d: H | undefined;
}

/** `ThetaPair` over a finite residue field. */
export type Theta<E> = ThetaPair<ResidueClass<E>>;

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
): ResidueRing<A, Theta<E>> {
  return new ThetaRing<A, LocalEntry<E>, ResidueClass<E>>(residueClassRing(units), local);
}

/**
 * The Θ-ring over any ring to which K^MW_*(κ) maps: a residue is followed by that map without being written out. `B` is a unit
 * of κ together with the valuation of the entry it is the unit part of.
 */
export function thetaRingOver<A extends Visited, B extends Valued, H>(
  kappa: ResidueRing<B, H>,
  local: (entry: A) => B,
): ResidueRing<A, ThetaPair<H>> {
  return new ThetaRing(kappa, local);
}

/** A class rather than closures: one is made for every place in sight. */
class ThetaRing<A extends Visited, B extends Valued, H> implements ResidueRing<A, ThetaPair<H>> {
  /** Most words have no coefficient and start with it. */
  private one: ThetaPair<H> | undefined;

  constructor(
    private readonly kappa: ResidueRing<B, H>,
    private readonly local: (entry: A) => B,
  ) {}

  get minusOne(): ThetaPair<H> | undefined {
    return pair(this.kappa.minusOne, undefined);
  }

  get epsilon(): ThetaPair<H> | undefined {
    return pair(this.kappa.epsilon, undefined);
  }

  integer(n: Int): ThetaPair<H> | undefined {
    if (n === 1) return (this.one ??= pair(this.kappa.integer(1), undefined));
    return pair(this.kappa.integer(n), undefined);
  }

  eta(power: number): ThetaPair<H> | undefined {
    return pair(this.kappa.eta(power), undefined);
  }

  symbol(entry: A): ThetaPair<H> | undefined {
    this.visit(entry);
    if (entry.symbolThere === undefined) {
      const at = this.local(entry);
      const n = at.valuation;
      entry.symbolThere = pair(this.kappa.symbol(at), n === 0 ? undefined : this.kappa.epsilonMultiple(n, at)) ?? null;
    }
    return (entry.symbolThere as ThetaPair<H> | null) ?? undefined;
  }

  angle(entry: A): ThetaPair<H> | undefined {
    this.visit(entry);
    if (entry.angleThere === undefined) {
      // ⟨πⁿu⟩ = 1 + η[πⁿu]: s is ⟨ū⟩, and η·n_ε⟨ū⟩ is η⟨ū⟩ for n odd, 0 for n even
      const at = this.local(entry);
      const form = this.kappa.angle(at);
      entry.angleThere =
        pair(form, isOddInt(at.valuation) ? this.times(-1, this.kappa.eta(1), 0, form) : undefined) ?? null;
    }
    return (entry.angleThere as ThetaPair<H> | null) ?? undefined;
  }

  epsilonMultiple(n: Int, entry?: A): ThetaPair<H> | undefined {
    const form = pair(this.kappa.epsilonMultiple(n), undefined);
    const angle = entry && this.angle(entry);
    if (entry === undefined) return form;
    return form === undefined || angle === undefined ? undefined : this.multiply(0, form, 0, angle);
  }

  private visit(entry: A): void {
    if (entry.visitor === this) return;
    entry.visitor = this;
    entry.symbolThere = undefined;
    entry.angleThere = undefined;
  }

  add(degree: number, x: ThetaPair<H>, y: ThetaPair<H>): ThetaPair<H> | undefined {
    return pair(this.plus(degree, x.s, y.s), this.plus(degree - 1, x.d, y.d));
  }

  negate(degree: number, x: ThetaPair<H>): ThetaPair<H> | undefined {
    return pair(x.s && this.kappa.negate(degree, x.s), x.d && this.kappa.negate(degree - 1, x.d));
  }

  /** (s + ξd)(s′ + ξd′) = ss′ + ξ(ds′ + εᵐsd′ + [−1]dd′), m the degree of the left factor. */
  multiply(m: number, x: ThetaPair<H>, n: number, y: ThetaPair<H>): ThetaPair<H> | undefined {
    if (x === this.one) return y;
    const s = this.times(m, x.s, n, y.s);
    const left = this.times(m - 1, x.d, n, y.s);
    if (y.d === undefined) return pair(s, left);
    const degree = m + n - 1;
    const straight = this.times(m, x.s, n - 1, y.d);
    const right = m % 2 === 0 ? straight : this.times(0, this.kappa.epsilon, degree, straight);
    const both = x.d && this.times(1, this.kappa.minusOne, degree - 1, this.times(m - 1, x.d, n - 1, y.d));
    return pair(s, this.plus(degree, this.plus(degree, left, right), both));
  }

  equal(degree: number, x: ThetaPair<H>, y: ThetaPair<H>): boolean {
    return this.same(degree, x.s, y.s) && this.same(degree - 1, x.d, y.d);
  }

  private plus(degree: number, x: H | undefined, y: H | undefined): H | undefined {
    return x === undefined ? y : y === undefined ? x : this.kappa.add(degree, x, y);
  }

  private times(m: number, x: H | undefined, n: number, y: H | undefined): H | undefined {
    return x === undefined || y === undefined ? undefined : this.kappa.multiply(m, x, n, y);
  }

  private same(degree: number, x: H | undefined, y: H | undefined): boolean {
    return x === undefined || y === undefined ? x === y : this.kappa.equal(degree, x, y);
  }
}

const pair = <H>(s: H | undefined, d: H | undefined): ThetaPair<H> | undefined =>
  s === undefined && d === undefined ? undefined : { s, d };
