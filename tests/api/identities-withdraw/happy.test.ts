import { expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom, sample } from '../batteries/room';

const path = '/api/v1/identities/{key}/withdraw';

test('an identity is withdrawn, stays in the register with its reason, and a revision brings it back', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  const answer = await post(path.replace('{key}', key), { base: 1, reason: 'The sign\nis wrong.' }, room.token);
  expect(answer.status).toBe(200);
  await expectDescribed('post', path, answer);
  const withdrawn = { key, state: 'withdrawn', withdrawnReason: 'The sign\nis wrong.', current: 1 };
  expect(answer.body).toMatchObject(withdrawn);
  expect((await get(`/api/v1/identities?words=withdrawn`, room.token)).body).toMatchObject({
    identities: [{ key, state: 'withdrawn' }],
    states: { withdrawn: 1 },
  });
  const revised = await post(`/api/v1/identities/${key}/revisions`, { ...sample, base: 1 }, room.token);
  expect(revised.body).toMatchObject({ state: 'checked', current: 2 });
  expect(revised.body).not.toHaveProperty('withdrawnReason');
});
