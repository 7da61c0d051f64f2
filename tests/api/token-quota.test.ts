import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Answer, get, post } from '../harness/http';
import { newGroup, newMember, tokenOf } from '../harness/people';
import { type RunningServer, startServer } from '../harness/server';
import { expectProblem } from './batteries/described';

const short = { field: 'Q', left: '[2]', right: '[2]' };

let server: RunningServer;
const compare = (headers: Readonly<Record<string, string>> = {}): Promise<Answer> =>
  post(`${server.url}/api/v1/compare`, short, headers);

async function newToken(): Promise<{ readonly authorization: string }> {
  const url = server.databaseUrl;
  return tokenOf(await newMember(await newGroup(url), 'reader', { url }), ['compute'], { url });
}

beforeAll(async () => {
  server = await startServer({ COMPUTE_QUOTA_PER_MINUTE: '3', TOKEN_QUOTA_PER_MINUTE: '5' });
});
afterAll(() => server.stop());

test('a token has a quota of its own, apart from that of the address and of every other token', async () => {
  const token = await newToken();
  for (const left of ['4', '3', '2', '1', '0']) {
    const answer = await compare(token);
    expect(answer.status).toBe(200);
    expect(answer.headers.get('ratelimit-limit')).toBe('5');
    expect(answer.headers.get('ratelimit-remaining')).toBe(left);
    expect(Number(answer.headers.get('ratelimit-reset'))).toBeGreaterThan(0);
  }
  const refused = await compare(token);
  await expectProblem('/api/v1/compare', refused, 429, 'quota');
  expect(refused.headers.get('ratelimit-remaining')).toBe('0');
  expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
  expect((refused.body as { detail: string }).detail).toContain('from this token');

  const other = await compare(await newToken());
  expect(other.headers.get('ratelimit-remaining')).toBe('4');
  const nobody = await compare();
  expect(nobody.headers.get('ratelimit-limit')).toBe('3');
  expect(nobody.headers.get('ratelimit-remaining')).toBe('2');
});

test('a token that does not hold is refused before it is counted, and never falls back to the address', async () => {
  const before = await compare();
  for (let times = 0; times < 4; times += 1)
    expect((await compare({ authorization: `Bearer qdl_${'A'.repeat(43)}` })).status).toBe(401);
  const after = await compare();
  expect([before, after].map(({ headers }) => headers.get('ratelimit-remaining'))).toEqual(['1', '0']);
});

test('asking about the token itself is not counted', async () => {
  const token = await newToken();
  for (let times = 0; times < 8; times += 1) expect((await get(`${server.url}/api/v1/token`, token)).status).toBe(200);
  expect((await compare(token)).headers.get('ratelimit-remaining')).toBe('4');
});
