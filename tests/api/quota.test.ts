import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Answer, post } from '../harness/http';
import { type RunningServer, startServer } from '../harness/server';
import { expectProblem } from './batteries/described';

const short = { field: 'Q', left: '[2]', right: '[2]' };
let server: RunningServer;
const compare = (headers: Record<string, string> = {}): Promise<Answer> =>
  post(`${server.url}/api/v1/compare`, short, headers);
const many = (length: number): Promise<Answer> =>
  post(`${server.url}/api/v1/compare/many`, { compares: Array.from({ length }, () => short) });

beforeAll(async () => {
  server = await startServer({ COMPUTE_QUOTA_PER_MINUTE: '10' });
});
afterAll(() => server.stop());

test('an address is served up to its quota and then told when to come back', async () => {
  const first = await compare();
  expect(first.status).toBe(200);
  expect(first.headers.get('ratelimit-limit')).toBe('10');
  expect(first.headers.get('ratelimit-remaining')).toBe('9');
  expect(Number(first.headers.get('ratelimit-reset'))).toBeGreaterThan(0);

  // Many at once count one by one; more than a whole quota can never be served.
  expect((await many(11)).status).toBe(429);
  const five = await many(5);
  expect(five.status).toBe(200);
  expect(five.headers.get('ratelimit-remaining')).toBe('4');

  // A body of the wrong shape costs nothing.
  expect((await post(`${server.url}/api/v1/compare`, {})).status).toBe(422);
  for (const left of ['3', '2', '1', '0']) {
    // A client cannot become another by what it writes into a header.
    const answer = await compare({ 'x-forwarded-for': `203.0.113.${left}` });
    expect(answer.status).toBe(200);
    expect(answer.headers.get('ratelimit-remaining')).toBe(left);
  }
  for (const header of ['x-forwarded-for', 'x-real-ip', 'forwarded']) {
    const refused = await compare({ [header]: '203.0.113.9' });
    await expectProblem('/api/v1/compare', refused, 429, 'quota');
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect(refused.headers.get('ratelimit-remaining')).toBe('0');
  }
});

test('what does not compute is not counted', async () => {
  expect((await fetch(`${server.url}/api/v1/health`)).status).toBe(200);
  expect((await fetch(`${server.url}/api/v1/openapi.json`)).status).toBe(200);
});
