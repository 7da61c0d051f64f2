import type { GradedRing } from './graded-ring';
import { boundedCoefficient } from './limits';

/**
 * A class of K^M_n for n ≤ 1: an integer, or a unit ±∏ bᵢ^eᵢ as its exponents at multiplicatively independent bᵢ > 1, by their
 * index, with the sign in {0, 1}. Exponents that are 0 are left out.
 */
export type ProductClass =
  | { readonly kind: 'integer'; readonly value: bigint }
  | { readonly kind: 'unit'; readonly sign: 0n | 1n; readonly exponents: ReadonlyMap<number, bigint> };

/** The exponents of an entry: what the class in K_1 of a rational number is made of. */
export interface FactoredEntry {
  readonly negative: boolean;
  readonly exponents: ReadonlyMap<number, bigint>;
}

/**
 * K^MW_n → K^M_n for n ≤ 1: [a] ↦ a in F^× = K^M_1(F), η ↦ 0. Degrees ≥ 2 are dropped. Powers stay in factored form, so large
 * coefficients cost nothing.
 */
export function productRing<A>(factored: (entry: A) => FactoredEntry): GradedRing<A, ProductClass> {
  const integer = (value: bigint): ProductClass | undefined =>
    value === 0n ? undefined : { kind: 'integer', value: boundedCoefficient(value) };
  const unit = (sign: bigint, exponents: ReadonlyMap<number, bigint>): ProductClass | undefined =>
    (sign & 1n) === 0n && exponents.size === 0
      ? undefined
      : { kind: 'unit', sign: (sign & 1n) === 0n ? 0n : 1n, exponents };
  const scale = (n: bigint, x: ProductClass): ProductClass | undefined =>
    x.kind === 'integer'
      ? integer(n * x.value)
      : n === 0n
        ? undefined
        : unit(n * x.sign, new Map([...x.exponents].map(([i, e]) => [i, boundedCoefficient(n * e)])));

  return {
    integer,
    symbol: (entry) => {
      const { negative, exponents } = factored(entry);
      return unit(negative ? 1n : 0n, exponents);
    },
    angle: () => integer(1n),
    eta: () => undefined,
    add: (_degree, x, y) => {
      if (x.kind === 'integer' && y.kind === 'integer') return integer(x.value + y.value);
      if (x.kind !== 'unit' || y.kind !== 'unit') return undefined;
      const exponents = new Map(x.exponents);
      for (const [i, e] of y.exponents) {
        const next = (exponents.get(i) ?? 0n) + e;
        if (next === 0n) exponents.delete(i);
        else exponents.set(i, next);
      }
      return unit(x.sign + y.sign, exponents);
    },
    negate: (_degree, x) => scale(-1n, x),
    multiply: (_m, x, _n, y) =>
      x.kind === 'integer' ? scale(x.value, y) : y.kind === 'integer' ? scale(y.value, x) : undefined,
    equal: (_degree, x, y) =>
      x.kind === 'integer' || y.kind === 'integer'
        ? x.kind === "integer" && y.kind === "integer" && x.value === y.value
        : x.sign === y.sign &&
          x.exponents.size === y.exponents.size &&
          [...x.exponents].every(([i, e]) => y.exponents.get(i) === e),
  };
}
