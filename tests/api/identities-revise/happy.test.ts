import { expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { newMember, tokenOf } from '../../harness/people';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom, sample } from '../batteries/room';

const path = '/api/v1/identities/{key}/revisions';

test('a revision is made, checked, and signed by whoever made it', async () => {
  const room = await newRoom();
  const { key, createdAt } = await kept(room, { tags: ['old'] });
  const reviewer = await newMember(room.group, 'reviewer', { name: 'Maren Iwuji' });
  const revision = { ...sample, base: 1, change: 'Another name.', name: 'Renamed', statement: '[a]^2 = [-1][a]' };
  const answer = await post(path.replace('{key}', key), revision, await tokenOf(reviewer));
  expect(answer.status).toBe(201);
  await expectDescribed('post', path, answer);
  expect(answer.body).toMatchObject({
    key,
    revision: 2,
    current: 2,
    name: 'Renamed',
    tags: [],
    state: 'checked',
    keeper: 'Tobias Renk',
    createdAt,
    revisions: [
      { number: 2, author: 'Maren Iwuji', change: 'Another name.' },
      { number: 1, author: 'Tobias Renk', tags: ['old'] },
    ],
    checks: [{ revision: 2 }, { revision: 1 }],
  });
  // The register finds the new words and no longer the old ones.
  const found = async (words: string) =>
    ((await get(`/api/v1/identities?words=${words}`, room.token)).body as { total: number }).total;
  expect([await found('renamed'), await found('square'), await found('old')]).toEqual([1, 0, 0]);
});

test('what it is shown to does not change with a revision', async () => {
  const room = await newRoom();
  const { key } = await kept(room, { visibility: 'public' });
  const answer = await post(path.replace('{key}', key), { ...sample, base: 1 }, room.token);
  expect(answer.body).toMatchObject({ visibility: 'public', current: 2 });
});
