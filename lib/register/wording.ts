import { z } from 'zod';
import { elementTex, fieldNameTex } from '@/engine/expression/to-tex';
import { fieldNameText } from '@/engine/expression/to-text';
import type { Condition, Statement } from '@/engine/expression/statement';
import { readStatement } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import { Declined } from '@/lib/compute/declined';
import { Reader } from '@/lib/compute/read';
import { showCondition, showExpression, showStatement } from '@/lib/compute/show';
import type { RevisionContent } from '@/lib/contracts/identity-content';
import { problemOf } from '@/lib/contracts/problem';

/** The texts of a revision that are mathematics. */
export type Wording = Pick<
  RevisionContent,
  'kind' | 'field' | 'statement' | 'hypotheses' | 'place' | 'uniformizer' | 'value'
>;

/** The same in TeX, as it is kept beside them. */
export const typesetWording = z.object({
  field: z.string(),
  statement: z.string(),
  hypotheses: z.array(z.string()),
  place: z.string().optional(),
  uniformizer: z.string().optional(),
  value: z.string().optional(),
});
export type TypesetWording = z.infer<typeof typesetWording>;

export interface ReadWording {
  /** As it is kept: the field by its usual name, what followed a semicolon among the hypotheses. */
  readonly wording: Wording;
  readonly typeset: TypesetWording;
}

/** Reads what a revision says. Throws `Declined`, with the key and the place in it, for a text that cannot be read. */
export function readWording(given: Wording): ReadWording {
  const reader = new Reader();
  return given.kind === 'residue' ? readResidue(given, reader) : readEquality(given, reader);
}

function readEquality({ kind, statement: text, hypotheses: apart, field: name }: Wording, reader: Reader): ReadWording {
  const statement = reader.statement('statement', text);
  if (statement.sides.length < 2)
    throw new Declined(
      problemOf('invalid', 'An identity needs an equals sign: “left = right”.', { part: 'statement' }),
    );
  const conditions = withoutRepetition([...statement.conditions, ...reader.conditions(apart)]);
  const field = reader.fieldName(name);
  return {
    wording: {
      kind,
      field: fieldNameText(field),
      statement: withoutConditions(text, statement),
      hypotheses: conditions.map((condition) => showCondition(condition).text),
    },
    typeset: {
      field: fieldNameTex(field),
      statement: showStatement({ ...statement, conditions: [] }).tex,
      hypotheses: conditions.map((condition) => showCondition(condition).tex),
    },
  };
}

function readResidue(given: Wording, reader: Reader): ReadWording {
  const expression = reader.expression('statement', given.statement);
  const value = reader.expression('value', given.value ?? '');
  const uniformizer = given.uniformizer === undefined ? undefined : reader.element('uniformizer', given.uniformizer);
  const field = reader.fieldName(given.field);
  return {
    wording: { ...given, field: fieldNameText(field), hypotheses: [] },
    typeset: {
      field: fieldNameTex(field),
      statement: showExpression(expression).tex,
      hypotheses: [],
      place: placeTex(given.place ?? ''),
      ...(uniformizer === undefined ? {} : { uniformizer: elementTex(uniformizer) }),
      value: showExpression(value).tex,
    },
  };
}

const withoutRepetition = (conditions: readonly Condition[]): Condition[] => [
  ...new Map(conditions.map((condition) => [showCondition(condition).text, condition])).values(),
];

/** The statement as it was typed, up to its hypotheses; printed anew where cutting them off would leave something else. */
function withoutConditions(text: string, statement: Statement): string {
  const at = statement.conditions[0]?.at;
  if (statement.conditions.length === 0) return text;
  const sides = showStatement({ ...statement, conditions: [] }).text;
  const cut = text
    .slice(0, at?.start ?? 0)
    .trimEnd()
    .replace(/;$/, '')
    .trimEnd();
  return readsAs(cut, sides) ? cut : sides;
}

function readsAs(text: string, wanted: string): boolean {
  try {
    return showStatement(readStatement(text)).text === wanted;
  } catch (error) {
    if (error instanceof ReadingError) return false;
    throw error;
  }
}

/** A place is a prime, a polynomial, two generators, `real` or `infinity`. */
function placeTex(place: string): string {
  if (place === 'infinity') return '\\infty';
  if (/^[a-z]{2,}$/.test(place)) return `\\mathrm{${place}}`;
  const reader = new Reader();
  try {
    return place
      .split(',')
      .map((generator) => elementTex(reader.element('place', generator)))
      .join(',\\,');
  } catch (error) {
    if (error instanceof Declined) throw new Declined({ ...error.problem, part: 'place' });
    throw error;
  }
}
