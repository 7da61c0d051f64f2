import type { Element } from './element';
import type { Span } from './span';

/**
 * A word of Milnor–Witt K-theory as it is written: one tree, evaluated in many rings.
 *
 * `symbol` [a, b, …] is the product [a][b]…; `angle` ⟨a, b, …⟩ the sum ⟨a⟩ + ⟨b⟩ + …; `pfister` ⟪a, b, …⟫ the product of the
 * ⟪a⟫ = 1 − ⟨a⟩; `hyperbolic` h = 2 + η[−1]; `epsilon` ε = −⟨−1⟩; `epsilonInteger` n_ε.
 * Integers are never negative (a sign is a `negate` node), `count` of n_ε may be. Exponents are non-negative integers.
 */
export type Expression =
  | { readonly kind: 'integer'; readonly value: bigint; readonly at?: Span }
  | { readonly kind: 'symbol'; readonly entries: readonly Element[]; readonly at?: Span }
  | { readonly kind: 'angle'; readonly entries: readonly Element[]; readonly at?: Span }
  | { readonly kind: 'pfister'; readonly entries: readonly Element[]; readonly at?: Span }
  | { readonly kind: 'eta'; readonly at?: Span }
  | { readonly kind: 'hyperbolic'; readonly at?: Span }
  | { readonly kind: 'epsilon'; readonly at?: Span }
  | { readonly kind: 'epsilonInteger'; readonly count: bigint; readonly at?: Span }
  | { readonly kind: 'negate'; readonly of: Expression; readonly at?: Span }
  | { readonly kind: 'sum'; readonly terms: readonly Expression[]; readonly at?: Span }
  | { readonly kind: 'product'; readonly factors: readonly Expression[]; readonly at?: Span }
  | { readonly kind: 'power'; readonly base: Expression; readonly exponent: number; readonly at?: Span };

export const integer = (value: bigint, at?: Span): Expression => ({ kind: 'integer', value, at });
export const symbol = (entries: readonly Element[], at?: Span): Expression => ({ kind: 'symbol', entries, at });
export const angle = (entries: readonly Element[], at?: Span): Expression => ({ kind: 'angle', entries, at });
export const pfister = (entries: readonly Element[], at?: Span): Expression => ({ kind: 'pfister', entries, at });
export const eta = (at?: Span): Expression => ({ kind: 'eta', at });
export const hyperbolic = (at?: Span): Expression => ({ kind: 'hyperbolic', at });
export const epsilon = (at?: Span): Expression => ({ kind: 'epsilon', at });
export const epsilonInteger = (count: bigint, at?: Span): Expression => ({ kind: 'epsilonInteger', count, at });
export const negate = (of: Expression, at?: Span): Expression => ({ kind: 'negate', of, at });
export const sum = (terms: readonly Expression[], at?: Span): Expression => ({ kind: 'sum', terms, at });
export const product = (factors: readonly Expression[], at?: Span): Expression => ({ kind: 'product', factors, at });
export const power = (base: Expression, exponent: number, at?: Span): Expression => ({
  kind: 'power',
  base,
  exponent,
  at,
});
