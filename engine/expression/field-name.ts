import type { Element } from './element';
import type { Span } from './span';

/**
 * The name of a field as it is written, before anything is checked about it: ℚ, ℝ, ℂ, ℚ_p, 𝔽_q, base[letter]/(modulus),
 * base(letter), or `any`, an unspecified field whose units are the letters.
 */
export type FieldName =
  | { readonly kind: 'rationals'; readonly at?: Span }
  | { readonly kind: 'reals'; readonly at?: Span }
  | { readonly kind: 'complexes'; readonly at?: Span }
  | { readonly kind: 'padics'; readonly prime: bigint; readonly at?: Span }
  | { readonly kind: 'finite'; readonly order: bigint; readonly at?: Span }
  | {
      readonly kind: 'extension';
      readonly base: FieldName;
      readonly letter: string;
      readonly modulus: Element;
      readonly at?: Span;
    }
  | { readonly kind: 'functions'; readonly base: FieldName; readonly letter: string; readonly at?: Span }
  | { readonly kind: 'any'; readonly at?: Span };
