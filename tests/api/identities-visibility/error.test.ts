import { test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { kept, newRoom } from '../batteries/room';

const path = '/api/v1/identities/{key}/visibility';

test('it is shown to the group or to anyone, and to nobody else', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  for (const visibility of [undefined, '', 'PUBLIC', 'nobody', true, null, ['public']]) {
    const answer = await post(path.replace('{key}', key), { visibility }, room.token);
    await expectProblem(path, answer, 422, 'invalid', { part: 'visibility' });
  }
});
