import type { Span } from './span';

/**
 * A field element as it is written inside a bracket: a rational expression in integers and letters.
 *
 * Integers are never negative (a sign is a `negate` node). Sums and products are n-ary, so that a long sum does not nest.
 * A letter is one Latin letter with an optional index and primes, in the form `a`, `x1`, `u'`.
 */
export type Element =
  | { readonly kind: 'integer'; readonly value: bigint; readonly at?: Span }
  | { readonly kind: 'letter'; readonly name: string; readonly at?: Span }
  | { readonly kind: 'negate'; readonly of: Element; readonly at?: Span }
  | { readonly kind: 'sum'; readonly terms: readonly Element[]; readonly at?: Span }
  | { readonly kind: 'product'; readonly factors: readonly Element[]; readonly at?: Span }
  | { readonly kind: 'quotient'; readonly numerator: Element; readonly denominator: Element; readonly at?: Span }
  | { readonly kind: 'power'; readonly base: Element; readonly exponent: number; readonly at?: Span };

export const integerElement = (value: bigint, at?: Span): Element => ({ kind: 'integer', value, at });
export const letterElement = (name: string, at?: Span): Element => ({ kind: 'letter', name, at });
export const negateElement = (of: Element, at?: Span): Element => ({ kind: 'negate', of, at });
export const sumElement = (terms: readonly Element[], at?: Span): Element => ({ kind: 'sum', terms, at });
export const productElement = (factors: readonly Element[], at?: Span): Element => ({ kind: 'product', factors, at });
export const quotientElement = (numerator: Element, denominator: Element, at?: Span): Element => ({
  kind: 'quotient',
  numerator,
  denominator,
  at,
});
/** `exponent` is any integer; its size is bounded where text is read. */
export const powerElement = (base: Element, exponent: number, at?: Span): Element => ({
  kind: 'power',
  base,
  exponent,
  at,
});
