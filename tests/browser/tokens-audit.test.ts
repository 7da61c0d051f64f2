import type { Page } from 'playwright-core';
import { beforeEach, describe, expect, test } from 'vitest';
import type { Member } from '@/lib/people/caller';
import { errorsOf, findings, openPage } from '../harness/browser';
import { get, post } from '../harness/http';
import { newGroup, query, serverDatabase, type TestGroup, tokenOf } from '../harness/people';
import { forgetAttempts, newAccount, sessionOf } from '../harness/sign-in';
import { pageOf } from './register-page';

let group: TestGroup;
let author: Member;
let steward: Member;

beforeEach(async () => {
  await forgetAttempts('sign-in-address');
  group = await newGroup();
  author = await newAccount(group, 'author', 'Tobias Renk');
  steward = await newAccount(group, 'steward', 'Odile Farrant');
});

const formOf = (page: Page) => ({
  name: page.getByLabel('Name', { exact: true }),
  days: page.getByLabel('Days it holds'),
  scope: (name: string) => page.getByRole('checkbox', { name: new RegExp(`^${name}`) }),
  make: page.getByRole('button', { name: 'Make the token' }),
  secret: page.locator('.secret'),
});

const rowOf = (page: Page, token: string) => page.getByRole('row').filter({ hasText: token });

/** Makes a token by the page and returns it, as it is shown there once. */
async function make(page: Page, name: string): Promise<string> {
  const form = formOf(page);
  await form.name.fill(name);
  await form.make.click();
  await page.getByText(`The token “${name}” is made.`).waitFor();
  return form.secret.innerText();
}

describe('tokens', () => {
  test('one is made, shown once, used within its scopes, seen in use, and revoked at once', async () => {
    const page = await pageOf(author, '/account/tokens');
    await page.getByText('No token is made yet.').waitFor();
    const secret = await make(page, 'night run');
    expect(secret).toMatch(/^qdl_[\w-]{43}$/);
    await page.getByRole('button', { name: 'Copy' }).click();
    await page.getByRole('button', { name: 'Copied' }).waitFor();
    expect(await page.evaluate(() => navigator.clipboard.readText())).toBe(secret);
    // The form is ready for another one.
    expect(await formOf(page).name.inputValue()).toBe('');
    expect(await rowOf(page, 'night run').innerText()).toMatch(/read, compute[\s\S]*never[\s\S]*Works/);

    const headers = { authorization: `Bearer ${secret}` };
    expect((await post('/api/v1/compare', { field: 'Q', statement: '[6] = [6]' }, headers)).status).toBe(200);
    expect((await get('/api/v1/token', headers)).body).toMatchObject({
      name: 'night run',
      scopes: ['read', 'compute'],
    });
    const identity = { name: 'Six', field: 'Q', statement: '[6] = [6]' };
    expect((await post('/api/v1/identities', identity, headers)).body).toMatchObject({ code: 'forbidden' });

    await page.reload();
    expect(await page.content()).not.toContain(secret);
    expect(await rowOf(page, 'night run').innerText()).not.toContain('never');
    await page.getByRole('button', { name: 'Revoke night run' }).click();
    const leaf = page.getByRole('dialog', { name: 'Revoke “night run”?' });
    await leaf.getByRole('button', { name: 'Leave it' }).click();
    expect((await get('/api/v1/token', headers)).status).toBe(200);
    await page.getByRole('button', { name: 'Revoke night run' }).click();
    await leaf.getByRole('button', { name: 'Revoke' }).click();
    await rowOf(page, 'night run').getByText('Revoked').waitFor();
    expect(await page.getByRole('button', { name: 'Revoke night run' }).count()).toBe(0);
    expect((await get('/api/v1/token', headers)).status).toBe(401);
    expect(errorsOf(page)).toEqual([]);
  });

  test('the keyboard is enough, and the focus is where one goes on', async () => {
    const page = await pageOf(author, '/account/tokens');
    await formOf(page).name.focus();
    await page.keyboard.type('by hand');
    await page.keyboard.press('Enter');
    await page.getByText('The token “by hand” is made.').waitFor();
    await expect.poll(() => page.evaluate(() => document.activeElement?.textContent)).toBe('Copy');
    await page.keyboard.press('Tab');
    await page.keyboard.press('Enter');
    await expect.poll(() => formOf(page).secret.count()).toBe(0);
  });

  test('what has to change is said at its place, and nothing typed is lost', async () => {
    const page = await pageOf(author, '/account/tokens');
    const form = formOf(page);
    await form.name.fill('night run');
    await form.days.fill('400');
    await form.scope('write').check();
    await form.make.click();
    await page.getByText('Give a whole number of days from 1 to 366.').waitFor();
    await expect.poll(() => form.days.evaluate((field) => field === document.activeElement)).toBe(true);
    expect(await form.name.inputValue()).toBe('night run');
    expect(await form.scope('write').isChecked()).toBe(true);
    await form.days.fill('366');
    for (const scope of ['read', 'compute', 'write']) await form.scope(scope).uncheck();
    await form.make.click();
    await page.getByText('Choose at least one thing that the token may do.').waitFor();
    expect(await findings(page)).toEqual([]);
    await form.scope('write').check();
    await form.make.click();
    await form.secret.waitFor();
    expect(await rowOf(page, 'night run').innerText()).toContain('write');
  });

  test('a reader is not offered to write', async () => {
    const page = await pageOf(await newAccount(group, 'reader'), '/account/tokens');
    expect(await page.getByRole('checkbox').count()).toBe(2);
    expect(await formOf(page).scope('write').count()).toBe(0);
  });

  test('a page of one group does not make a token for another', async () => {
    const page = await pageOf(author, '/account/tokens');
    const other = await newGroup();
    await query(serverDatabase(), `INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, 'author')`, [
      other.id,
      author.person.id,
    ]);
    await page.context().addCookies([{ name: 'quadrel-group', value: other.slug, url: page.url() }]);
    await formOf(page).name.fill('night run');
    await formOf(page).make.click();
    await page.getByText('This was not done').waitFor();
    expect(await query(serverDatabase(), 'SELECT 1 FROM api_tokens WHERE user_id = $1', [author.person.id])).toEqual(
      [],
    );
    expect(await formOf(page).name.inputValue()).toBe('night run');
  });

  test('a steward sees and ends the tokens of the group, and nobody else finds that page', async () => {
    const token = await tokenOf(author);
    const page = await pageOf(steward, '/group/tokens');
    expect(await rowOf(page, 'night run').innerText()).toContain('Tobias Renk');
    await page.getByRole('button', { name: 'Revoke night run' }).click();
    await page.getByRole('dialog').getByText('of Tobias Renk').waitFor();
    expect(await findings(page)).toEqual([]);
    await page.getByRole('dialog').getByRole('button', { name: 'Revoke' }).click();
    await rowOf(page, 'night run').getByText('Revoked').waitFor();
    expect((await get('/api/v1/token', token)).status).toBe(401);
    const refused = await pageOf(author, '/group/tokens');
    await refused.getByRole('heading', { name: 'There is nothing here that you can see.' }).waitFor();
  });

  test('whoever is not signed in is sent to the door and comes back', async () => {
    const page = await openPage('/account/tokens');
    expect(new URL(page.url()).pathname).toBe('/sign-in');
    expect(new URL(page.url()).searchParams.get('next')).toBe('/account/tokens');
  });
});

describe('the audit trail', () => {
  /** Puts so many deeds into the trail, and one that markup and formulas try to get out of. */
  const fill = (count: number) =>
    query(
      serverDatabase(),
      `INSERT INTO audit_events (group_id, actor_id, actor_name, action, subject, detail, at)
       SELECT $1, $2, CASE WHEN n = 1 THEN '=1+1' ELSE 'Tobias Renk' END,
              CASE WHEN n % 2 = 0 THEN 'identity-revised' ELSE 'identity-kept' END,
              CASE WHEN n = 2 THEN '<script>alert(1)</script>' ELSE 'skerry-' || n END, '{"revision": 2}',
              '2026-10-01T08:00:00Z'::timestamptz + n * interval '1 hour'
         FROM generate_series(1, $3::int) n`,
      [group.id, author.person.id, count],
    );

  test('a steward reads what was done, page by page, and narrows it down', async () => {
    await fill(60);
    await make(await pageOf(author, '/account/tokens'), 'night run');
    const page = await pageOf(steward, '/group/audit');
    const rows = page.locator('tbody tr');
    expect(await rows.count()).toBe(50);
    expect(await rows.first().innerText()).toMatch(
      /Tobias Renk\s+made the token night run\s+may read, compute · for 90 days/,
    );
    await page.getByRole('link', { name: 'Older' }).click();
    await expect.poll(() => rows.count()).toBe(11);
    expect(await rows.last().innerText()).toContain('=1+1');
    await page.getByRole('link', { name: 'Newer' }).click();
    await expect.poll(() => rows.count()).toBe(50);

    await page.getByLabel('Person', { exact: true }).selectOption('Tobias Renk');
    await page.getByLabel('Deed', { exact: true }).selectOption('revised');
    await page.getByLabel('From', { exact: true }).fill('2026-10-02');
    await page.getByLabel('To, that day included').fill('2026-10-02');
    await page.getByLabel('Words in the subject').fill('skerry');
    await page.getByRole('button', { name: 'Look' }).click();
    await page.waitForURL('**action=identity-revised**');
    // 2 October begins 16 hours after the first deed, and half of its 24 deeds are revisions.
    expect(await rows.count()).toBe(12);
    expect(await page.getByLabel('From', { exact: true }).inputValue()).toBe('2026-10-02');
    expect(await findings(page)).toEqual([]);
    await page.getByLabel('Words in the subject').fill('nothing of that name');
    await page.keyboard.press('Enter');
    await page.getByText('Nothing like that was done.').waitFor();
    await page.getByRole('link', { name: 'See everything' }).click();
    await expect.poll(() => rows.count()).toBe(50);
    expect(errorsOf(page)).toEqual([]);
  });

  test('it is written out whole, as the filter leaves it, and no cell is a formula', async () => {
    await fill(1203);
    const cookie = await sessionOf(steward.person.email);
    const page = await pageOf(steward, '/group/audit');
    const links = await page
      .getByRole('link', { name: /^(CSV|JSON)$/ })
      .evaluateAll((all) => all.map((link) => link.getAttribute('href') ?? ''));
    const [csv, json] = await Promise.all(links.map((link) => get(link, { cookie })));
    expect(csv).toMatchObject({ status: 200, type: 'text/csv' });
    expect(csv?.headers.get('content-disposition')).toBe(`attachment; filename="audit-${group.slug}.csv"`);
    expect(csv?.headers.get('cache-control')).toBe('no-store');
    const lines = csv?.text.trimEnd().split('\r\n') ?? [];
    expect(lines).toHaveLength(1204);
    expect(lines[0]).toBe('at,who,action,subject,detail');
    expect(lines.at(-1)).toBe(`2026-10-01T09:00:00.000Z,'=1+1,identity-kept,skerry-1,"{""revision"":2}"`);
    expect(json?.body).toHaveLength(1203);
    expect(json?.body).toMatchObject({ 0: { subject: 'skerry-1203', who: 'Tobias Renk', detail: { revision: 2 } } });
    const one = await get('/group/audit/export?format=json&words=skerry-77&to=2026-10-05', { cookie });
    expect(one.body).toMatchObject([{ subject: 'skerry-77' }]);
    expect((await get('/group/audit/export?format=json&words=none', { cookie })).body).toEqual([]);
  });

  test('to everyone but stewards of the group it is not there', async () => {
    await fill(3);
    for (const member of [
      author,
      await newAccount(group, 'reviewer'),
      await newAccount(group, 'reader'),
      await newAccount(await newGroup(), 'steward'),
    ]) {
      const page = await pageOf(member, '/group/audit');
      expect(await page.getByText('skerry-1', { exact: true }).count(), member.group.role).toBe(0);
      const cookie = await sessionOf(member.person.email);
      const file = await get('/group/audit/export?format=json', { cookie });
      if (member.group.id === group.id) expect(file).toMatchObject({ status: 404, type: 'text/plain' });
      else expect(file.body).toEqual([]);
    }
    expect((await get('/group/audit/export?format=csv')).status).toBe(404);
    const token = await tokenOf(steward);
    expect((await get('/group/audit/export?format=csv', token)).status).toBe(404);
    const cookie = await sessionOf(steward.person.email);
    expect((await get('/group/audit/export?format=xml', { cookie })).status).toBe(404);
  });
});

describe('how the pages look', () => {
  const sights = [
    { width: 1440, dark: false },
    { width: 390, dark: true },
    { width: 320, dark: false },
  ];
  const cases = ['/account/tokens', '/group/tokens', '/group/audit'].flatMap((path) =>
    sights.map((sight) => ({ path, ...sight })),
  );

  test.each(cases)('$path at $width pixels, dark: $dark', async ({ path, width, dark }) => {
    await tokenOf(steward);
    await tokenOf(author, ['read'], { revoked: true });
    await query(
      serverDatabase(),
      `INSERT INTO audit_events (group_id, actor_name, action, subject, detail)
       VALUES ($1, 'Odile Farrant', 'member-invited', $2, '{"role": "author"}')`,
      [group.id, `${'a'.repeat(60)}@skerry.example`],
    );
    const page = await pageOf(steward, path, { width, height: 844, dark });
    expect(await findings(page)).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth - innerWidth)).toBe(0);
    expect(errorsOf(page)).toEqual([]);
  });
});
