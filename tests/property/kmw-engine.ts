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
  expect(verdict(...question), statement).toBe(expected);
}

/** The canonical form as text by degree, highest first: `1: [2] + …`. */
export function canonicalText(
  name: string,
  expression: Expression | string,
  conditions: readonly Condition[] = [],
): string {
  const { parts } = normalize(field(name), tree(expression), { conditions }, unlimited);
  expect(parts.every(({ canonical }) => canonical)).toBe(true);
  return parts.map(({ degree, normalForm }) => `${degree}: ${expressionText(normalForm)}`).join('\n');
}

/** The canonical form read back as one expression. */
export const canonicalForm = (
  name: string,
  expression: Expression | string,
  conditions: readonly Condition[] = [],
): Expression =>
  readExpression(
    canonicalText(name, expression, conditions)
      .split('\n')
      .map((line) => line.replace(/^-?[0-9]+: /, ''))
      .filter((text) => text !== '')
      .join(' + ') || '0',
  );

/** Runs a question that an entry may make meaningless: `undefined` when an entry, or what it is divided by, turns out to be zero. */
export function whereDefined<T>(question: () => T): T | undefined {
  try {
    return question();
  } catch (error) {
    if (error instanceof Refusal && ['not-a-unit', 'division-by-zero'].includes(error.code)) return undefined;
    throw error;
  }
}
