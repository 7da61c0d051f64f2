import { expect, test } from 'vitest';
import { contracts } from '@/lib/openapi/contracts';
import { createExamples } from '@/lib/contracts/examples/identities';
import { get, post, send } from '../../harness/http';
import { described, expectDescribed } from '../batteries/described';
import { kept, newRoom } from '../batteries/room';

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

const examples = contracts.flatMap((contract) => contract.examples.map((example) => ({ ...example, contract })));

test.each(examples)(
  'the example “$summary” is answered as it is described',
  async ({ contract, request, query, answer }) => {
    const { method, path: call, success = 200 } = contract;
    const room = await newRoom();
    // The identity that an example is about is the one that the first example keeps.
    const needed = call.includes('{key}') || (call.startsWith('/api/v1/identities') && method === 'GET');
    const { key } = needed
      ? await kept(room, { hypotheses: [], ...(createExamples[0]?.request as object) })
      : { key: '' };
    const address = `${call.replace('{key}', key)}?${new URLSearchParams(query).toString()}`;
    const real = method === 'GET' ? await get(address, room.token) : await post(address, request, room.token);
    expect(real.status).toBe(success);
    await expectDescribed(method === 'GET' ? 'get' : 'post', call, real);
    expect(shapeOf(real.body)).toEqual(shapeOf(answer));
  },
);

/** The keys of an answer. What stands at them, and how many entries a list has, differs from run to run. */
const shapeOf = (value: unknown): unknown => {
  if (Array.isArray(value)) return value.slice(0, 1).map(shapeOf);
  if (typeof value !== 'object' || value === null) return typeof value;
  return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, shapeOf(inner)]));
};
