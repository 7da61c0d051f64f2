import {
  type Element,
  integerElement,
  letterElement,
  negateElement,
  powerElement,
  productElement,
  quotientElement,
  sumElement,
} from '../engine/expression/element';
import { adjacentNumbers, ambiguousQuotient, exponentTower, largeEntryExponent } from './faults';
import { largestEntryExponent } from './limits';
import type { SyntaxNode } from './syntax-node';
import { digitsMeet, exponentsOf, innerSign, plainInteger, signed, spanFrom } from './tree-parts';

const productOf = (factors: readonly Element[]): Element => {
  const [first] = factors;
  return first && factors.length === 1 ? first : productElement(factors, spanFrom(first?.at, factors.at(-1)?.at));
};

/** The field element that a node of the rule `element` writes. */
export function elementOf(node: SyntaxNode): Element {
  const terms = [signed(negateElement, node.option(0), elementProduct(node.child(1)))];
  const additions = node.each(2);
  node.each(3).forEach((product, i) => terms.push(signed(negateElement, additions[i], elementProduct(product))));
  const [only] = terms;
  return only && terms.length === 1 ? only : sumElement(terms, spanFrom(only?.at, terms.at(-1)?.at));
}

function elementProduct(node: SyntaxNode): Element {
  let factors = [elementFactor(node.child(0))];
  const operators = node.each(1);
  const rest = node.each(2);
  rest.forEach((next, i) => {
    const operator = operators[i];
    const before = factors.at(-1);
    if (!operator || !before) return;
    const factor = signed(negateElement, innerSign(operator), elementFactor(next));
    if (operator.rule === 'over') {
      const numerator = productOf(factors);
      factors = [quotientElement(numerator, factor, spanFrom(numerator.at, factor.at))];
      return;
    }
    if (operator.rule === '') {
      if (operators[i - 1]?.rule === 'over') refuseAfterDivision(node.text, before, operators, rest, i);
      if (before.at && factor.at && digitsMeet(node.text, before.at, factor.at)) {
        throw adjacentNumbers(node.text, before.at, factor.at);
      }
    }
    factors.push(factor);
  });
  return productOf(factors);
}

/**
 * A product without a sign right after a division can be read in two ways; `index` is its first factor. All the factors
 * that follow without a sign are quoted with it.
 */
function refuseAfterDivision(
  text: string,
  quotient: Element,
  operators: readonly SyntaxNode[],
  rest: readonly SyntaxNode[],
  index: number,
): void {
  let last = index;
  while (operators[last + 1]?.rule === '') last++;
  const [first, end] = [rest[index], rest[last]];
  if (quotient.kind !== 'quotient' || !quotient.numerator.at || !quotient.denominator.at || !first || !end) return;
  const factors = { start: first.start, end: first.start + text.slice(first.start, end.end).trimEnd().length };
  throw ambiguousQuotient(text, quotient.numerator.at, quotient.denominator.at, factors);
}

function elementFactor(node: SyntaxNode): Element {
  const atom = node.child(0);
  const base = elementAtom(atom);
  const exponents = exponentsOf(node.each(2));
  const [exponent] = exponents;
  if (!exponent) return base;
  if (exponents.length > 1) throw exponentTower(node.text, atom.at, exponents, largestEntryExponent);
  const limit = BigInt(largestEntryExponent);
  if (exponent.value > limit || exponent.value < -limit) throw largeEntryExponent(node.text, exponent.number);
  return powerElement(base, Number(exponent.value), spanFrom(atom.at, exponent.at));
}

function elementAtom(node: SyntaxNode): Element {
  switch (node.rule) {
    case 'integer':
      return integerElement(BigInt(node.source), node.at);
    case 'fieldLetter':
      return letterElement(letterOf(node), node.at);
    case 'elementGroup':
      return { ...elementOf(node.child(2)), at: node.at };
    default:
      // fraction: the sign, a gap, the numerator in braces, a gap, the denominator in braces
      return quotientElement(elementOf(node.child(2).child(2)), elementOf(node.child(4).child(2)), node.at);
  }
}

/** The letter that a node of the rule `fieldLetter` writes, in the form `x12''`. */
export function letterOf({ source }: SyntaxNode): string {
  const primes = source.match(/['′’]|\\prime/gu) ?? [];
  return source.charAt(0) + plainInteger(source.slice(1)) + "'".repeat(primes.length);
}
