import fc from 'fast-check';
import type { Element } from '@/engine/expression/element';
import {
  angle,
  epsilon,
  epsilonInteger,
  eta,
  hyperbolic,
  integer,
  negate,
  pfister,
  power,
  product,
  sum,
  symbol,
  type Expression,
} from '@/engine/expression/expression';
import { mapEntries } from '@/engine/expression/map-entries';
import { substituteLetters } from '@/engine/expression/substitute';

/** How large random words grow. */
export interface Size {
  readonly terms: number;
  readonly factors: number;
  /** Parenthesised sums inside products and their powers, one level. */
  readonly nested: boolean;
}

const SMALL: Size = { terms: 3, factors: 3, nested: true };

const signed = (n: number): Expression => (n < 0 ? negate(integer(BigInt(-n))) : integer(BigInt(n)));

/** A homogeneous factor and its degree. */
function factor(unit: fc.Arbitrary<Element>): fc.Arbitrary<readonly [degree: number, word: Expression]> {
  const entries = fc.array(unit, { minLength: 1, maxLength: 2 });
  return fc.oneof(
    { weight: 6, arbitrary: unit.map((a) => [1, symbol([a])] as const) },
    { weight: 2, arbitrary: entries.map((a) => [a.length, symbol(a)] as const) },
    { weight: 4, arbitrary: unit.map((a) => [0, angle([a])] as const) },
    { weight: 1, arbitrary: entries.map((a) => [0, angle(a)] as const) },
    { weight: 1, arbitrary: entries.map((a) => [0, pfister(a)] as const) },
    { weight: 3, arbitrary: fc.constant([-1, eta()] as const) },
    { weight: 1, arbitrary: fc.constant([0, hyperbolic()] as const) },
    { weight: 1, arbitrary: fc.constant([0, epsilon()] as const) },
    { weight: 1, arbitrary: fc.integer({ min: -5, max: 6 }).map((n) => [0, epsilonInteger(BigInt(n))] as const) },
    { weight: 1, arbitrary: unit.map((a) => [2, power(symbol([a]), 2)] as const) },
  );
}

/** A random word; its parts have several degrees. */
export function word(unit: fc.Arbitrary<Element>, size: Size = SMALL): fc.Arbitrary<Expression> {
  const flat = fc.array(
    factor(unit).map(([, f]) => f),
    { minLength: 1, maxLength: size.factors },
  );
  const nested = fc
    .tuple(
      fc.array(flat.map(product), { minLength: 2, maxLength: 2 }),
      fc.integer({ min: 1, max: 2 }),
      factor(unit).map(([, f]) => f),
    )
    .map(([terms, exponent, tail]) => [exponent === 1 ? sum(terms) : power(sum(terms), exponent), tail]);
  const factors = size.nested ? fc.oneof({ weight: 4, arbitrary: flat }, { weight: 1, arbitrary: nested }) : flat;
  const term = fc
    .tuple(fc.integer({ min: -4, max: 4 }), factors)
    .map(([c, rest]) => product(c === 1 ? rest : [signed(c), ...rest]));
  return fc.array(term, { minLength: 1, maxLength: size.terms }).map(sum);
}

/** A random homogeneous word of a degree: in each term η or another symbol makes up what is missing. */
export function homogeneous(unit: fc.Arbitrary<Element>, degree: number): fc.Arbitrary<Expression> {
  const term = fc
    .tuple(
      fc.integer({ min: -3, max: 3 }),
      fc.array(factor(unit), { minLength: 1, maxLength: 3 }),
      fc.array(unit, { minLength: 8, maxLength: 8 }),
    )
    .map(([c, factors, spare]) => {
      const missing = degree - factors.reduce((sum_, [d]) => sum_ + d, 0);
      const filling = missing < 0 ? [power(eta(), -missing)] : spare.slice(0, missing).map((a) => symbol([a]));
      return product([signed(c), ...factors.map(([, f]) => f), ...filling]);
    });
  return fc.array(term, { minLength: 1, maxLength: 3 }).map(sum);
}

export const difference = (left: Expression, right: Expression): Expression => sum([left, negate(right)]);

/** Puts entries for letters into an expression. */
export const substitute = (expression: Expression, values: ReadonlyMap<string, Element>): Expression =>
  mapEntries(expression, (entry) => substituteLetters(entry, values));

/** The entries of symbols and forms, as they stand. */
export function entriesOf(node: Expression): readonly Element[] {
  switch (node.kind) {
    case 'symbol':
    case 'angle':
    case 'pfister':
      return node.entries;
    case 'negate':
      return entriesOf(node.of);
    case 'sum':
      return node.terms.flatMap(entriesOf);
    case 'product':
      return node.factors.flatMap(entriesOf);
    case 'power':
      return entriesOf(node.base);
    default:
      return [];
  }
}
