import { expect, test } from 'vitest';
import { contracts } from '@/lib/openapi/contracts';
import { get, post, send } from '../../harness/http';
import { described, expectDescribed } from '../batteries/described';

const path = '/api/v1/openapi.json';

test('the document is served, and describes itself too', async () => {
  const answer = await get(path);
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('get', path, answer);
  expect(await described()).toMatchObject({ openapi: '3.1.0' });
});

test('another method is refused', async () => {
  expect(await send(path, { method: 'DELETE' })).toMatchObject({ status: 405, type: 'application/problem+json' });
});

const examples = contracts.flatMap((contract) =>
  contract.request === undefined ? [] : contract.examples.map((example) => ({ ...example, path: contract.path })),
);

test.each(examples)('the example “$summary” is answered as it is described', async ({ path: call, request }) => {
  const real = await post(call, request);
  expect(real.status).toBe(200);
  await expectDescribed('post', call, real);
});
