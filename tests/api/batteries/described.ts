import { expect } from 'vitest';
import { z } from 'zod';
import { type Answer, get } from '../../harness/http';

type Json = Record<string, unknown>;

let document: Promise<Json> | undefined;

/** The OpenAPI document of the server under test. */
export const described = (): Promise<Json> =>
  (document ??= get('/api/v1/openapi.json').then(({ body }) => body as Json));

/** Follows a path of keys through JSON. */
export const dig = (value: unknown, ...keys: readonly string[]): unknown =>
  keys.reduce<unknown>((inner, key) => (inner as Json | undefined)?.[key], value);

/** Holds a real answer against what the OpenAPI document says about its path, method, status and media type. */
export async function expectDescribed(method: 'get' | 'post', path: string, answer: Answer): Promise<void> {
  const api = await described();
  const response = dig(api, 'paths', path, method, 'responses', String(answer.status));
  expect(response, `${answer.status} of ${path} is described`).toBeDefined();
  const schema = dig(response, 'content', answer.type, 'schema');
  expect(schema, `${answer.type} of ${path} is described`).toBeDefined();
  expectSchema(api, schema as Json, answer.body);
}

/** Holds a value against a schema of the document. */
export function expectSchema(api: Json, schema: Json, value: unknown): void {
  const whole = { ...schema, $defs: dig(api, 'components', 'schemas') };
  const local = JSON.parse(JSON.stringify(whole).replaceAll('#/components/schemas/', '#/$defs/')) as Json;
  const result = z.fromJSONSchema(local).safeParse(value);
  expect(result.error?.issues ?? []).toEqual([]);
}

/**
 * Checks that an answer is a problem document with this status and code that the OpenAPI document describes. The path is the
 * one of the document, with braces.
 */
export async function expectProblem(
  path: string,
  answer: Answer,
  status: number,
  code: string,
  more: Json = {},
  method: 'get' | 'post' = 'post',
): Promise<void> {
  expect(answer).toMatchObject({ status, type: 'application/problem+json' });
  expect(answer.body).toMatchObject({ status, code, type: `/help#error-${code}`, ...more });
  expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
  await expectDescribed(method, path, answer);
}
