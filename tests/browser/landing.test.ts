import { expect, test } from 'vitest';
import { errorsOf, findings, openPage } from '../harness/browser';
import { newGroup } from '../harness/people';
import { newAccount } from '../harness/sign-in';
import { pageOf } from './register-page';

test('the line gives a real answer, and another one to another statement', async () => {
  const page = await openPage('/');
  await page.getByRole('heading', { level: 1, name: /one class, or two/ }).waitFor();
  const sheet = page.getByRole('main');
  await expect
    .poll(() => sheet.getByText('Equal', { exact: true }).count(), { timeout: 20_000 })
    .toBeGreaterThanOrEqual(2);
  await sheet.getByRole('table').waitFor();
  expect(await findings(page)).toEqual([]);

  await page.getByRole('button', { name: '[6] = [2] + [3]' }).click();
  await expect
    .poll(() => sheet.getByText('Different', { exact: true }).count(), { timeout: 20_000 })
    .toBeGreaterThanOrEqual(2);
  expect(await findings(page)).toEqual([]);
  expect(errorsOf(page)).toEqual([]);
});

test('what stands in the line opens on the bench', async () => {
  const page = await openPage('/');
  await page.getByRole('link', { name: 'Open on the bench' }).click();
  await page.waitForURL('**/bench?**');
  expect(new URL(page.url()).searchParams.get('statement')).toBe('[5][6] = [-1][6]');
});

test('whoever has an account, or wants one, is told where', async () => {
  const page = await openPage('/');
  await page.getByRole('link', { name: 'start a group' }).waitFor();
  const member = await newAccount(await newGroup(undefined, 'Tarn reading group'), 'reader');
  const own = await pageOf(member, '/');
  await own.getByRole('link', { name: 'the register of Tarn reading group' }).click();
  await own.waitForURL('**/register');
});

test('the contents name the rooms there are, and nothing that is not there', async () => {
  const page = await openPage('/');
  const contents = page.getByRole('navigation', { name: 'Contents' });
  const paths = await contents
    .getByRole('link')
    .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
  expect(paths).toEqual(['/bench', '/register', '/help', '/help/api']);
  for (const path of paths) expect((await page.request.get(path)).status()).toBe(200);
});
