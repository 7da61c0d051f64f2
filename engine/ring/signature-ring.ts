import { addInt, multiplyInt, negateInt, type Int } from '../arith/int';
import type { GradedRing } from './graded-ring';
import { boundedCoefficient } from './limits';

const nonZero = (n: Int): Int | undefined => (n === 0 ? undefined : boundedCoefficient(n));

/**
 * The signature K^MW_* → W(ℝ)[θ, θ⁻¹] = ℤ[θ, θ⁻¹] at a real place: [a] ↦ (sgn(a) − 1)θ, η ↦ θ⁻¹
 * (F. Morel, Comment. Math. Helv. 79, 2004; Sylvester's law of inertia).
 */
export function signatureRing<A>(isNegative: (entry: A) => boolean): GradedRing<A, Int> {
  return {
    integer: nonZero,
    symbol: (entry) => (isNegative(entry) ? -2 : undefined),
    angle: (entry) => (isNegative(entry) ? -1 : 1),
    eta: () => 1,
    add: (_degree, x, y) => nonZero(addInt(x, y)),
    negate: (_degree, x) => negateInt(x),
    multiply: (_m, x, _n, y) => nonZero(multiplyInt(x, y)),
    equal: (_degree, x, y) => x === y,
  };
}

/** The rank K^MW_0 → ℤ: what is left modulo η and all symbols. It says nothing outside degree 0. */
export const rankRing: GradedRing<unknown, Int> = {
  integer: nonZero,
  symbol: () => undefined,
  angle: () => 1,
  eta: () => undefined,
  add: (_degree, x, y) => nonZero(addInt(x, y)),
  negate: (_degree, x) => negateInt(x),
  multiply: (_m, x, _n, y) => nonZero(multiplyInt(x, y)),
  equal: (_degree, x, y) => x === y,
};
