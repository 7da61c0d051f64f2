import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, test } from 'vitest';
import type { Member } from '@/lib/people/caller';
import { errorsOf, findings, type Sight } from '../harness/browser';
import { newGroup } from '../harness/people';
import { newAccount } from '../harness/sign-in';
import { eventually, scrollsSideways } from './bench-page';
import { formOf, keptBy, newKeeper, pageOf } from './register-page';

const sights: readonly (readonly [string, Sight])[] = [
  ['at 1440 pixels', { width: 1440, height: 900 }],
  ['at 390 pixels, in the dark', { width: 390, height: 844, dark: true, touch: true }],
  ['at 320 pixels', { width: 320, height: 700, touch: true }],
];

let member: Member;
let key = '';

beforeAll(async () => {
  member = await newKeeper();
  ({ key } = await keptBy(member, {
    name: 'A long name, so that a narrow page has to break it somewhere between its words',
    statement: '[a][b c] = ε[b c][a]',
    hypotheses: ['char != 2'],
    field: 'any',
    tags: ['steinberg', 'a-rather-long-tag-for-a-narrow-page'],
    reference: 'Seminar note 4, lemma 2',
    doi: '10.1000/a-rather-long-identifier-that-goes-on-and-on-without-a-place-to-break',
    remark: 'First line.\nSecond line.',
  }));
  await keptBy(member, { name: 'Six', statement: '[6] = [2] + [3]', warning: true });
  await keptBy(member, { name: 'Seven', kind: 'residue', statement: '[7][10]', place: '7', value: '[3]' });
});

async function expectWell(page: Page): Promise<void> {
  expect(await findings(page)).toEqual([]);
  expect(await scrollsSideways(page)).toBe(false);
  expect(errorsOf(page)).toEqual([]);
}

describe.each(sights)('%s', (_, sight) => {
  test('the register, its filters and what is not found', async () => {
    const page = await pageOf(member, '/register', sight);
    await expectWell(page);
    await page.getByText('more filters').click();
    expect(await page.getByLabel('Last check').isVisible()).toBe(true);
    await expectWell(page);
    await page.goto('/register?words=nowhere');
    await expectWell(page);
  });

  test('an identity, with the leaf that withdraws it', async () => {
    const page = await pageOf(member, `/identities/${key}`, sight);
    await eventually(() => page.locator('.floor').count()).toBe(1);
    await expectWell(page);
    await page.getByRole('button', { name: 'Withdraw' }).click();
    await page.getByLabel('Why, in a sentence').waitFor();
    await expectWell(page);
    await page.keyboard.press('Escape');
    expect(await page.getByRole('dialog').count()).toBe(0);
  });

  test('the form, for an equality and for a residue', async () => {
    const page = await pageOf(member, '/register/keep?field=Q&statement=%5B6%5D+%3D+%5B2%5D+%2B+%5B3%5D', sight);
    await eventually(() => formOf(page).word.innerText()).toBe('Different');
    await expectWell(page);
    await formOf(page).keep.click();
    await eventually(() => page.getByText('Give it a name').count()).toBe(1);
    await expectWell(page);
    await page.getByRole('radio', { name: 'a residue' }).click();
    await page.getByLabel('Place', { exact: true }).waitFor();
    await expectWell(page);
  });
});

test.each([320, 390, 900, 1280])('words without a place to break stay within %i pixels', async (width) => {
  const group = await newGroup(undefined, `Seminar${'g'.repeat(70)}`);
  const steward = await newAccount(group, 'steward', `Wide${'w'.repeat(70)}`);
  const one = await keptBy(steward, {
    name: 'N'.repeat(120),
    statement: `[${'7'.repeat(400)}] = [${'3'.repeat(400)}]`,
    tags: ['t'.repeat(40)],
    remark: 'R'.repeat(200),
    reference: 'S'.repeat(120),
    warning: true,
  });
  const page = await pageOf(steward, '/register', { width, height: 800 });
  for (const path of ['/register', `/identities/${one.key}`, `/identities/${one.key}/revise`, '/group/audit']) {
    await page.goto(path);
    await page.getByRole('heading', { level: 1 }).waitFor();
    expect.soft(await findings(page), path).toEqual([]);
    expect.soft(await scrollsSideways(page), path).toBe(false);
    // The number fills its lines.
    for (const box of await page.locator(':is(.set, .register) .long-number').all())
      expect.soft((await box.boundingBox())?.width, path).toBeGreaterThan(100);
  }
});

describe('by keyboard alone', () => {
  test('one looks, sorts, opens and copies', async () => {
    const page = await pageOf(member, '/register');
    await page.keyboard.press('m');
    expect(await page.getByLabel('Words in a name').evaluate((field) => field === document.activeElement)).toBe(true);
    await page.keyboard.type('six');
    await page.waitForURL(/words=six/);
    expect(await page.getByLabel('Words in a name').evaluate((field) => field === document.activeElement)).toBe(true);
    await eventually(() => page.locator('.register tbody tr').count()).toBe(1);
    const link = page.getByRole('link', { name: /^Six:/ });
    for (let presses = 0; presses < 40; presses += 1) {
      if (await link.evaluate((one) => one === document.activeElement)) break;
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Enter');
    await page.waitForURL('**/identities/*-2');
    await page.locator('.deeds').waitFor();
    await page.keyboard.press('t');
    await eventually(() => page.evaluate(() => navigator.clipboard.readText())).toMatch(/\\ne/);
    await page.keyboard.press('m');
    await page.waitForURL('**/register');
  });

  test('the ledger keeps its place while one types', async () => {
    const page = await pageOf(member, '/register');
    const top = async () => (await page.locator('#sheet').boundingBox())?.y;
    const before = await top();
    await page.getByLabel('Words in a name').fill('seven');
    await page.waitForURL(/words=seven/);
    await eventually(() => page.locator('.register tbody tr').count()).toBe(1);
    expect(await top()).toBe(before);
  });

  test('on paper there is the sheet alone', async () => {
    const page = await pageOf(member, `/identities/${key}`);
    await page.emulateMedia({ media: 'print' });
    expect(await page.locator('.slab').isVisible()).toBe(false);
    expect(await page.locator('.deeds').isVisible()).toBe(false);
    expect(await page.locator('.set').isVisible()).toBe(true);
    expect(await page.locator('.cite').first().isVisible()).toBe(true);
  });
});
