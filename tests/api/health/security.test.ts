import { expect, test } from 'vitest';
import { get, send } from '../../harness/http';

const path = '/api/v1/health';

test.each(['POST', 'PUT', 'PATCH', 'DELETE'])('%s is told to use GET', async (method) => {
  const answer = await send(path, { method });
  expect(answer).toMatchObject({ status: 405, type: 'application/problem+json', body: { code: 'method' } });
  expect(answer.headers.get('allow')).toBe('GET, HEAD, OPTIONS');
});

test('it says nothing of where things are', async () => {
  const { text, headers } = await get(path);
  expect(text).not.toMatch(/postgres|127\.0\.0\.1|\/home|\/root|node_modules/);
  expect(headers.get('x-powered-by')).toBeNull();
  expect(headers.get('server')).toBeNull();
});
