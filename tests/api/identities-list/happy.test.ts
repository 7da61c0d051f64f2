import { beforeAll, expect, test } from 'vitest';
import { identityList } from '@/lib/contracts/identity-query';
import { get } from '../../harness/http';
import { newMember, tokenOf } from '../../harness/people';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom, type Room } from '../batteries/room';

const path = '/api/v1/identities';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
  await kept(room, {
    name: 'Steinberg at six',
    field: 'Q',
    statement: '[5][6] = [-1][6]',
    hypotheses: [],
    tags: ['x'],
  });
  await kept(room, { name: 'Square' });
  await kept(room, { name: 'Rational functions', field: 'Q(s)(t)', statement: '[t][1-t] = 0', hypotheses: [] });
});

async function list(query = '') {
  const answer = await get(`${path}${query}`, room.token);
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('get', path, answer);
  return identityList.parse(answer.body);
}

const names = async (query: string) => (await list(query)).identities.map(({ name }) => name);

test('what was changed last comes first, with counts by state', async () => {
  const { identities, total, states, next } = await list();
  expect(identities.map(({ number }) => number)).toEqual([3, 2, 1]);
  expect({ total, states, next }).toEqual({
    total: 3,
    states: { draft: 1, checked: 2, withdrawn: 0 },
    next: undefined,
  });
});

test('filters, words and orders', async () => {
  expect(await names('?state=draft')).toEqual(['Rational functions']);
  expect(await names('?field=Q')).toEqual(['Steinberg at six']);
  expect(await names('?field=%5Cmathbb%7BQ%7D(s)(t)')).toEqual(['Rational functions']);
  expect(await names('?tag=x')).toEqual(['Steinberg at six']);
  expect(await names('?words=stein+6')).toEqual(['Steinberg at six']);
  expect(await names('?degree=2&sort=name')).toEqual(['Square', 'Steinberg at six']);
  expect(await names('?verdict=refused')).toEqual(['Rational functions']);
  expect(await names('?keeper=Tobias%20Renk&sort=-name')).toEqual(['Steinberg at six', 'Square', 'Rational functions']);
  expect(await names('?keeper=Nobody')).toEqual([]);
});

test('page after page, to the end', async () => {
  const first = await list('?sort=number&limit=2');
  expect(first.identities.map(({ number }) => number)).toEqual([1, 2]);
  const second = await list(`?sort=number&limit=2&cursor=${first.next ?? ''}`);
  expect(second.identities.map(({ number }) => number)).toEqual([3]);
  expect(second.next).toBeUndefined();
});

test('a reader reads it, and an empty register is an empty list', async () => {
  const reader = await tokenOf(await newMember(room.group, 'reader'), ['read']);
  expect((await get(path, reader)).body).toMatchObject({ total: 3 });
  const empty = await newRoom();
  expect((await get(path, empty.token)).body).toEqual({
    identities: [],
    total: 0,
    states: { draft: 0, checked: 0, withdrawn: 0 },
  });
});
