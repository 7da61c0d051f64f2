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

test.each(['%zz', '%ff', '%ED%A0%80', '%'])('nothing is at an address that cannot be decoded: %j', async (part) => {
  for (const path of [`/api/v1/${part}`, `/api/v1/identities/${part}`, `/api/auth/${part}`])
    expect(await get(path)).toMatchObject({ status: 404, type: 'application/problem+json' });
  for (const path of ['/identities/', '/invitation/', '/reset/', '/bench/', '/'])
    expect(await get(path + part)).toMatchObject({
      status: path === '/invitation/' || path === '/reset/' ? 200 : 404,
      type: 'text/html',
    });
});

test('the address is given back as JSON only', async () => {
  const answer = await get('/api/v1/%3Cscript%3Ealert(1)%3C/script%3E');
  expect(answer).toMatchObject({ status: 404, type: 'application/problem+json' });
  expect(answer.text).not.toContain('<script>');
});
