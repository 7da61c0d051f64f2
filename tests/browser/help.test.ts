import { expect, test } from 'vitest';
import { permissionNames } from '@/lib/contracts/permission-name';
import { problemKinds } from '@/lib/contracts/problem';
import { findings, openPage } from '../harness/browser';
import { post } from '../harness/http';

test('every kind of problem has its place, where its type leads', async () => {
  const page = await openPage('/help');
  const ids = await page.evaluate(() => [...document.querySelectorAll('[id^="error-"]')].map((place) => place.id));
  expect(ids.sort()).toEqual(
    Object.keys(problemKinds)
      .map((code) => `error-${code}`)
      .sort(),
  );
});

test('no link within the page leads nowhere, and no id is there twice', async () => {
  const page = await openPage('/help');
  const { lost, twice } = await page.evaluate(() => {
    const ids = [...document.querySelectorAll('[id]')].map((place) => place.id);
    const links = [...document.querySelectorAll<HTMLAnchorElement>('a[href^="#"]')].map((link) => link.hash.slice(1));
    return {
      lost: links.filter((id) => !ids.includes(id)),
      twice: ids.filter((id, index) => ids.indexOf(id) !== index),
    };
  });
  expect(lost).toEqual([]);
  expect(twice).toEqual([]);
});

test('every example is read and decided as the page says: equal, but for the chain with a wrong step', async () => {
  const page = await openPage('/help');
  const links = await page.evaluate(() =>
    [...document.querySelectorAll<HTMLAnchorElement>('a[href^="/bench?"]')].map(
      (link) => link.getAttribute('href') ?? '',
    ),
  );
  expect(links.length).toBeGreaterThanOrEqual(15);
  for (const link of links) {
    const query = new URL(link, 'http://page').searchParams;
    const field = query.get('field');
    const statement = query.get('statement') ?? '';
    if (!statement.includes('=')) {
      const answer = await post('/api/v1/normalize', { field, expression: statement });
      expect.soft(answer.status, statement).toBe(200);
      continue;
    }
    const answer = await post('/api/v1/compare', { field, statement });
    const chain = statement.split('=').length > 2 && !statement.includes(';');
    expect.soft(answer.body, `${statement} over ${field}`).toMatchObject({ verdict: chain ? 'different' : 'equal' });
  }
});

test('the index marks the subject that is read', async () => {
  const page = await openPage('/help');
  const index = page.getByRole('navigation', { name: 'On this page' });
  await index.getByRole('link', { name: 'conventions' }).click();
  await expect
    .poll(() => index.getByRole('link', { name: 'conventions' }).getAttribute('aria-current'))
    .toBe('location');
});

test('the page can be read on the narrowest phone', async () => {
  const page = await openPage('/help', { width: 320, height: 700 });
  expect(await page.evaluate(() => document.documentElement.scrollWidth - innerWidth)).toBe(0);
  expect(await findings(page)).toEqual([]);
});

test('the table of roles says what each permission opens, from the table that decides', async () => {
  const page = await openPage('/help');
  const rows = page.getByRole('table', { name: 'Who may do what' }).getByRole('row');
  expect(await rows.count()).toBe(permissionNames.length + 1);
  expect(await rows.filter({ hasText: 'keep, revise' }).innerText()).toMatch(/author\s+scope write/);
  expect(await rows.filter({ hasText: 'invite and remove' }).innerText()).toMatch(/steward\s+no token/);
});
