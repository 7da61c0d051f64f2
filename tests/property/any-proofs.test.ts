import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SteinbergRelation } from '@/engine/decide/outcome';
import { sumElement, type Element } from '@/engine/expression/element';
import { product, sum, symbol, type Expression } from '@/engine/expression/expression';
import { readExpression } from '@/grammar/read';
import { canonicalWords } from '../oracle/canonical-words';
import { valueOf } from '../oracle/fraction';
import { overCoprimeIntegers } from '../oracle/integer-base';
import { identitiesInLetters, theorems, type Claim } from './any-statements';
import { largeValues, sumUnit } from './any-sums';
import { judge, whereDefined } from './kmw-engine';
import { fits, identities, integers, relations, sideOf } from './kmw-identities';
import { fieldRow } from './kmw-fields';
import { difference, entriesOf, substitute, word } from './kmw-words';

const rows = (claims: readonly Claim[]): readonly (readonly [string, Claim])[] =>
  claims.map((claim) => [claim.name, claim] as const);

/** Values that make a proof in letters one in large numbers, whose factors in common are those of the letters' polynomials. */
const points = fc.sample(largeValues, { numRuns: 2, seed: 4 });

/**
 * Recomputes a proof without the engine: with large numbers for letters every pair adds up to 1, and left − right less the sum of all
 * times·[x][y] is zero as a combination of canonical words, for which no Steinberg relation is used.
 */
function recheck(left: Expression, right: Expression, proof: readonly SteinbergRelation[]): void {
  const rest = sum([
    difference(left, right),
    ...proof.map(({ times, left: x, right: y }) => product([readExpression('-1'), times, symbol([x]), symbol([y])])),
  ]);
  for (const values of points) {
    for (const { left: x, right: y } of proof) {
      const [atX, atY] = [x, y].map((entry) => atValues(entry, values));
      if (atX === undefined || atY === undefined) throw new Error('a relation has two entries');
      expect(valueOf(sumElement([atX, atY]))).toEqual({ num: 1n, den: 1n });
    }
    const there = substitute(rest, values);
    const words = canonicalWords(there, overCoprimeIntegers(entriesOf(there)), 0n);
    expect([...words]).toEqual([]);
  }
}

const atValues = (entry: Element, values: ReadonlyMap<string, Element>): Element | undefined => {
  const there = substitute(symbol([entry]), values);
  return there.kind === 'symbol' ? there.entries[0] : undefined;
};

describe('proofs by Steinberg relations', () => {
  let rechecked = 0;

  it.each(rows([...theorems, ...identitiesInLetters]))('%s: the combination is recomputed', (_, { left, right }) => {
    for (const [l, r] of [
      [left, right],
      [`[u](${left}) + [w]`, `[w] + [u](${right})`],
    ] as const) {
      const { verdict, evidence } = judge('any', l, r);
      expect(verdict).toBe('equal');
      if (evidence.relations === undefined) continue;
      rechecked += 1;
      recheck(readExpression(l), readExpression(r), evidence.relations);
    }
  });

  it('were some of them', () => expect(rechecked).toBeGreaterThan(30));

  it('of random statements, made by an identity inside of a word, are right', () => {
    const letters = ['a', 'b'];
    const unit = sumUnit(letters);
    const row = { ...fieldRow('any'), sums: true, steinberg: true };
    const names = [...relations, ...identities].filter((identity) => fits(identity, row));
    const tiny = word(unit, { terms: 1, factors: 2, nested: false });
    const instance = fc.record({
      identity: fc.constantFrom(...names),
      numbers: integers.map(({ n, m }) => ({ n: n % 3, m: m % 3 })),
      values: fc.tuple(unit, unit, unit),
      words: fc.tuple(tiny, tiny),
    });
    let checked = 0;
    fc.assert(
      fc.property(instance, ({ identity, numbers, values: [a, b, c], words: [u, w] }) => {
        const values = new Map([
          ['a', a],
          ['b', b],
          ['c', c],
        ]);
        const [left, right] = [identity.left, identity.right].map((side) => substitute(sideOf(side, numbers), values));
        if (left === undefined || right === undefined) return;
        const [l, r] = [sum([product([u, left]), w]), sum([w, product([u, right])])];
        const outcome = whereDefined(() => judge('any', l, r));
        fc.pre(outcome !== undefined);
        if (outcome?.evidence.relations === undefined) return;
        recheck(l, r, outcome.evidence.relations);
        checked += 1;
      }),
      { numRuns: 60 },
    );
    expect(checked).toBeGreaterThan(10);
  });
});
