import type { ActionDict, Node } from 'ohm-js';
import type { Span } from '../engine/expression/span';

/** The stretch of text that a node of the syntax tree was read from. */
export const spanOf = (node: Node): Span => ({ start: node.source.startIdx, end: node.source.endIdx });

/** How an operation passes through the marks around the whole text. */
export const undressed = (operation: string): ActionDict<never> => ({
  dressed: (_gap, node, _gap2) => node[operation]() as never,
  between: (_left, _gap, node, _right) => node[operation]() as never,
});

/** From the beginning of one stretch to the end of another. */
export const spanFrom = (first: Span | undefined, last: Span | undefined): Span | undefined =>
  first && last ? { start: first.start, end: last.end } : undefined;

/** The whole text that a node belongs to. */
export const textOf = (node: Node): string => node.source.sourceString;

/** What an option matched, if it did. */
export const optional = (node: Node): Node | undefined => node.children[0];

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

const isMinus = (sign: Node): boolean => sign.sourceString !== '+';

/** Puts the signs that a node of the rule `addition` carries, one or two, before a term. */
export function signed<T extends { readonly at?: Span }>(
  negate: (of: T, at?: Span) => T,
  addition: Node | undefined,
  term: T,
): T {
  if (!addition) return term;
  const [outer, , inner] = addition.children;
  let result = term;
  for (const sign of [inner?.children[0], outer]) {
    if (sign && isMinus(sign)) result = negate(result, spanFrom(spanOf(sign), term.at));
  }
  return result;
}

/** The sign that `times` and `over` bring for the factor after them. */
export const innerSign = (operator: Node): Node | undefined =>
  operator.ctorName === 'juxtaposed' || !operator.children[2] ? undefined : optional(operator.children[2]);

/** Whether the text of one factor ends in a digit and that of the next begins with one. */
export const digitsMeet = (text: string, left: Span | undefined, right: Span | undefined): boolean =>
  left !== undefined &&
  right !== undefined &&
  /[0-9]/.test(text.charAt(left.end - 1)) &&
  /[0-9]/.test(text.charAt(right.start));

/** Exponents after one base: where each stands and what it says. */
export const readExponents = (exponents: Node): readonly { readonly at: Span; readonly value: bigint }[] =>
  exponents.children.map((node) => ({
    at: spanOf(node.child(0)),
    value: BigInt(plainInteger(node.child(0).sourceString)),
  }));
