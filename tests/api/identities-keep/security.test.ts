import { beforeAll, expect, test } from 'vitest';
import { get, post } from '../../harness/http';
import { newMember, tokenOf } from '../../harness/people';
import { hostileTextBattery } from '../batteries/hostile-texts';
import { memberBattery } from '../batteries/member-call';
import { newRoom, type Room, sample } from '../batteries/room';
import { transportBattery } from '../batteries/transport';

const path = '/api/v1/identities';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
});

transportBattery(path, {
  body: sample,
  asking: () => Promise.resolve({ address: path, headers: room.token }),
  success: 201,
  readable: true,
});

memberBattery({ method: 'post', path, scope: 'write', body: sample, success: 201 });

hostileTextBattery(({ token }, body) => post(path, body, token));

test('an Idempotency-Key of someone else, in this group or another, is nobody’s business', async () => {
  const headers = { 'idempotency-key': 'shared' };
  const first = await post(path, sample, { ...room.token, ...headers });
  const colleague = await tokenOf(await newMember(room.group, 'author'));
  const stranger = await newRoom();
  const theirs = await post(path, { ...sample, name: 'Theirs' }, { ...colleague, ...headers });
  const elsewhere = await post(path, { ...sample, name: 'Elsewhere' }, { ...stranger.token, ...headers });
  expect([first.status, theirs.status, elsewhere.status]).toEqual([201, 201, 201]);
  expect((await get(path, stranger.token)).body).toMatchObject({ total: 1, identities: [{ name: 'Elsewhere' }] });
});

test('the key of an identity that is named in a text opens nothing', async () => {
  const other = await newRoom();
  const answer = await post(path, { ...sample, name: `${room.group.slug}-1` }, other.token);
  expect(answer.body).toMatchObject({ key: `${other.group.slug}-1` });
});
