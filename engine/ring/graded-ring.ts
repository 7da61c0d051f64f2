import type { Int } from '../arith/int';

/**
 * A graded ring in which words are evaluated, given by its homogeneous parts: [a] has degree 1, η degree −1.
 *
 * `A` is the type of the entries of symbols, `H` of homogeneous elements. Zero is `undefined` in every degree, and every other
 * value is in canonical form, so that `equal` decides equality in that degree. ⟨a⟩ = 1 + η[a] is given directly because almost
 * every word has one.
 */
export interface GradedRing<A, H> {
  integer(n: Int): H | undefined;
  symbol(a: A): H | undefined;
  angle(a: A): H | undefined;
  eta(power: number): H | undefined;
  add(degree: number, x: H, y: H): H | undefined;
  negate(degree: number, x: H): H | undefined;
  multiply(degreeX: number, x: H, degreeY: number, y: H): H | undefined;
  equal(degree: number, x: H, y: H): boolean;
}

/** An element as its non-zero homogeneous parts by degree. */
export type Graded<H> = Map<number, H>;
