import type { Int } from '../arith/int';
import type { GradedRing } from './graded-ring';

/**
 * What is left of the class of a form modulo I³: the rank modulo 8, the determinant, and the Hasse invariant Σ_{i<j} (aᵢ, aⱼ) of
 * ⟨a₁, …, a_n⟩ as a formal sum of symbols. Generators of the units are numbered, −1 is number 0. A determinant is a mask of
 * generators, a sum of symbols a mask of pairs i ≤ j at bit j(j+1)/2 + i; a symbol (g, g) is (−1, g).
 */
export interface WittSymbols {
  readonly rank: number;
  readonly determinant: bigint;
  readonly symbols: bigint;
}

/**
 * W(F)[θ, θ⁻¹] modulo I³ through formal symbols: [a] ↦ (⟨a⟩ − 1)θ, η ↦ θ⁻¹. Nothing is multiplied out: for forms q, q′ of rank r, r′,
 * determinant d, d′ and Hasse invariant s, s′ the sum has s + s′ + (d, d′) and the product r′s + rs′ + C(r′,2)(d, −1) + C(r,2)(d′, −1)
 * + (rr′ − 1)(d, d′), by counting pairs (compare T. Y. Lam, Introduction to Quadratic Forms over Fields, V.3). Only ranks modulo 4
 * matter in these. Values are formal: equal ones are equal over every field, the converse depends on the field.
 */
export function wittSymbolRing<A>(maskOf: (entry: A) => bigint): GradedRing<A, WittSymbols> {
  const form = (rank: number, determinant: bigint, symbols: bigint): WittSymbols | undefined =>
    (rank & 7) === 0 && determinant === 0n && symbols === 0n ? undefined : { rank: rank & 7, determinant, symbols };
  return {
    integer: (n) => form(Number(BigInt.asUintN(3, BigInt(n satisfies Int))), 0n, 0n),
    symbol: (entry) => form(0, maskOf(entry), 0n),
    angle: (entry) => form(1, maskOf(entry), 0n),
    eta: () => form(1, 0n, 0n),
    add: (_degree, x, y) =>
      form(
        x.rank + y.rank,
        x.determinant ^ y.determinant,
        x.symbols ^ y.symbols ^ symbolsOf(x.determinant, y.determinant),
      ),
    negate: (_degree, x) => form(-x.rank, x.determinant, x.symbols ^ symbolsOf(x.determinant, 1n)),
    multiply: (_m, x, _n, y) => {
      const when = (odd: number, symbols: bigint): bigint => ((odd & 1) === 1 ? symbols : 0n);
      return form(
        x.rank * y.rank,
        when(y.rank, x.determinant) ^ when(x.rank, y.determinant),
        when(y.rank, x.symbols) ^
          when(x.rank, y.symbols) ^
          when(pairs(y.rank), symbolsOf(x.determinant, 1n)) ^
          when(pairs(x.rank), symbolsOf(y.determinant, 1n)) ^
          when(x.rank * y.rank + 1, symbolsOf(x.determinant, y.determinant)),
      );
    },
    equal: (_degree, x, y) => x.rank === y.rank && x.determinant === y.determinant && x.symbols === y.symbols,
  };
}

/** n(n−1)/2 for 0 ≤ n < 8. */
const pairs = (n: number): number => (n * (n - 1)) / 2;

/** The symbol (a, b) of products of generators as a sum of symbols of generators. */
export function symbolsOf(a: bigint, b: bigint): bigint {
  let sum = 0n;
  for (const i of bitsOf(a)) {
    for (const j of bitsOf(b)) {
      const [low, high] = i === j ? [0, i] : i < j ? [i, j] : [j, i];
      sum ^= 1n << BigInt((high * (high + 1)) / 2 + low);
    }
  }
  return sum;
}

/** The pairs i ≤ j of generators in a sum of symbols. */
export function symbolPairs(symbols: bigint): readonly (readonly [number, number])[] {
  const found: (readonly [number, number])[] = [];
  let row = 0;
  for (const bit of bitsOf(symbols)) {
    while (((row + 1) * (row + 2)) / 2 <= bit) row += 1;
    found.push([bit - (row * (row + 1)) / 2, row]);
  }
  return found;
}

/** The positions of the bits of a mask, ascending. */
export function bitsOf(mask: bigint): readonly number[] {
  const positions: number[] = [];
  const digits = mask.toString(2);
  for (let i = 0; i < digits.length; i += 1) if (digits[digits.length - 1 - i] === '1') positions.push(i);
  return positions;
}

/**
 * What a form is in the Witt ring modulo I³, as far as it is not formal: a class is zero there iff `rank` is even, `discriminant` a
 * square and the sum of `symbols` zero in the Brauer group. m hyperbolic planes have determinant (−1)ᵐ and Hasse invariant
 * C(m,2)(−1, −1).
 */
export function wittInvariants(value: WittSymbols | undefined): WittSymbols {
  const { rank, determinant, symbols } = value ?? { rank: 0, determinant: 0n, symbols: 0n };
  if (rank % 2 === 1) return { rank: 1, determinant, symbols };
  const planes = rank / 2;
  return {
    rank: 0,
    determinant: planes % 2 === 1 ? determinant ^ 1n : determinant,
    symbols: pairs(planes) % 2 === 1 ? symbols ^ 1n : symbols,
  };
}
