import { expect, test } from 'vitest';
import { post } from '../../harness/http';
import { memberBattery } from '../batteries/member-call';
import { kept, newRoom, type Room } from '../batteries/room';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/identities/{key}/withdraw';
const body = { base: 1, reason: 'The sign is wrong.' };

let room: Room | undefined;

transportBattery(path, {
  body,
  asking: async () => {
    room ??= await newRoom();
    return { address: path.replace('{key}', (await kept(room)).key), headers: room.token };
  },
});

memberBattery({ method: 'post', path, scope: 'write', body, success: 200 });

test.each([`'; DROP TABLE identities; --`, '<script>alert(1)</script>', '$2 \\ %s'])(
  'the reason %j is kept as it is',
  async (reason) => {
    const room = await newRoom();
    const { key } = await kept(room);
    const answer = await post(path.replace('{key}', key), { base: 1, reason }, room.token);
    expect(answer).toMatchObject({ status: 200, type: 'application/json', body: { withdrawnReason: reason } });
  },
);
