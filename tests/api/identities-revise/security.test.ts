import { post } from '../../harness/http';
import { hostileTextBattery } from '../batteries/hostile-texts';
import { memberBattery } from '../batteries/member-call';
import { kept, newRoom, type Room, sample } from '../batteries/room';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/identities/{key}/revisions';
const body = { ...sample, base: 1 };

let room: Room | undefined;

transportBattery(path, {
  body,
  success: 201,
  asking: async () => {
    room ??= await newRoom();
    return { address: path.replace('{key}', (await kept(room)).key), headers: room.token };
  },
});

memberBattery({ method: 'post', path, scope: 'write', body, success: 201 });

hostileTextBattery(async (room, revision) => {
  const { key } = await kept(room, { name: 'Before' });
  return post(path.replace('{key}', key), { ...revision, base: 1 }, room.token);
});
