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
import type { Element } from '../engine/expression/element';
import { elementOf } from './element-tree';
import { adjacentNumbers, exponentTower, largePower, negativePower, numberAfterWord } from './faults';
import { largestPower } from './limits';
import type { SyntaxNode } from './syntax-node';
import { digitsMeet, exponentsOf, innerSign, plainInteger, signed, spanFrom } from './tree-parts';

/** The word that a node of the rule `sum` writes. */
export function expressionOf(node: SyntaxNode): Expression {
  const terms = [signed(negate, node.option(0), productOf(node.child(1)))];
  const additions = node.each(2);
  node.each(3).forEach((term, i) => terms.push(signed(negate, additions[i], productOf(term))));
  const [only] = terms;
  return only && terms.length === 1 ? only : sum(terms, spanFrom(only?.at, terms.at(-1)?.at));
}

function productOf(node: SyntaxNode): Expression {
  const factors = [factorOf(node.child(0))];
  const operators = node.each(1);
  node.each(2).forEach((next, i) => {
    const operator = operators[i];
    const before = factors.at(-1)?.at;
    if (!operator || !before) return;
    const factor = signed(negate, innerSign(operator), factorOf(next));
    if (operator.rule === '' && factor.kind !== 'epsilonInteger' && factor.at) {
      if (digitsMeet(node.text, before, factor.at)) throw adjacentNumbers(node.text, before, factor.at);
      if (factor.kind === 'integer' && isWord(factors.at(-1)) && before.end === factor.at.start) {
        throw numberAfterWord(node.text, before, factor.at);
      }
    }
    factors.push(factor);
  });
  const [only] = factors;
  return only && factors.length === 1 ? only : product(factors, spanFrom(only?.at, factors.at(-1)?.at));
}

const isWord = (factor: Expression | undefined): boolean =>
  factor?.kind === 'eta' || factor?.kind === 'epsilon' || factor?.kind === 'hyperbolic';

function factorOf(node: SyntaxNode): Expression {
  const atom = node.child(0);
  const base = atomOf(atom);
  const exponents = exponentsOf(node.each(2));
  const [exponent] = exponents;
  if (!exponent) return base;
  if (exponents.length > 1) throw exponentTower(node.text, atom.at, exponents, largestPower);
  if (exponent.value < 0n) throw negativePower(node.text, exponent.number, exponent.value);
  if (exponent.value > BigInt(largestPower)) throw largePower(node.text, exponent.number);
  return power(base, Number(exponent.value), spanFrom(atom.at, exponent.at));
}

/** The entries of a bracket: its sign, a gap, the first entry, then the columns of commas, gaps and further entries. */
const entriesOf = (node: SyntaxNode): readonly Element[] => [node.child(2), ...node.each(5)].map(elementOf);

function atomOf(node: SyntaxNode): Expression {
  switch (node.rule) {
    case 'symbol':
      return symbol(entriesOf(node), node.at);
    case 'angle':
    case 'otherAngle':
      return angle(entriesOf(node), node.at);
    case 'pfister':
    case 'otherPfister':
      return pfister(entriesOf(node), node.at);
    case 'eta':
      return eta(node.at);
    case 'hyperbolic':
      return hyperbolic(node.at);
    case 'epsilon':
      return epsilon(node.at);
    case 'coefficient': {
      const value = BigInt(node.child(0).source);
      return node.child(2).count > 0 ? epsilonInteger(value, node.at) : integer(value, node.at);
    }
    case 'signedCount':
      return epsilonInteger(BigInt(plainInteger(node.child(2).source)), node.at);
    default:
      // group: a parenthesis, a gap, the word
      return { ...expressionOf(node.child(2)), at: node.at };
  }
}
