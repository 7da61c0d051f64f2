import fc from 'fast-check';
import { describe, it } from 'vitest';
import type { Element } from '@/engine/expression/element';
import { angle, epsilon, eta, integer, power, product, sum, type Expression } from '@/engine/expression/expression';
import { expectVerdict } from './kmw-engine';
import { fieldRows } from './kmw-fields';
import { difference, homogeneous, word } from './kmw-words';

type Law = readonly [name: string, left: (w: Words) => Expression, right: (w: Words) => Expression];

interface Words {
  readonly u: Expression;
  readonly v: Expression;
  readonly w: Expression;
  readonly a: Element;
}

const zero = integer(0n);
const one = integer(1n);

/** K^MW_*(F) is an associative ring with unit in which η and forms are central. */
const laws: readonly Law[] = [
  ['addition is commutative', ({ u, v }) => sum([u, v]), ({ u, v }) => sum([v, u])],
  ['addition is associative', ({ u, v, w }) => sum([sum([u, v]), w]), ({ u, v, w }) => sum([u, sum([v, w])])],
  ['zero is neutral', ({ u }) => sum([u, zero]), ({ u }) => u],
  ['there are negatives', ({ u }) => difference(u, u), () => zero],
  [
    'multiplication is associative',
    ({ u, v, w }) => product([product([u, v]), w]),
    ({ u, v, w }) => product([u, product([v, w])]),
  ],
  ['one is neutral', ({ u }) => product([one, u, one]), ({ u }) => u],
  ['zero absorbs', ({ u, v }) => product([u, zero, v]), () => zero],
  [
    'products distribute from the left',
    ({ u, v, w }) => product([u, sum([v, w])]),
    ({ u, v, w }) => sum([product([u, v]), product([u, w])]),
  ],
  [
    'products distribute from the right',
    ({ u, v, w }) => product([sum([u, v]), w]),
    ({ u, v, w }) => sum([product([u, w]), product([v, w])]),
  ],
  ['a square is a product', ({ u }) => power(u, 2), ({ u }) => product([u, u])],
  [
    'the square of a sum',
    ({ u, v }) => power(sum([u, v]), 2),
    ({ u, v }) => sum([power(u, 2), product([u, v]), product([v, u]), power(v, 2)]),
  ],
  ['a power of exponent 0 is one', ({ u }) => power(u, 0), () => one],
  ['integers are repeated sums', ({ u }) => product([integer(3n), u]), ({ u }) => sum([u, u, u])],
  ['eta is central', ({ u }) => product([eta(), u]), ({ u }) => product([u, eta()])],
  ['forms are central', ({ u, a }) => product([angle([a]), u]), ({ u, a }) => product([u, angle([a])])],
];

describe.each(fieldRows.map((row) => [row.label, row] as const))('over %s', (_, { name, unit, conditions }) => {
  const small = word(unit, { terms: 2, factors: 2, nested: false });
  const words = fc.record({ u: small, v: small, w: small, a: unit });

  it.each(laws)('%s', (_name, left, right) => {
    fc.assert(
      fc.property(words, (w) => expectVerdict('equal', name, left(w), right(w), conditions)),
      { numRuns: 4 },
    );
  });

  it('homogeneous elements commute up to a power of epsilon (F. Morel, LNM 2052, Corollary 3.8, number from memory)', () => {
    const degree = fc.integer({ min: -2, max: 3 });
    const pair = fc
      .tuple(degree, degree)
      .chain(([m, n]) => fc.tuple(fc.constant(m * n), homogeneous(unit, m), homogeneous(unit, n)));
    fc.assert(
      fc.property(pair, ([mn, u, v]) =>
        expectVerdict('equal', name, product([u, v]), product([power(epsilon(), Math.abs(mn)), v, u]), conditions),
      ),
      { numRuns: 15 },
    );
  });
});
