import { negateInt, toInt, type Int } from '../arith/int';
import { integerElement, negateElement, type Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import { boundedCoefficient, checkDegree } from './limits';
import { constantTerm, degreeRange, multiplyAll, type Factor, type Term } from './term';

const minusOne = negateElement(integerElement(1n));

/**
 * Lowers an expression to its kernel form; `read` turns an entry into a unit of the field (and refuses what is none).
 *
 * The definitions used: [a, b] = [a][b]; ⟨a, b⟩ = ⟨a⟩ + ⟨b⟩; ⟪a⟫ = 1 − ⟨a⟩; h = 1 + ⟨−1⟩; ε = −⟨−1⟩; (2m)_ε = m·h,
 * (2m+1)_ε = 1 + m·h for m ≥ 0, n_ε = −⟨−1⟩(−n)_ε for n < 0 (F. Morel, LNM 2052, ch. 3).
 * A product with one sum among its factors is multiplied out as long as that does not lengthen it much; one with more is kept.
 */
export function lower<A>(expression: Expression, read: (entry: Element) => A): readonly Term<A>[] {
  const terms = lowerNode(expression, read);
  for (const term of terms) {
    const [low, high] = degreeRange(term);
    checkDegree(low);
    checkDegree(high);
  }
  return terms;
}

function lowerNode<A>(node: Expression, read: (entry: Element) => A): readonly Term<A>[] {
  switch (node.kind) {
    case 'integer':
      return node.value === 0n ? [] : [constantTerm(boundedCoefficient(toInt(node.value)))];
    case 'symbol':
      return [
        {
          coefficient: 1,
          eta: 0,
          angles: [],
          factors: node.entries.map((entry) => ({ kind: 'symbol', entry: read(entry) })),
        },
      ];
    case 'angle':
      return node.entries.map((entry) => angleTerm(1, read(entry)));
    case 'pfister':
      return multiply(node.entries.map((entry) => [constantTerm<A>(1), angleTerm(-1, read(entry))]));
    case 'eta':
      return [{ ...constantTerm<A>(1), eta: 1 }];
    case 'hyperbolic':
      return [constantTerm<A>(1), angleTerm(1, read(minusOne))];
    case 'epsilon':
      return [angleTerm(-1, read(minusOne))];
    case 'epsilonInteger':
      return lowerEpsilonInteger(boundedCoefficient(node.count), read);
    case 'negate':
      return lowerNode(node.of, read).map((term) => ({ ...term, coefficient: negateInt(term.coefficient) }));
    case 'sum':
      return node.terms.flatMap((term) => lowerNode(term, read));
    case 'product':
      return multiply(node.factors.map((factor) => lowerNode(factor, read)));
    case 'power':
      return lowerPower(lowerNode(node.base, read), node.exponent);
  }
}

const angleTerm = <A>(coefficient: Int, entry: A): Term<A> => ({ coefficient, eta: 0, angles: [entry], factors: [] });

/** n_ε = x + y⟨−1⟩: ⌈n/2⌉ + ⌊n/2⌋⟨−1⟩ for n ≥ 0, and −⟨−1⟩ times that of −n for n < 0. */
function lowerEpsilonInteger<A>(n: bigint, read: (entry: Element) => A): readonly Term<A>[] {
  const size = n < 0n ? -n : n;
  const [more, fewer] = [(size + 1n) / 2n, size / 2n];
  const [x, y] = n < 0n ? [-fewer, -more] : [more, fewer];
  return [constantTerm<A>(toInt(x)), angleTerm(toInt(y), read(minusOne))].filter((term) => term.coefficient !== 0);
}

function multiply<A>(factors: readonly (readonly Term<A>[])[]): readonly Term<A>[] {
  if (factors.some((terms) => terms.length === 0)) return [];
  const [only, ...more] = factors.filter((terms) => terms.length > 1);
  if (only === undefined || more.length > 0) return [multiplyAll(factors.map(single))];
  const at = factors.indexOf(only);
  const before = multiplyAll(factors.slice(0, at).map(single));
  const after = multiplyAll(factors.slice(at + 1).map(single));
  // multiplying out lets every term be visited at its own places only, but must not lengthen the whole
  if (only.length * (lengthOf(before) + lengthOf(after)) > MULTIPLIED_OUT)
    return [multiplyAll([before, powerTerm(only, 1), after])];
  return only.map((term) => multiplyAll([before, term, after]));
}

/** A product with one sum is multiplied out up to this many copied letters. */
const MULTIPLIED_OUT = 20_000;

const lengthOf = <A>(term: Term<A>): number => term.angles.length + term.factors.length;

/** A factor as one term: a sum as its first power. */
function single<A>(terms: readonly Term<A>[]): Term<A> {
  const [first] = terms;
  return terms.length === 1 && first !== undefined ? first : powerTerm(terms, 1);
}

function lowerPower<A>(base: readonly Term<A>[], exponent: number): readonly Term<A>[] {
  if (exponent === 0) return [constantTerm<A>(1)];
  if (base.length === 0 || exponent === 1) return base;
  return [powerTerm(base, exponent)];
}

function powerTerm<A>(of: readonly Term<A>[], exponent: number): Term<A> {
  const factor: Factor<A> = { kind: 'power', of, exponent };
  return { ...constantTerm<A>(1), factors: [factor] };
}
