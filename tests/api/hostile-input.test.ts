import { expect, test } from 'vitest';
import { post, send } from '../harness/http';
import { expectProblem } from './batteries/described';

// Two primes of forty digits: no method here finds them within the budget.
const p = 10n ** 39n + 3n;
const q = 3n * 10n ** 39n + 37n;
const hostile = () => post('/api/v1/normalize', { field: 'Q', expression: `[${p * q}]` });
const short = () => post('/api/v1/compare', { field: 'Q', left: '[2]', right: '[2]' });

test('an entry that cannot be factored in time ends at the time limit, and the answer says which', async () => {
  const answer = await hostile();
  await expectProblem('/api/v1/normalize', answer, 503, 'budget');
  expect(answer.body).toMatchObject({ detail: expect.stringMatching(/^Stopped after two seconds while /) as unknown });
});

test('short questions are answered while long ones run', async () => {
  let stopped = 0;
  const long = Array.from({ length: 6 }, () => hostile().then(() => (stopped += 1)));
  for (let asked = 0; asked < 10; asked += 1) expect((await short()).status).toBe(200);
  expect(stopped).toBeLessThan(6);
  await Promise.all(long);
});

test('a client that goes away leaves a service that answers', async () => {
  const leaving = new AbortController();
  const gone = Array.from({ length: 8 }, () =>
    send('/api/v1/normalize', {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ field: 'Q', expression: `[${p * q}]` }),
      signal: leaving.signal,
    }),
  );
  expect((await short()).status).toBe(200);
  leaving.abort();
  expect((await Promise.allSettled(gone)).map(({ status }) => status)).toEqual(gone.map(() => 'rejected'));
  expect((await short()).status).toBe(200);
});
