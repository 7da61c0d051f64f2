import { expect, test } from 'vitest';
import { get, send } from '../harness/http';

test.each([
  '/api/v1',
  '/api/v1/nothing',
  '/api/v1/normalize/more',
  '/api/v1/forms',
  '/api/v1/certificates/check',
  '/api/v1/compare%2Fmany',
])('nothing answers at %s', async (path) => {
  for (const method of ['GET', 'POST', 'PUT', 'DELETE']) {
    const answer = await send(path, { method });
    expect(answer).toMatchObject({ status: 404, type: 'application/problem+json', body: { code: 'not-found' } });
  }
});

test('the address is given back as JSON only', async () => {
  const answer = await get('/api/v1/%3Cscript%3Ealert(1)%3C/script%3E');
  expect(answer).toMatchObject({ status: 404, type: 'application/problem+json' });
  expect(answer.text).not.toContain('<script>');
});
