import type { Node, Semantics } from 'ohm-js';
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
import {
  digitsMeet,
  innerSign,
  optional,
  plainInteger,
  readExponents,
  signed,
  spanFrom,
  spanOf,
  textOf,
  undressed,
} from './nodes';

const read = (node: Node): Element => node.element() as Element;

const productOf = (factors: readonly Element[]): Element => {
  const [first] = factors;
  return first && factors.length === 1 ? first : productElement(factors, spanFrom(first?.at, factors.at(-1)?.at));
};

/**
 * A product without a sign right after a division can be read in two ways; `index` is the first such factor. All the
 * factors that follow without a sign are quoted with it.
 */
function refuseAfterDivision(
  text: string,
  quotient: Element,
  operators: readonly Node[],
  rest: readonly Node[],
  index: number,
): never {
  let last = index;
  while (operators[last + 1]?.ctorName === 'juxtaposed') last++;
  const at = spanFrom(read(rest[index] as Node).at, read(rest[last] as Node).at);
  if (quotient.kind !== 'quotient' || !quotient.numerator.at || !quotient.denominator.at || !at)
    throw new Error('no place');
  throw ambiguousQuotient(text, quotient.numerator.at, quotient.denominator.at, at);
}

/** The operation `element`: from the syntax tree to the field element it writes. */
export function addElementActions(semantics: Semantics): void {
  semantics.addOperation<Element>('element', {
    ...undressed('element'),
    element(firstSign, first, signs, rest) {
      const terms = [signed(negateElement, optional(firstSign), read(first))];
      rest.children.forEach((node, i) => {
        terms.push(signed(negateElement, signs.child(i), read(node)));
      });
      const [only] = terms;
      return only && terms.length === 1 ? only : sumElement(terms, spanFrom(only?.at, terms.at(-1)?.at));
    },
    elementProduct(first, operators, rest) {
      let factors = [read(first)];
      let divided = false;
      rest.children.forEach((node, i) => {
        const operator = operators.child(i);
        const factor = signed(negateElement, innerSign(operator), read(node));
        if (operator.ctorName === 'over') {
          const numerator = productOf(factors);
          factors = [quotientElement(numerator, factor, spanFrom(numerator.at, factor.at))];
        } else if (operator.ctorName === 'juxtaposed') {
          const before = factors.at(-1);
          if (divided && before) refuseAfterDivision(textOf(node), before, operators.children, rest.children, i);
          if (before?.at && factor.at && digitsMeet(textOf(node), before.at, factor.at)) {
            throw adjacentNumbers(textOf(node), before.at, factor.at);
          }
          factors.push(factor);
        } else factors.push(factor);
        divided = operator.ctorName === 'over';
      });
      return productOf(factors);
    },
    elementFactor(atom, _gap, exponents) {
      const base = read(atom);
      const powers = readExponents(exponents);
      const [power] = powers;
      if (!power) return base;
      if (powers.length > 1) throw exponentTower(textOf(atom), spanOf(atom), powers, largestEntryExponent);
      const limit = BigInt(largestEntryExponent);
      if (power.value > limit || power.value < -limit) throw largeEntryExponent(textOf(atom), power.at);
      return powerElement(base, Number(power.value), spanFrom(spanOf(atom), power.at));
    },
    elementGroup(_open, _gap, inner, _close) {
      return { ...read(inner), at: spanOf(this) };
    },
    fraction(_frac, _gap, numerator, _gap2, denominator) {
      return quotientElement(read(numerator), read(denominator), spanOf(this));
    },
    braced(_open, _gap, inner, _gap2, _close) {
      return read(inner);
    },
    integer(digits) {
      return integerElement(BigInt(digits.sourceString), spanOf(this));
    },
    fieldLetter(latin, before, index, after) {
      const primes = "'".repeat(before.children.length + after.children.length);
      return letterElement(latin.sourceString + plainInteger(index.sourceString) + primes, spanOf(this));
    },
  });
}
