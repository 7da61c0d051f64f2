import { expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom } from '../batteries/room';

const path = '/api/v1/identities/{key}/check';

test('the current revision is checked again, and the check is added to the history', async () => {
  const room = await newRoom();
  const { key, changedAt } = await kept(room);
  const answer = await post(path.replace('{key}', key), {}, room.token);
  expect(answer.status).toBe(200);
  await expectDescribed('post', path, answer);
  expect(answer.body).toMatchObject({
    key,
    state: 'checked',
    changedAt,
    checks: [
      { revision: 1, verdict: 'equal' },
      { revision: 1, verdict: 'equal' },
    ],
  });
  expect((await get(`/api/v1/identities/${key}`, room.token)).body).toEqual(answer.body);
});

test('what is not decided stays a draft', async () => {
  const room = await newRoom();
  const { key } = await kept(room, { field: 'Q(s)(t)', statement: '[t][1-t] = 0', hypotheses: [] });
  const answer = await post(path.replace('{key}', key), {}, room.token);
  expect(answer).toMatchObject({ status: 200, body: { state: 'draft', lastCheck: { verdict: 'refused' } } });
});
