import fc from 'fast-check';
import {
  angle,
  eta,
  integer,
  negate,
  power,
  product,
  sum,
  symbol,
  type Expression,
} from '@/engine/expression/expression';
import type { FieldRow } from './kmw-fields';
import { fits, identities, integers, relations, sideOf } from './kmw-identities';
import { homogeneous, substitute, word, type Size } from './kmw-words';

export interface Pair {
  readonly left: Expression;
  readonly right: Expression;
}

const FLAT: Size = { terms: 2, factors: 2, nested: false };
const TINY: Size = { terms: 1, factors: 1, nested: false };

/** left = right, where right comes from left by relations and identities used inside words, and terms changed places. */
export function equalPair(row: FieldRow): fc.Arbitrary<Pair> {
  const { unit } = row;
  const rows = [...relations, ...identities].filter((identity) => fits(identity, row));
  const use = fc
    .record({
      identity: fc.constantFrom(...rows),
      numbers: integers.map(({ n, m }) => ({ n: n % 4, m: m % 3 })),
      at: fc.tuple(unit, unit, unit),
      before: word(unit, TINY),
      after: word(unit, TINY),
      turned: fc.boolean(),
    })
    .map(({ identity, numbers, at: [a, b, c], before, after, turned }): Pair => {
      const at = new Map([
        ['a', a],
        ['b', b],
        ['c', c],
      ]);
      const [l, r] = [identity.left, identity.right].map((side) =>
        product([before, substitute(sideOf(side, numbers), at), after]),
      ) as [Expression, Expression];
      return turned ? { left: r, right: l } : { left: l, right: r };
    });
  return fc.tuple(fc.array(use, { minLength: 1, maxLength: 2 }), word(unit, FLAT)).map(([uses, rest]) => ({
    left: sum([rest, ...uses.map(({ left }) => left)]),
    right: sum([...uses.map(({ right }) => right).reverse(), rest]),
  }));
}

/** A pair that was equal, with a small edit on the right: an entry, a sign, a coefficient or a term. */
export function editedPair(row: FieldRow): fc.Arbitrary<Pair> {
  const { unit } = row;
  const edit = fc.oneof(
    unit.map((a): Expression => product([symbol([a]), angle([a])])),
    fc.tuple(unit, unit).map(([a, b]) => sum([symbol([a, b]), negate(symbol([b, a]))])),
    fc
      .tuple(unit, unit)
      .map(([a, b]) =>
        sum([angle([a, b]), negate(angle([{ kind: 'product', factors: [a, b] }])), negate(integer(1n))]),
      ),
    fc
      .tuple(fc.constantFrom(1n, 2n, 3n), fc.integer({ min: 0, max: 2 }))
      .map(([c, k]) => product([integer(c), power(eta(), k)])),
    fc.integer({ min: -2, max: 2 }).chain((n) => homogeneous(unit, n)),
    word(unit, TINY),
  );
  return fc.tuple(equalPair(row), edit).map(([{ left, right }, extra]) => ({ left, right: sum([right, extra]) }));
}

/** Pairs that are equal about half of the time: many an edit changes nothing. */
export const pair = (row: FieldRow): fc.Arbitrary<Pair> =>
  fc.oneof({ weight: 1, arbitrary: equalPair(row) }, { weight: 2, arbitrary: editedPair(row) });
