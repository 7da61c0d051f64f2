import type { Span } from '../engine/expression/span';
import type { SyntaxNode } from './syntax-node';

/** From the beginning of one stretch to the end of another. */
export const spanFrom = (first: Span | undefined, last: Span | undefined): Span | undefined =>
  first && last ? { start: first.start, end: last.end } : undefined;

/** The node that stands inside the marks around the whole text. */
export function undressed(whole: SyntaxNode): SyntaxNode {
  const inner = whole.child(0).child(1);
  return inner.rule.startsWith('between') ? inner.child(2) : inner;
}

const raisedDigits = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const loweredDigits = '₀₁₂₃₄₅₆₇₈₉';

/** An integer as it is written, with digits of any height, any minus sign and braces around it, to ordinary digits. */
export function plainInteger(text: string): string {
  let digits = '';
  let sign = '';
  for (const c of text) {
    const special = Math.max(raisedDigits.indexOf(c), loweredDigits.indexOf(c));
    if (special >= 0) digits += String(special);
    else if (c >= '0' && c <= '9') digits += c;
    else if ('-⁻−‐‑‒–—―﹣－'.includes(c)) sign = '-';
  }
  return sign + digits;
}

/** Puts the signs that a node of the rule `addition` carries, one or two, before a term. */
export function signed<T extends { readonly at?: Span }>(
  negate: (of: T, at?: Span) => T,
  addition: SyntaxNode | undefined,
  term: T,
): T {
  if (!addition) return term;
  let result = term;
  for (const sign of [addition.option(2), addition.child(0)]) {
    if (sign && sign.source !== '+') result = negate(result, spanFrom(sign.at, term.at));
  }
  return result;
}

/** The sign that `times` and `over` bring for the factor after them; a product without a sign is the empty word. */
export const innerSign = (operator: SyntaxNode): SyntaxNode | undefined =>
  operator.rule === '' ? undefined : operator.option(2);

/** Whether the text of one factor ends in a digit and that of the next begins with one. */
export const digitsMeet = (text: string, left: Span, right: Span): boolean =>
  /[0-9]/.test(text.charAt(left.end - 1)) && /[0-9]/.test(text.charAt(right.start));

/** An exponent: the stretch from its hat on, that of the integer alone, and its value. */
export interface Exponent {
  readonly at: Span;
  readonly number: Span;
  readonly value: bigint;
}

/** The exponents after one base, in order, without the white space after each. */
export const exponentsOf = (nodes: readonly SyntaxNode[]): readonly Exponent[] =>
  nodes.map((node) => {
    const { at, source } = node.child(0);
    const [written = ''] = /[^\s^{()}~](?:.*[^\s{()}~])?/su.exec(source) ?? [];
    const start = at.start + source.indexOf(written);
    return { at, number: { start, end: start + written.length }, value: BigInt(plainInteger(source)) };
  });
