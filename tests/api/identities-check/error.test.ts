import { test } from 'vitest';
import { post } from '../../harness/http';
import { expectProblem } from '../batteries/described';
import { newRoom } from '../batteries/room';

const path = '/api/v1/identities/{key}/check';

test('an identity that is not there cannot be checked', async () => {
  const { token, group } = await newRoom();
  for (const key of [`${group.slug}-1`, 'skerry', 'skerry-0', 'export'])
    await expectProblem(path, await post(path.replace('{key}', key), {}, token), 404, 'not-found');
});
