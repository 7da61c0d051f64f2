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
    .map((file) => `/api/v1/${path.relative(api, file.parentPath)}`)
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
    expect(statuses).toEqual(expect.arrayContaining(['200', '405', '500']));
    for (const code of contract.problems) expect(statuses).toContain(String(problemKinds[code].status));
    for (const { request, answer } of contract.examples) {
      if (contract.request !== undefined) contract.request.parse(request);
      contract.answer.parse(answer);
    }
  }
});

test('every kind of problem makes a problem document', () => {
  for (const code of Object.keys(problemKinds) as (keyof typeof problemKinds)[]) {
    expect(problem.parse(problemOf(code, 'Why.'))).toMatchObject({ type: `/help#error-${code}`, detail: 'Why.' });
  }
});
