import { expect, test } from 'vitest';
import { get } from '../../harness/http';
import { memberBattery } from '../batteries/member-call';
import { kept, newRoom } from '../batteries/room';

const path = '/api/v1/identities/export';

memberBattery({ method: 'get', path, scope: 'read', success: 200 });

test('a file has nothing of another group, and is kept and not shown by a browser', async () => {
  const [ours, theirs] = [await newRoom(), await newRoom()];
  await kept(ours, { name: 'Ours' });
  await kept(theirs, { name: 'Theirs', visibility: 'public' });
  for (const format of ['json', 'csv', 'tex', 'bibtex']) {
    const answer = await get(`${path}?format=${format}`, ours.token);
    expect(answer.text).toContain('Ours');
    expect(answer.text).not.toContain('Theirs');
    expect(answer.headers.get('content-disposition')).toMatch(/^attachment; filename="[a-z0-9-]+\.[a-z]+"$/);
    expect(answer.headers.get('x-content-type-options')).toBe('nosniff');
    expect(answer.headers.get('content-security-policy')).toContain("default-src 'none'");
    expect(answer.headers.get('cache-control')).toBe('no-store');
  }
});

test('nothing in a text becomes a formula, a command or the end of an entry', async () => {
  const room = await newRoom();
  for (const name of ['=1+1', '+1', '-1', '@SUM(A1)', '\\input{/etc/passwd}', '}}, url = {x}', 'a"b,c'])
    await kept(room, { name, reference: name, remark: `${name}\n=2` });
  const csv = (await get(`${path}?format=csv`, room.token)).text;
  // Every cell, quoted or not, that begins as a formula does has an apostrophe first.
  expect(csv).not.toMatch(/(^|,|\r\n)"?[=+\-@]/);
  const tex = (await get(`${path}?format=tex`, room.token)).text;
  expect(tex).not.toContain('\\input');
  const bibtex = (await get(`${path}?format=bibtex`, room.token)).text;
  expect(bibtex.match(/^ {2}url {4}=/gm)).toHaveLength(7);
  let depth = 0;
  for (const sign of bibtex) {
    depth += sign === '{' ? 1 : sign === '}' ? -1 : 0;
    expect(depth).toBeGreaterThanOrEqual(0);
  }
  expect(depth).toBe(0);
});
