import { memberBattery } from '../batteries/member-call';
import { kept, newRoom, type Room } from '../batteries/room';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/identities/{key}/visibility';
const body = { visibility: 'public' };

let room: Room | undefined;

transportBattery(path, {
  body,
  asking: async () => {
    room ??= await newRoom();
    return { address: path.replace('{key}', (await kept(room)).key), headers: room.token };
  },
});

// What is public by now is still not to be changed, nor found, by a stranger who would change it.
memberBattery({ method: 'post', path, scope: 'write', body, success: 200 });
