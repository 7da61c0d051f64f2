import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import type { Verdict } from '@/engine/decide/outcome';
import { expectVerdict, normalText, readForm } from '../property/kmw-engine';
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

/** The sample cases of the project, in-process. */
describe('sample equalities', () => {
  it.each(equalities.map((row) => [row.id, row] as const))('%s', (_, row) => {
    const { field, left, right, expect: expected } = row;
    expectVerdict(expected, field, left, right);
    const forms = [left, right].map((side) => {
      const form = normalText(field, side);
      expectVerdict('equal', field, side, readForm(form.text));
      return form;
    });
    if (!forms.every(({ canonical }) => canonical)) {
      expect(field).toBe('any');
      return;
    }
    expect(forms[0]?.text === forms[1]?.text).toBe(expected === 'equal');
  });

  it('are as many as there were', () => expect(equalities).toHaveLength(155));
});

describe('sample residues', () => {
  it.each(residueCases.map((row) => [row.id, row] as const))('%s', (_, row) => {
    const { answer, d } = at(Number(row.place), row.expression, row.uniformizer ?? undefined);
    expect([answer.residueField, answer.zero]).toEqual([row.residueField, row.zero]);
    expectVerdict('equal', row.residueField, d, row.expectValue);
  });

  it('are twenty', () => expect(residueCases).toHaveLength(20));
});
