import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import type { Verdict } from '@/engine/decide/outcome';
import { Refusal } from '@/engine/expression/refusal';
import { canonicalForm, canonicalText, expectVerdict, verdict } from '../property/kmw-engine';
import { at } from '../property/kmw-residue-calls';

interface Equality {
  readonly id: string;
  readonly field: string;
  readonly left: string;
  readonly right: string;
  readonly expect: Verdict;
}

interface ResidueCase {
  readonly id: string;
  readonly field: string;
  readonly expression: string;
  readonly place: string;
  readonly uniformizer: string | null;
  readonly residueField: string;
  readonly expectValue: string;
  readonly zero: boolean;
}

const cases = <T>(name: string): readonly T[] => {
  const file = path.resolve(import.meta.dirname, '../vectors', name);
  const { cases: list } = JSON.parse(readFileSync(file, 'utf8')) as { cases: T[] };
  return list;
};

const equalities = cases<Equality>('compare-samples.json');
const residueCases = cases<ResidueCase>('residue-samples.json');

/** Entries that are sums in letters are not decided over an unspecified field. */
const undecidable = (error: unknown): boolean => error instanceof Refusal && error.code === 'not-yet';

/** The sample cases of the project, in-process. */
describe('sample equalities', () => {
  it.each(equalities.map((row) => [row.id, row] as const))('%s', (_, row) => {
    let found: Verdict;
    try {
      found = verdict(row.field, row.left, row.right);
    } catch (error) {
      if (row.field === 'any' && undecidable(error)) return;
      throw error;
    }
    expect(found, `${row.left} = ${row.right} over ${row.field}`).toBe(row.expect);
    const texts = [row.left, row.right].map((side) => {
      expectVerdict('equal', row.field, side, canonicalForm(row.field, side));
      return canonicalText(row.field, side);
    });
    expect(texts[0] === texts[1]).toBe(row.expect === 'equal');
  });

  it('all but thirteen, whose entries are sums of letters, are decided', () => {
    const refused = equalities.filter(({ field, left, right }) => {
      try {
        verdict(field, left, right);
        return false;
      } catch (error) {
        return undecidable(error);
      }
    });
    expect(refused.every(({ field }) => field === 'any')).toBe(true);
    expect(refused).toHaveLength(13);
    expect(equalities).toHaveLength(155);
  });
});

describe('sample residues', () => {
  it.each(residueCases.map((row) => [row.id, row] as const))('%s', (_, row) => {
    const { answer, d } = at(Number(row.place), row.expression, row.uniformizer ?? undefined);
    expect([answer.residueField, answer.zero]).toEqual([row.residueField, row.zero]);
    expectVerdict('equal', row.residueField, d, row.expectValue);
  });

  it('are twenty', () => expect(residueCases).toHaveLength(20));
});
