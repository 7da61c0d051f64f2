import { expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom } from '../batteries/room';

const path = '/api/v1/identities/{key}/visibility';

test('an identity is shown to anyone, and to the group alone again', async () => {
  const room = await newRoom();
  const { key, changedAt } = await kept(room);
  const show = (visibility: string) => post(path.replace('{key}', key), { visibility }, room.token);
  const visitor = async () => (await get(`/api/v1/identities/${key}`)).status;
  expect(await visitor()).toBe(404);
  const shown = await show('public');
  await expectDescribed('post', path, shown);
  expect(shown).toMatchObject({ status: 200, body: { visibility: 'public', changedAt } });
  expect(await visitor()).toBe(200);
  expect(await show('group')).toMatchObject({ status: 200, body: { visibility: 'group' } });
  expect(await visitor()).toBe(404);
});
