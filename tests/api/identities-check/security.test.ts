import { expect, test } from 'vitest';
import { send } from '../../harness/http';
import { memberBattery } from '../batteries/member-call';
import { kept, newRoom } from '../batteries/room';

const path = '/api/v1/identities/{key}/check';

memberBattery({ method: 'post', path, scope: 'write', success: 200 });

test('no body is needed and none is read', async () => {
  const room = await newRoom();
  const { key } = await kept(room);
  const address = path.replace('{key}', key);
  for (const body of [undefined, 'verdict=different', '{"verdict":"different"}'])
    expect(await send(address, { method: 'POST', headers: room.token, body })).toMatchObject({
      status: 200,
      body: { lastCheck: { verdict: 'equal' } },
    });
});
