import type { GradedRing } from './graded-ring';
import { boundedCoefficient } from './limits';

const nonZero = (n: bigint): bigint | undefined => (n === 0n ? undefined : boundedCoefficient(n));

/**
 * The signature K^MW_* → W(ℝ)[θ, θ⁻¹] = ℤ[θ, θ⁻¹] at a real place: [a] ↦ (sgn(a) − 1)θ, η ↦ θ⁻¹
 * (F. Morel, Comment. Math. Helv. 79, 2004; Sylvester's law of inertia).
 */
export function signatureRing<A>(isNegative: (entry: A) => boolean): GradedRing<A, bigint> {
  return {
    integer: nonZero,
    symbol: (entry) => (isNegative(entry) ? -2n : undefined),
    angle: (entry) => (isNegative(entry) ? -1n : 1n),
    eta: () => 1n,
    add: (_degree, x, y) => nonZero(x + y),
    negate: (_degree, x) => -x,
    multiply: (_m, x, _n, y) => nonZero(x * y),
    equal: (_degree, x, y) => x === y,
  };
}

/** The rank K^MW_0 → ℤ: what is left modulo η and all symbols. It says nothing outside degree 0. */
export const rankRing: GradedRing<unknown, bigint> = {
  integer: nonZero,
  symbol: () => undefined,
  angle: () => 1n,
  eta: () => undefined,
  add: (_degree, x, y) => nonZero(x + y),
  negate: (_degree, x) => -x,
  multiply: (_m, x, _n, y) => nonZero(x * y),
  equal: (_degree, x, y) => x === y,
};
