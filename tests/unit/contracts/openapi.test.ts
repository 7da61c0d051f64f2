import { readdirSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { problem, problemKinds, problemOf } from '@/lib/contracts/problem';
import { contracts } from '@/lib/openapi/contracts';
import { openApiDocument } from '@/lib/openapi/document';

const document = openApiDocument();
const api = path.resolve(import.meta.dirname, '../../../app/api/v1');

test('the document describes exactly the calls that have a route file', () => {
  const files = readdirSync(api, { recursive: true, withFileTypes: true }).filter((entry) => entry.name === 'route.ts');
  const served = files
    .map((file) => `/api/v1/${path.relative(api, file.parentPath)}`.replaceAll(/\[(\w+)\]/g, '{$1}'))
    // Answers 404 for everything that is not a call.
    .filter((served) => !served.includes('[[...'));
  expect(Object.keys(document.paths ?? {}).sort()).toEqual(served.sort());
});

test('it is OpenAPI 3.1 and refers only to schemas it has', () => {
  expect(document.openapi).toBe('3.1.0');
  const names = Object.keys(document.components?.schemas ?? {});
  const references = [...JSON.stringify(document).matchAll(/"\$ref":"([^"]*)"/g)].map(([, target]) => target);
  expect(references.length).toBeGreaterThan(30);
  for (const target of references) expect(names.map((name) => `#/components/schemas/${name}`)).toContain(target);
});

test('each call lists its statuses, and each of its examples fits its contract', () => {
  for (const contract of contracts) {
    const operation = document.paths?.[contract.path]?.[contract.method === 'GET' ? 'get' : 'post'];
    const statuses = Object.keys(operation?.responses ?? {});
    expect(statuses).toEqual(expect.arrayContaining([String(contract.success ?? 200), '401', '405', '500']));
    for (const code of contract.problems) expect(statuses).toContain(String(problemKinds[code].status));
    for (const { request, answer, params, query } of contract.examples) {
      contract.params?.parse(params);
      contract.query?.parse(query ?? {});
      if (contract.request !== undefined) contract.request.parse(request);
      contract.answer.parse(answer);
    }
  }
});

test('each call lists what stands in its path, its query string and its header', () => {
  for (const contract of contracts) {
    const operation = document.paths?.[contract.path]?.[contract.method === 'GET' ? 'get' : 'post'];
    const parameters = (operation?.parameters ?? []).map((one) => ('in' in one ? `${one.in} ${one.name}` : ''));
    const inBraces = [...contract.path.matchAll(/\{(\w+)\}/g)].map(([, name]) => `path ${name}`);
    expect(parameters.filter((name) => name.startsWith('path '))).toEqual(inBraces);
    expect(Object.keys(contract.params?.shape ?? {}).map((name) => `path ${name}`)).toEqual(inBraces);
    const inQuery = Object.keys(contract.query?.shape ?? {}).map((name) => `query ${name}`);
    expect(parameters.filter((name) => name.startsWith('query '))).toEqual(inQuery);
    expect(parameters.includes('header Idempotency-Key')).toBe(contract.idempotent === true);
  }
});

test('a call that members alone may make asks for a token, and says what can be wrong with it', () => {
  const list = document.paths?.['/api/v1/identities']?.get;
  expect(list?.security).toEqual([{ token: [] }]);
  expect(Object.keys(list?.responses ?? {})).toEqual(expect.arrayContaining(['200', '401', '403']));
  const compare = document.paths?.['/api/v1/compare']?.post;
  expect(compare?.security).toEqual([{}, { token: [] }]);
  const revise = document.paths?.['/api/v1/identities/{key}/revisions']?.post;
  expect(Object.keys(revise?.responses ?? {})).toEqual(expect.arrayContaining(['201', '401', '403', '404', '409']));
});

test('a key with a default may be left out of a request and is there in every answer', () => {
  const required = (name: string) => {
    const schema = document.components?.schemas?.[name];
    return schema !== undefined && 'required' in schema ? schema.required : undefined;
  };
  expect(required('IdentityContent')).toEqual(['name', 'field', 'statement']);
  expect(required('IdentitySummary')).toEqual(expect.arrayContaining(['tags', 'warning', 'visibility']));
});

test('every kind of problem makes a problem document', () => {
  for (const code of Object.keys(problemKinds) as (keyof typeof problemKinds)[]) {
    expect(problem.parse(problemOf(code, 'Why.'))).toMatchObject({ type: `/help#error-${code}`, detail: 'Why.' });
  }
});
