import { expect } from 'vitest';
import { unlimited } from '@/engine/arith/budget';
import { compare } from '@/engine/decide/compare';
import type { DecidableField } from '@/engine/decide/decidable-field';
import { normalize } from '@/engine/decide/normalize';
import type { CompareOutcome, Verdict } from '@/engine/decide/outcome';
import { resolveField } from '@/engine/decide/registry';
import type { Expression } from '@/engine/expression/expression';
import { Refusal } from '@/engine/expression/refusal';
import type { Condition } from '@/engine/expression/statement';
import { expressionText } from '@/engine/expression/to-text';
import { readExpression, readFieldName } from '@/grammar/read';
import { fieldRows } from './kmw-fields';

const fields = new Map<string, DecidableField>();

/** The field with a name, as a person types it. */
export function field(name: string): DecidableField {
  const made = fields.get(name) ?? resolveField(readFieldName(name), unlimited);
  fields.set(name, made);
  return made;
}

const tree = (e: Expression | string): Expression => (typeof e === 'string' ? readExpression(e) : e);

/** left = right, judged. */
export const judge = (
  name: string,
  left: Expression | string,
  right: Expression | string,
  conditions: readonly Condition[] = [],
): CompareOutcome => compare(field(name), tree(left), tree(right), conditions, unlimited);

export const verdict = (...question: Parameters<typeof judge>): Verdict => judge(...question).verdict;

/** Asserts a verdict; the message of a failure is the statement. */
export function expectVerdict(expected: Verdict, ...question: Parameters<typeof judge>): void {
  const [name, left, right, conditions = []] = question;
  const under = conditions.map((c) => (c.kind === 'characteristic' ? `; char = ${c.prime}` : '; …')).join('');
  const statement = `${expressionText(tree(left))} = ${expressionText(tree(right))}${under} over ${name}`;
  const { verdict: found, parts } = judge(...question);
  // K_2 of a number field
  const open = name.startsWith('Q[') ? 2 : fieldRows.find((row) => row.name === name)?.open;
  if (found === 'undecided' && open !== undefined) {
    // what is settled must be right, and nothing may be open but what has to be
    for (const part of parts) expect(part.verdict, statement).toBe(part.degree === open ? 'undecided' : 'equal');
    return;
  }
  expect(found, statement).toBe(expected);
}

/** The normal form as text by degree, highest first: `1: [2] + …`, and whether it is canonical. */
export function normalText(
  name: string,
  expression: Expression | string,
  conditions: readonly Condition[] = [],
): { readonly text: string; readonly canonical: boolean } {
  const { parts } = normalize(field(name), tree(expression), { conditions }, unlimited);
  const text = parts.map(({ degree, normalForm }) => `${degree}: ${expressionText(normalForm)}`).join('\n');
  return { text, canonical: parts.every(({ canonical }) => canonical) };
}

/** A normal form as text, of a class whose normal form is canonical. */
export function canonicalText(...question: Parameters<typeof normalText>): string {
  const { text, canonical } = normalText(...question);
  expect(canonical).toBe(true);
  return text;
}

/** The text of a normal form read back as one expression. */
export const readForm = (text: string): Expression =>
  readExpression(
    text
      .split('\n')
      .map((line) => line.replace(/^-?[0-9]+: /, ''))
      .filter((part) => part !== '')
      .join(' + ') || '0',
  );

/** The canonical form read back as one expression. */
export const canonicalForm = (...question: Parameters<typeof normalText>): Expression =>
  readForm(canonicalText(...question));

/** Runs a question that an entry may make meaningless: `undefined` when an entry, or what it is divided by, turns out to be zero. */
export function whereDefined<T>(question: () => T): T | undefined {
  try {
    return question();
  } catch (error) {
    if (error instanceof Refusal && ['not-a-unit', 'division-by-zero'].includes(error.code)) return undefined;
    throw error;
  }
}
