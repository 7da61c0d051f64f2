import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Element } from '@/engine/expression/element';
import { readElement } from '@/grammar/read';
import { decidePrimeField, decideRational } from '../oracle/pull-back';
import { expectVerdict, judge } from './kmw-engine';
import { fieldRow, fieldRows, rationalUnit } from './kmw-fields';
import { nearMisses, sideOf, type NearMiss } from './kmw-identities';
import { substitute } from './kmw-words';

const none = { n: 0, m: 0 };
const cases = nearMisses.map((row) => [row.name, row] as const);

/** Near misses of the identities of F. Morel, LNM 2052, ch. 3: what is false in letters, and where it is true all the same. */
describe.each(cases)('%s', (_, row: NearMiss) => {
  const [left, right] = [sideOf(row.left, none), sideOf(row.right, none)];

  it('is false over an unspecified field', () => {
    expectVerdict('different', 'any', left, right);
  });

  it.each([2, 3, 5, 7, 13])('in characteristic %i holds in letters only for a reason in [-1]', (p) => {
    const holds = row.holds === 'one' ? p === 2 : row.holds === 'square' && p % 4 !== 3;
    const conditions = [{ kind: 'characteristic', is: true, prime: BigInt(p) }] as const;
    expectVerdict(holds ? 'equal' : 'different', 'any', left, right, conditions);
  });

  it('is false at several values over Q, and judged as by symbols and forms at each', () => {
    const judged = (a: Element, b: Element): boolean => {
      const values = new Map([
        ['a', a],
        ['b', b],
      ]);
      const sides = [substitute(left, values), substitute(right, values)] as const;
      const slow = decideRational('Q', ...sides);
      expectVerdict(slow.equal ? 'equal' : 'different', 'Q', ...sides);
      return slow.equal;
    };
    const chosen = [
      [-1, -1],
      [-2, -3],
      [-5, -7],
      [3, 7],
      [2, 5],
      [-3, 11],
    ] as const;
    const different = chosen.filter(([a, b]) => !judged(readElement(`${a}`), readElement(`${b}`)));
    expect(different.length).toBeGreaterThanOrEqual(3);
    fc.assert(
      fc.property(rationalUnit(), rationalUnit(), (a, b) => void judged(a, b)),
      { numRuns: 30 },
    );
  });

  it.each([2n, 3n, 5n, 7n, 101n])('is judged over F_%s as by units, rank and discriminant', (p) => {
    fc.assert(
      fc.property(fieldRow(`F_${p}`).unit, fieldRow(`F_${p}`).unit, (a, b) => {
        const values = new Map([
          ['a', a],
          ['b', b],
        ]);
        const sides = [substitute(left, values), substitute(right, values)] as const;
        expectVerdict(decidePrimeField(p, ...sides).equal ? 'equal' : 'different', `F_${p}`, ...sides);
      }),
      { numRuns: 15 },
    );
  });
});

describe('values at which a near miss is true', () => {
  it.each([
    ['Q', '[4]', '2[2]'],
    ['Q', '[2][3]', '-[3][2]'],
    ['F_5', '2_eps', '2'],
    ['C', '[a][a]', '0'],
  ])('over %s: %s = %s', (name, left, right) => {
    expectVerdict('equal', name, left.replaceAll('a', '2'), right);
  });

  it('[2][5] and [5][2] differ modulo η, where the order of 2 modulo 5 is 4, but not modulo h', () => {
    const outcome = judge('Q', '[2][5]', '[5][2]');
    expect([outcome.verdict, outcome.evidence.modEta, outcome.evidence.modH]).toEqual(['different', false, true]);
  });
});

describe('three symbols turned round', () => {
  it('differ in letters, though over every finite field and over Q_p nothing is left of them', () => {
    expectVerdict('different', 'any', '[a][b][c]', '[b][a][c]');
    for (const { name, unit, sums } of fieldRows.filter(
      (row) => row.sums && !['Q', 'R', 'C', 'Q(t)'].includes(row.name) && !row.name.startsWith('Q['),
    )) {
      expect(sums).toBe(true);
      fc.assert(
        fc.property(unit, unit, unit, (a, b, c) => {
          const values = new Map([
            ['a', a],
            ['b', b],
            ['c', c],
          ]);
          expectVerdict('equal', name, substitute(sideOf('[a][b][c]', none), values), '0');
        }),
        { numRuns: 5 },
      );
    }
  });
});
