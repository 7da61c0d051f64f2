import type { z } from 'zod';
import { type Problem, problemOf } from './problem';

/** A body may be wrong in as many ways as it has keys; a message names the first few. */
const mostErrors = 20;

/** The problem document of a body that does not fit its schema: the keys that are wrong, in words. */
export function shapeProblem(error: z.ZodError, body: unknown): Problem {
  const errors = error.issues.flatMap((issue) => explain(issue, body)).slice(0, mostErrors);
  const first = errors[0];
  return problemOf('invalid', errors.map(({ detail }) => detail).join(' ') || 'The request has the wrong shape.', {
    errors,
    ...(first !== undefined && first.key !== '' ? { part: first.key } : {}),
  });
}

function explain(issue: z.core.$ZodIssue, body: unknown): { key: string; detail: string }[] {
  const key = keyOf(issue.path);
  const named = key === '' ? 'The body' : `The key “${key}”`;
  switch (issue.code) {
    case 'unrecognized_keys':
      return issue.keys.map((unknown) => {
        const inside = keyOf([...issue.path, unknown]);
        return { key: shorten(inside), detail: `There is no key “${shorten(inside)}” here.` };
      });
    case 'invalid_type':
      return [
        key !== '' && valueAt(body, issue.path) === undefined
          ? { key, detail: `${named} is missing.` }
          : { key, detail: `${named} must be ${article(issue.expected)}.` },
      ];
    case 'too_big':
      if (issue.origin === 'string') return [{ key, detail: `${named} may have at most ${issue.maximum} characters.` }];
      return [{ key, detail: `${named} may have at most ${issue.maximum} entries.` }];
    case 'too_small':
      if (issue.origin === 'string') return [{ key, detail: `${named} must not be empty.` }];
      return [
        { key, detail: `${named} must have at least ${issue.minimum} ${issue.minimum === 1 ? 'entry' : 'entries'}.` },
      ];
    default:
      return [{ key, detail: issue.message }];
  }
}

const keyOf = (path: readonly PropertyKey[]): string =>
  path.reduce<string>((key, step) => {
    if (typeof step === 'number') return `${key}[${step}]`;
    return key === '' ? String(step) : `${key}.${String(step)}`;
  }, '');

const valueAt = (body: unknown, path: readonly PropertyKey[]): unknown =>
  path.reduce<unknown>(
    (value, step) =>
      typeof value === 'object' && value !== null ? Object.getOwnPropertyDescriptor(value, step)?.value : undefined,
    body,
  );

/** An unknown key may be as long as the body; a message names its beginning. */
const shorten = (key: string): string => (key.length > 60 ? `${key.slice(0, 60)}…` : key);

const article = (type: string): string => (/^[aeiou]/.test(type) ? `an ${type}` : `a ${type}`);
