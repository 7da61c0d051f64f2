import { addInt, isOddInt, negateInt, type Int } from '../arith/int';
import type { GradedRing } from './graded-ring';

/**
 * A graded ring over a residue field κ: what the Θ-ring at a place needs of K^MW_*(κ), or of a ring to which it maps. `B` is the
 * type of units of κ, `H` that of homogeneous elements.
 */
export interface ResidueRing<B, H> extends GradedRing<B, H> {
  /** [−1]. */
  readonly minusOne: H | undefined;
  /** ε = −⟨−1⟩. */
  readonly epsilon: H | undefined;
  /** n_ε⟨a⟩, or n_ε itself without a. */
  epsilonMultiple(n: Int, a?: B): H | undefined;
}

/**
 * A graded ring as a residue ring. n_ε = x + y⟨−1⟩ with x + y = n: ⌈n/2⌉ + ⌊n/2⌋⟨−1⟩ for n ≥ 0, and −⟨−1⟩(−n)_ε for n < 0
 * (F. Morel, A¹-Algebraic Topology over a Field, LNM 2052, Lemma 3.14, number from memory).
 */
export function residueRing<B, H>(ring: GradedRing<B, H>, minusOne: B): ResidueRing<B, H> {
  const minus = ring.angle(minusOne);
  const plus = (x: H | undefined, y: H | undefined): H | undefined =>
    x === undefined ? y : y === undefined ? x : ring.add(0, x, y);
  const times = (x: H | undefined, y: H | undefined): H | undefined =>
    x === undefined || y === undefined ? undefined : ring.multiply(0, x, 0, y);
  return {
    integer: (n) => ring.integer(n),
    symbol: (a) => ring.symbol(a),
    angle: (a) => ring.angle(a),
    eta: (power) => ring.eta(power),
    add: (degree, x, y) => ring.add(degree, x, y),
    negate: (degree, x) => ring.negate(degree, x),
    multiply: (m, x, n, y) => ring.multiply(m, x, n, y),
    equal: (degree, x, y) => ring.equal(degree, x, y),
    minusOne: ring.symbol(minusOne),
    epsilon: minus && ring.negate(0, minus),
    epsilonMultiple(n, a) {
      const [x, y] = epsilonParts(n);
      const form = plus(ring.integer(x), times(ring.integer(y), minus));
      return a === undefined ? form : times(form, ring.angle(a));
    },
  };
}

/** n_ε = x + y⟨−1⟩. */
export function epsilonParts(n: Int): readonly [x: Int, y: Int] {
  const size = n < 0 ? negateInt(n) : n;
  const fewer = typeof size === 'number' ? (size - (size % 2)) / 2 : size / 2n;
  const more = isOddInt(size) ? addInt(fewer, 1) : fewer;
  return n < 0 ? [negateInt(fewer), negateInt(more)] : [more, fewer];
}
