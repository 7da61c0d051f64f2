import { integerElement, negateElement, type Element } from '../expression/element';
import { eta, integer, negate, power, product, sum, symbol, type Expression } from '../expression/expression';

/** The element −1. */
export const minusOneElement: Element = negateElement(integerElement(1n));

/** η^power as a list of factors, empty for power 0. */
export function etaFactors(exponent: number): readonly Expression[] {
  return exponent === 0 ? [] : exponent === 1 ? [eta()] : [power(eta(), exponent)];
}

/** [a]^exponent as a list of factors, empty for exponent 0. */
export function symbolFactors(entry: Element, exponent: number): readonly Expression[] {
  return exponent === 0 ? [] : exponent === 1 ? [symbol([entry])] : [power(symbol([entry]), exponent)];
}

/** c times a product of factors, c ≠ 0. */
export function multiple(c: bigint, factors: readonly Expression[]): Expression {
  const size = c < 0n ? -c : c;
  const all = size === 1n && factors.length > 0 ? factors : [integer(size), ...factors];
  const word = all.length === 1 && all[0] ? all[0] : product(all);
  return c < 0n ? negate(word) : word;
}

/** The sum of words, 0 if there is none. Sums among them are merged, so that no parentheses appear. */
export function total(words: readonly Expression[]): Expression {
  const terms = words.flatMap((word) => (word.kind === 'sum' ? word.terms : isZero(word) ? [] : [word]));
  return terms.length === 0 ? integer(0n) : terms.length === 1 && terms[0] ? terms[0] : sum(terms);
}

export const isZero = (word: Expression): boolean => word.kind === 'integer' && word.value === 0n;

export const zeroExpression: Expression = integer(0n);
