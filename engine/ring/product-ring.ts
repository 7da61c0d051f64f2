import { addInt, isOddInt, multiplyInt, type Int } from '../arith/int';
import type { GradedRing } from './graded-ring';
import { boundedCoefficient } from './limits';

/**
 * A class of K^M_n for n ≤ 1: an integer, or a unit ±∏ bᵢ^eᵢ as its exponents at multiplicatively independent bᵢ > 1, by their
 * index, with the sign in {0, 1}. Exponents that are 0 are left out.
 */
export type ProductClass =
  | { readonly kind: 'integer'; readonly value: Int }
  | { readonly kind: 'unit'; readonly sign: 0 | 1; readonly exponents: ReadonlyMap<number, Int> };

/** The exponents of an entry: what the class in K_1 of a rational number is made of. */
export interface FactoredEntry {
  readonly negative: boolean;
  readonly exponents: ReadonlyMap<number, Int>;
}

/**
 * K^MW_n → K^M_n for n ≤ 1: [a] ↦ a in F^× = K^M_1(F), η ↦ 0. Degrees ≥ 2 are dropped. Powers stay in factored form, so large
 * coefficients cost nothing.
 */
export function productRing<A>(factored: (entry: A) => FactoredEntry): GradedRing<A, ProductClass> {
  const integer = (value: Int): ProductClass | undefined =>
    value === 0 ? undefined : { kind: 'integer', value: boundedCoefficient(value) };
  const unit = (odd: boolean, exponents: ReadonlyMap<number, Int>): ProductClass | undefined =>
    !odd && exponents.size === 0 ? undefined : { kind: 'unit', sign: odd ? 1 : 0, exponents };
  const scale = (n: Int, x: ProductClass): ProductClass | undefined =>
    x.kind === 'integer'
      ? integer(multiplyInt(n, x.value))
      : n === 0
        ? undefined
        : unit(
            isOddInt(n) && x.sign === 1,
            new Map([...x.exponents].map(([i, e]) => [i, boundedCoefficient(multiplyInt(n, e))])),
          );

  return {
    integer,
    symbol: (entry) => {
      const { negative, exponents } = factored(entry);
      return unit(negative, exponents);
    },
    angle: () => integer(1),
    eta: () => undefined,
    add: (_degree, x, y) => {
      if (x.kind === 'integer' && y.kind === 'integer') return integer(addInt(x.value, y.value));
      if (x.kind !== 'unit' || y.kind !== 'unit') return undefined;
      const exponents = new Map(x.exponents);
      for (const [i, e] of y.exponents) {
        const next = addInt(exponents.get(i) ?? 0, e);
        if (next === 0) exponents.delete(i);
        else exponents.set(i, next);
      }
      return unit(x.sign !== y.sign, exponents);
    },
    negate: (_degree, x) => scale(-1, x),
    multiply: (_m, x, _n, y) =>
      x.kind === 'integer' ? scale(x.value, y) : y.kind === 'integer' ? scale(y.value, x) : undefined,
    equal: (_degree, x, y) =>
      x.kind === 'integer' || y.kind === 'integer'
        ? x.kind === 'integer' && y.kind === 'integer' && x.value === y.value
        : x.sign === y.sign &&
          x.exponents.size === y.exponents.size &&
          [...x.exponents].every(([i, e]) => y.exponents.get(i) === e),
  };
}
