import { expect, test } from 'vitest';
import { get, post, send } from '../harness/http';

test.each(['csrf', 'providers', 'session'])('the sign-in asks %s and is answered', async (call) => {
  expect(await get(`/api/auth/${call}`)).toMatchObject({ status: 200, type: 'application/json' });
});

test.each(['signin', 'signout', 'error', 'verify-request', '_log', 'session/more', 'callback/credentials', 'nothing'])(
  'nothing is at /api/auth/%s for whoever opens it',
  async (call) => {
    expect(await get(`/api/auth/${call}`)).toMatchObject({ status: 404, type: 'application/problem+json' });
  },
);

test.each(['signin', 'signin/credentials', 'signout', 'session', '_log', 'callback/credentials', 'nothing'])(
  'nothing takes JSON at /api/auth/%s, be it readable or not',
  async (call) => {
    const broken = await send(`/api/auth/${call}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: '{',
    });
    for (const answer of [broken, await post(`/api/auth/${call}`, { level: 'error', code: 'x', message: 'x' })])
      expect(answer).toMatchObject({ status: 404, type: 'application/problem+json' });
  },
);
