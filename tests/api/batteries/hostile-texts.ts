import { expect, test } from 'vitest';
import type { post } from '../../harness/http';
import { get } from '../../harness/http';
import { query, serverDatabase } from '../../harness/people';
import { newRoom, type Room, sample } from './room';

const hostile = [
  `'; DROP TABLE identities; --`,
  `$1 \${x} {{7*7}} %s \\`,
  '<script>alert(1)</script><img src=x onerror=alert(1)>',
  '"><svg onload=alert(1)>&amp;&#0;',
  '=HYPERLINK("https://elsewhere.example")',
  'İstanbul ﷺ 𝔽₇ 🧱 ' + 'é́'.repeat(8),
];

const texts = ['name', 'reference', 'remark'] as const;

/**
 * Texts that are meant for a database, a page or a spreadsheet come back as they were sent; what is no text is refused.
 * `send` sends a whole body to the call and returns its answer.
 */
export function hostileTextBattery(send: (room: Room, body: Record<string, unknown>) => ReturnType<typeof post>): void {
  test.each(hostile)('the text %j is kept as it is, and does nothing', async (text) => {
    const room = await newRoom();
    const given = Object.fromEntries(texts.map((key) => [key, text]));
    const answer = await send(room, { ...sample, ...given });
    expect(answer).toMatchObject({ status: 201, type: 'application/json' });
    expect(answer.body).toMatchObject(given);
    const { key } = answer.body as { key: string };
    expect((await get(`/api/v1/identities/${key}`, room.token)).body).toMatchObject(given);
    const found = await get(`/api/v1/identities?${new URLSearchParams({ words: text }).toString()}`, room.token);
    expect(found.body).toMatchObject({ total: 1 });
    const [row] = await query(serverDatabase(), `SELECT to_regclass('identities') IS NOT NULL AS there`);
    expect(row).toEqual({ there: true });
  });

  test.each(hostile)('the text %j is no field, no statement, no hypothesis, no place, no tag', async (text) => {
    const room = await newRoom();
    const changes: readonly Record<string, unknown>[] = [
      { field: text },
      { statement: text },
      { statement: `[a] = [a] ; ${text}` },
      { hypotheses: [text] },
      { tags: [text] },
      { doi: text },
      { arxiv: text },
      { visibility: text },
      { kind: text },
      { kind: 'residue', hypotheses: [], statement: '[7]', field: 'Q', place: text, value: '1' },
      { kind: 'residue', hypotheses: [], statement: '[7]', field: 'Q', place: '7', uniformizer: text, value: '1' },
      { kind: 'residue', hypotheses: [], statement: '[7]', field: 'Q', place: '7', value: text },
    ];
    for (const change of changes) {
      const answer = await send(room, { ...sample, ...change });
      expect(answer, JSON.stringify(change)).toMatchObject({ status: 422, type: 'application/problem+json' });
    }
    expect((await get('/api/v1/identities', room.token)).body).toMatchObject({
      identities: expect.not.arrayContaining([expect.objectContaining({ name: text })]) as unknown,
    });
  });

  test.each([
    ['a NUL', 'a\0b'],
    ['half a character', 'a\ud800b'],
    ['an escape', 'a\u001bb'],
    ['a turn of direction', 'a\u202eb'],
    ['nothing', '  '],
  ])('%s in any text is refused', async (_, text) => {
    const room = await newRoom();
    for (const key of ['name', 'field', 'statement', 'reference', 'remark', 'doi', 'arxiv', 'place'])
      expect(await send(room, { ...sample, [key]: text }), key).toMatchObject({ status: 422 });
    for (const key of ['hypotheses', 'tags'])
      expect(await send(room, { ...sample, [key]: [text] }), key).toMatchObject({ status: 422 });
  });

  test('a text that is too long, and a list that is, are refused with how much is allowed', async () => {
    const room = await newRoom();
    const long: readonly [string, unknown, string][] = [
      ['name', 'x'.repeat(121), 'may have at most 120 characters'],
      ['reference', 'x'.repeat(501), 'may have at most 500 characters'],
      ['remark', 'x'.repeat(4001), 'may have at most 4000 characters'],
      ['statement', `[a] = ${'[a]+'.repeat(6000)}0`, 'may have at most 20000 characters'],
      ['tags', Array.from({ length: 13 }, (_, index) => `tag-${index}`), 'may have at most 12 entries'],
      ['hypotheses', Array.from({ length: 51 }, () => 'a != 1'), 'may have at most 50 entries'],
    ];
    for (const [key, value, detail] of long) {
      const { status, body } = await send(room, { ...sample, [key]: value });
      expect({ status, body }).toMatchObject({ status: 422, body: { code: 'invalid', part: key } });
      expect((body as { detail: string }).detail).toContain(detail);
    }
  });

  test('what is for the service to say cannot be said by a caller', async () => {
    const room = await newRoom();
    const forbidden = {
      id: '00000000-0000-4000-8000-000000000000',
      groupId: room.group.id,
      group_id: room.group.id,
      group: { slug: 'skerry' },
      number: 1,
      revision: 9,
      state: 'checked',
      verdict: 'equal',
      keeper: 'Odile Farrant',
      keeperId: room.author.person.id,
      author: 'Odile Farrant',
      createdAt: '2020-01-01T00:00:00Z',
      words: 'x',
      typeset: {},
      lastCheck: {},
      withdrawnReason: 'x',
    };
    for (const [key, value] of Object.entries(forbidden)) {
      const answer = await send(room, { ...sample, [key]: value });
      expect(answer, key).toMatchObject({
        status: 422,
        body: { code: 'invalid', errors: [{ key, detail: `There is no key “${key}” here.` }] },
      });
    }
  });
}
