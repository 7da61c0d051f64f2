import type { GradedRing } from './graded-ring';

/**
 * The square classes of ℚ_p: a group of exponent 2 whose elements are the bit masks 0 … size − 1, multiplied by exclusive or,
 * with the Hilbert symbol (−1)^hilbert(a, b).
 */
export interface SquareClasses {
  readonly size: number;
  readonly minusOne: number;
  hilbert(a: number, b: number): 0 | 1;
}

/** The multiplicity modulo 8 of ⟨c⟩ for every square class c. */
export type WittVector = readonly number[];

/**
 * W(ℚ_p)[θ, θ⁻¹] through the group ring of the square classes: [a] ↦ (⟨a⟩ − 1)θ, η ↦ θ⁻¹. Multiplicities count modulo 8, for
 * 8·W(ℚ_p) = 0 (T. Y. Lam, Introduction to Quadratic Forms over Fields, VI.2, from memory). Values of the group ring are not in
 * canonical form; two are compared by their Witt invariants, so a value that is zero in W(ℚ_p) is made `undefined` at once.
 */
export function localWittRing<A>(classes: SquareClasses, classOf: (entry: A) => number): GradedRing<A, WittVector> {
  const single = (at: number, multiplicity: number): number[] => {
    const vector = new Array<number>(classes.size).fill(0);
    vector[at] = multiplicity & 7;
    return vector;
  };
  const nonZero = (vector: WittVector): WittVector | undefined => (isZeroClass(classes, vector) ? undefined : vector);
  const add = (x: WittVector, y: WittVector): number[] => x.map((m, c) => (m + (y[c] ?? 0)) & 7);
  const negate = (x: WittVector): number[] => x.map((m) => -m & 7);

  return {
    integer: (n) => nonZero(single(0, Number(BigInt.asUintN(3, BigInt(n))))),
    symbol: (entry) => nonZero(add(single(classOf(entry), 1), single(0, -1))),
    angle: (entry) => nonZero(single(classOf(entry), 1)),
    eta: () => single(0, 1),
    add: (_degree, x, y) => nonZero(add(x, y)),
    negate: (_degree, x) => negate(x),
    multiply: (_m, x, _n, y) => {
      const product = new Array<number>(classes.size).fill(0);
      x.forEach((mx, a) => {
        if (mx !== 0) y.forEach((my, b) => void (product[a ^ b] = ((product[a ^ b] ?? 0) + mx * my) & 7));
      });
      return nonZero(product);
    },
    equal: (_degree, x, y) => isZeroClass(classes, add(x, negate(y))),
  };
}

/** The invariants of a Witt class: rank mod 2, signed discriminant, and the part in I² = ℤ/2. */
export interface LocalInvariants {
  readonly rank: 0 | 1;
  readonly discriminant: number;
  readonly hasse: 0 | 1;
}

/**
 * Invariants that determine a class w of W(ℚ_p): w = rank·⟨1⟩ + (⟨discriminant⟩ − 1) + hasse·ρ, with ρ the generator of
 * I²(ℚ_p) ≅ ℤ/2, the norm form of the quaternion division algebra (Lam, VI.2; J.-P. Serre, A Course in Arithmetic, IV.2.3).
 */
export function localInvariants(classes: SquareClasses, vector: WittVector): LocalInvariants {
  const rank = (total(vector) & 1) as 0 | 1;
  const even = vector.slice();
  even[0] = ((even[0] ?? 0) - rank) & 7;
  const discriminant = signedDiscriminant(classes, even);
  even[discriminant] = ((even[discriminant] ?? 0) - 1) & 7;
  even[0] = ((even[0] ?? 0) + 1) & 7;
  return { rank, discriminant, hasse: isHyperbolic(classes, even) ? 0 : 1 };
}

function isZeroClass(classes: SquareClasses, vector: WittVector): boolean {
  return (total(vector) & 1) === 0 && signedDiscriminant(classes, vector) === 0 && isHyperbolic(classes, vector);
}

const total = (vector: WittVector): number => vector.reduce((sum, m) => sum + m, 0);

/** (−1)^(r(r−1)/2) times the determinant, r the rank; for even r, (−1)^(r/2) times it. */
function signedDiscriminant(classes: SquareClasses, vector: WittVector): number {
  let discriminant = 0;
  vector.forEach((m, c) => void (discriminant ^= (m & 1) === 1 ? c : 0));
  const rank = total(vector);
  return ((rank * (rank - 1)) / 2) & 1 ? discriminant ^ classes.minusOne : discriminant;
}

/**
 * Whether a form of even rank 2m and trivial signed discriminant is m hyperbolic planes: iff its Hasse invariant
 * ∏_{i<j}(aᵢ, aⱼ) is that of m planes, (−1, −1)^(m(m−1)/2) (Serre, IV.2.3, Theorem 7: rank, discriminant and Hasse invariant
 * classify forms over ℚ_p).
 */
function isHyperbolic(classes: SquareClasses, vector: WittVector): boolean {
  let hasse = 0;
  for (let a = 0; a < vector.length; a += 1) {
    const ma = vector[a] ?? 0;
    if (((ma * (ma - 1)) / 2) & 1) hasse ^= classes.hilbert(a, a);
    for (let b = a + 1; b < vector.length; b += 1) if ((ma * (vector[b] ?? 0)) & 1) hasse ^= classes.hilbert(a, b);
  }
  const planes = total(vector) / 2;
  const expected = ((planes * (planes - 1)) / 2) & 1 ? classes.hilbert(classes.minusOne, classes.minusOne) : 0;
  return hasse === expected;
}
