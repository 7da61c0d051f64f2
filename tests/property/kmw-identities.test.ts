import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { product, sum } from '@/engine/expression/expression';
import { field, expectVerdict, whereDefined } from './kmw-engine';
import { fieldRows } from './kmw-fields';
import { fits, identities, integers, relations, sideOf } from './kmw-identities';
import { difference, substitute, word } from './kmw-words';

const CONTEXT = { terms: 2, factors: 2, nested: false };

describe.each(fieldRows.map((row) => [row.label, row] as const))('over %s', (_, row) => {
  const { name, unit, conditions } = row;
  const values = fc.tuple(unit, unit, unit).map(
    ([a, b, c]) =>
      new Map([
        ['a', a],
        ['b', b],
        ['c', c],
      ]),
  );
  const rows = [...relations, ...identities].filter((identity) => fits(identity, row));

  it.each(rows.map((identity) => [identity.name, identity] as const))('%s', (_name, identity) => {
    fc.assert(
      fc.property(
        values,
        integers,
        fc.tuple(word(unit, CONTEXT), word(unit, CONTEXT), word(unit, CONTEXT)),
        (at, numbers, [u, v, w]) => {
          const [left, right] = [
            substitute(sideOf(identity.left, numbers), at),
            substitute(sideOf(identity.right, numbers), at),
          ];
          const defined = whereDefined(() => {
            expectVerdict('equal', name, left, right, conditions);
            expectVerdict('equal', name, sum([product([u, difference(left, right), v]), w]), w, conditions);
            expectVerdict('equal', name, sum([product([u, left, v]), w]), sum([w, product([u, right, v])]), conditions);
            return true;
          });
          fc.pre(defined !== undefined);
        },
      ),
      { numRuns: 6 },
    );
  });

  it('is the field that was asked for', () => {
    expect(field(name).name).toBe(name);
  });
});
