import { isOddInt, moduloFour, xorInt, type Int } from '../arith/int';
import type { GradedRing } from '../ring/graded-ring';
import type { ClassedUnit, ResidueClass, UnitGroup } from '../ring/residue-class-ring';
import { residueClassRing } from '../ring/residue-class-ring';

/** An entry as a place sees it: a = πⁿu, with the reduction of the unit u. */
export interface LocalEntry<E> extends ClassedUnit<E> {
  readonly valuation: Int;
}

/** Specialisation s (degree n) and residue ∂ (degree n − 1) of a class of degree n; at least one is not zero. */
export interface Theta<E> {
  readonly s: ResidueClass<E> | undefined;
  readonly d: ResidueClass<E> | undefined;
}

/**
 * The Θ-ring K^MW_*(κ)[ξ] at a discrete valuation with uniformizer π: ξ of degree 1, ξ² = ξ[−1], xξ = εⁿξx for x of degree n.
 * The ring map Θ_π([πⁿu]) = [ū] + ξ·n_ε⟨ū⟩, Θ(η) = η gives Θ_π(α) = s_v^π(α) + ξ·∂_v^π(α)
 * (F. Morel, LNM 2052, Theorem 3.15 and Lemma 3.16, numbers from memory).
 * `local` describes an entry at the place and is asked once for each entry.
 */
export function thetaRing<A extends object, E>(
  units: UnitGroup<E>,
  local: (entry: A) => LocalEntry<E>,
): GradedRing<A, Theta<E>> {
  const kappa = residueClassRing(units);
  type Part = ResidueClass<E> | undefined;
  const minusOne = kappa.symbol({ unit: units.minusOne, squareClass: units.classOfMinusOne });
  const epsilon: Part = { rank: -1, squareClass: units.classOfMinusOne, unit: undefined };

  const add = (degree: number, x: Part, y: Part): Part =>
    x === undefined ? y : y === undefined ? x : kappa.add(degree, x, y);
  const times = (degreeX: number, x: Part, degreeY: number, y: Part): Part =>
    x === undefined || y === undefined ? undefined : kappa.multiply(degreeX, x, degreeY, y);
  const pair = (s: Part, d: Part): Theta<E> | undefined => (s === undefined && d === undefined ? undefined : { s, d });
  const same = (degree: number, x: Part, y: Part): boolean =>
    x === undefined || y === undefined ? x === y : kappa.equal(degree, x, y);

  /** n_ε⟨ū⟩: n_ε is ⟨1⟩ + ⟨−1⟩ + … with |n| summands, times −⟨−1⟩ for n < 0; so a product of n, or of |n|/2 rounded, signs. */
  function epsilonMultiple({ valuation: n, squareClass }: LocalEntry<E>): ResidueClass<E> {
    const remainder = moduloFour(n);
    const oddSigns = remainder > 1;
    const sign = oddSigns ? units.classOfMinusOne : 0;
    return { rank: n, squareClass: isOddInt(n) ? xorInt(sign, squareClass) : sign, unit: undefined };
  }

  const symbols = new Map<A, Theta<E> | undefined>();
  const angles = new Map<A, Theta<E> | undefined>();
  const cached = (cache: Map<A, Theta<E> | undefined>, entry: A, compute: () => Theta<E> | undefined) => {
    const known = cache.get(entry);
    if (known !== undefined || cache.has(entry)) return known;
    const value = compute();
    cache.set(entry, value);
    return value;
  };

  return {
    integer: (n) => pair(kappa.integer(n), undefined),
    eta: (power) => pair(kappa.eta(power), undefined),
    symbol: (entry) =>
      cached(symbols, entry, () => {
        const at = local(entry);
        return pair(kappa.symbol(at), at.valuation === 0 ? undefined : epsilonMultiple(at));
      }),
    angle: (entry) =>
      cached(angles, entry, () => {
        // ⟨πⁿu⟩ = 1 + η[πⁿu]: s is ⟨ū⟩, and η·n_ε⟨ū⟩ is η⟨ū⟩ for n odd, 0 for n even
        const at = local(entry);
        const odd = isOddInt(at.valuation);
        const eta = kappa.eta(1);
        return pair(kappa.angle(at), odd && eta ? times(-1, eta, 0, kappa.angle(at)) : undefined);
      }),
    add: (degree, x, y) => pair(add(degree, x.s, y.s), add(degree - 1, x.d, y.d)),
    negate: (degree, x) => pair(x.s && kappa.negate(degree, x.s), x.d && kappa.negate(degree - 1, x.d)),
    multiply: (m, x, n, y) => {
      // (s + ξd)(s′ + ξd′) = ss′ + ξ(ds′ + εᵐsd′ + [−1]dd′), m the degree of the left factor
      const s = times(m, x.s, n, y.s);
      if (x.d === undefined && y.d === undefined) return pair(s, undefined);
      const degree = m + n - 1;
      const left = times(m - 1, x.d, n, y.s);
      const straight = times(m, x.s, n - 1, y.d);
      const right = m % 2 === 0 ? straight : times(0, epsilon, degree, straight);
      const both = times(1, minusOne, degree - 1, times(m - 1, x.d, n - 1, y.d));
      return pair(s, add(degree, add(degree, left, right), both));
    },
    equal: (degree, x, y) => same(degree, x.s, y.s) && same(degree - 1, x.d, y.d),
  };
}
