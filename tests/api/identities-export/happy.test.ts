import { beforeAll, expect, test } from 'vitest';
import { get } from '../../harness/http';
import { newMember, tokenOf } from '../../harness/people';
import { expectDescribed } from '../batteries/described';
import { kept, newRoom, type Room } from '../batteries/room';

const path = '/api/v1/identities/export';
let room: Room;

beforeAll(async () => {
  room = await newRoom();
  await kept(room, { name: 'Square & more', tags: ['x'] });
  await kept(room, { name: 'Six', field: 'Q', statement: '[6] = [2] + [3]', hypotheses: [], warning: true });
});

const written = (query: string) => get(`${path}?${query}`, room.token);

test('JSON, by default', async () => {
  const answer = await get(path, room.token);
  expect(answer).toMatchObject({ status: 200, type: 'application/json' });
  await expectDescribed('get', path, answer);
  expect(answer.body).toMatchObject({ identities: [{ number: 1 }, { number: 2 }] });
  expect(answer.headers.get('content-disposition')).toBe(`attachment; filename="${room.group.slug}-register.json"`);
});

test('CSV', async () => {
  const answer = await written('format=csv&state=checked');
  expect(answer).toMatchObject({ status: 200, type: 'text/csv' });
  expect(answer.text.split('\r\n')).toHaveLength(4);
  expect(answer.headers.get('content-disposition')).toContain('.csv"');
});

test('TeX and BibTeX', async () => {
  const tex = await written('format=tex&tag=x');
  expect(tex).toMatchObject({ status: 200, type: 'application/x-tex' });
  expect(tex.text).toContain('\\paragraph{Square \\& more.}');
  expect(tex.text).not.toContain('Six');
  const bibtex = await written('format=bibtex&words=six');
  expect(bibtex).toMatchObject({ status: 200, type: 'application/x-bibtex' });
  expect(bibtex.text).toMatch(new RegExp(`^@misc\\{${room.group.slug}-2-1,\n  author = \\{Renk, Tobias\\},`));
});

test('an empty register is an empty file of its kind, and a reader may have it', async () => {
  const reader = await tokenOf(await newMember(room.group, 'reader'), ['read']);
  const empty = (format: string) => get(`${path}?format=${format}&words=nowhere`, reader);
  expect((await empty('json')).body).toEqual({ identities: [] });
  expect((await empty('csv')).text).toMatch(/^key,number,[^\n]*\r\n$/);
  expect((await empty('bibtex')).text).toBe('');
});
