import type { Element } from './element';
import type { Expression } from './expression';
import type { Span } from './span';

/** A hypothesis that restricts what a statement claims. */
export type Condition =
  | { readonly kind: 'unequal'; readonly left: Element; readonly right: Element; readonly at?: Span }
  | { readonly kind: 'equal'; readonly left: Element; readonly right: Element; readonly at?: Span }
  | { readonly kind: 'characteristic'; readonly is: boolean; readonly prime: bigint; readonly at?: Span };

/** One side is an expression, two an equality, more a chain in which every step is asserted. */
export interface Statement {
  readonly sides: readonly Expression[];
  readonly conditions: readonly Condition[];
}
