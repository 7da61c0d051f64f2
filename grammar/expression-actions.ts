import type { Node, Semantics } from 'ohm-js';
import type { Element } from '../engine/expression/element';
import {
  angle,
  epsilon,
  epsilonInteger,
  eta,
  type Expression,
  hyperbolic,
  integer,
  negate,
  pfister,
  power,
  product,
  sum,
  symbol,
} from '../engine/expression/expression';
import { adjacentNumbers, exponentTower, largePower, negativePower } from './faults';
import { largestPower } from './limits';
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

const read = (node: Node): Expression => node.expression() as Expression;
const entries = (first: Node, rest: Node): readonly Element[] =>
  [first, ...rest.children].map((entry) => entry.element() as Element);

/** The operation `expression`: from the syntax tree to the word it writes. */
export function addExpressionActions(semantics: Semantics): void {
  semantics.addOperation<Expression>('expression', {
    ...undressed('expression'),
    sum(firstSign, first, signs, rest) {
      const terms = [signed(negate, optional(firstSign), read(first))];
      rest.children.forEach((node, i) => {
        terms.push(signed(negate, signs.child(i), read(node)));
      });
      const [only] = terms;
      return only && terms.length === 1 ? only : sum(terms, spanFrom(only?.at, terms.at(-1)?.at));
    },
    product(first, operators, rest) {
      const factors = [read(first)];
      rest.children.forEach((node, i) => {
        const operator = operators.child(i);
        const factor = signed(negate, innerSign(operator), read(node));
        const before = factors.at(-1)?.at;
        if (operator.ctorName === 'juxtaposed' && factor.kind !== 'epsilonInteger' && before && factor.at) {
          if (digitsMeet(textOf(node), before, factor.at)) throw adjacentNumbers(textOf(node), before, factor.at);
        }
        factors.push(factor);
      });
      const [only] = factors;
      return only && factors.length === 1 ? only : product(factors, spanFrom(only?.at, factors.at(-1)?.at));
    },
    factor(atom, _gap, exponents) {
      const base = read(atom);
      const powers = readExponents(exponents);
      const [exponent] = powers;
      if (!exponent) return base;
      if (powers.length > 1) throw exponentTower(textOf(atom), spanOf(atom), powers, largestPower);
      if (exponent.value < 0n) throw negativePower(textOf(atom), exponent.at, exponent.value);
      if (exponent.value > BigInt(largestPower)) throw largePower(textOf(atom), exponent.at);
      return power(base, Number(exponent.value), spanFrom(spanOf(atom), exponent.at));
    },
    group(_open, _gap, inner, _close) {
      return { ...read(inner), at: spanOf(this) };
    },
    symbol(_open, _gap, first, _commas, _gaps, rest, _close) {
      return symbol(entries(first, rest), spanOf(this));
    },
    angle(_open, _gap, first, _commas, _gaps, rest, _close) {
      return angle(entries(first, rest), spanOf(this));
    },
    otherAngle(_open, _gap, first, _commas, _gaps, rest, _close) {
      return angle(entries(first, rest), spanOf(this));
    },
    pfister(_open, _gap, first, _commas, _gaps, rest, _close) {
      return pfister(entries(first, rest), spanOf(this));
    },
    otherPfister(_open, _gap, first, _commas, _gaps, rest, _close) {
      return pfister(entries(first, rest), spanOf(this));
    },
    coefficient(digits, _gap, underline, _gap2, _epsilon) {
      const value = BigInt(digits.sourceString);
      return underline.children.length > 0 ? epsilonInteger(value, spanOf(this)) : integer(value, spanOf(this));
    },
    signedCount(_open, _gap, count, _gap1, _close, _gap2, _underline, _gap3, _epsilon) {
      return epsilonInteger(BigInt(plainInteger(count.sourceString)), spanOf(this));
    },
    eta(_) {
      return eta(spanOf(this));
    },
    hyperbolic(_) {
      return hyperbolic(spanOf(this));
    },
    epsilon(_) {
      return epsilon(spanOf(this));
    },
  });
}
