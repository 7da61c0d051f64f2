import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { errorsOf, findings, openPage } from '../harness/browser';
import { send } from '../harness/http';

const pages = ['/', '/help'] as const;

const overflow = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
const background = (page: Page) => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
const stone = { light: 'rgb(201, 204, 197)', dark: 'rgb(18, 21, 23)' };

describe.each(pages)('%s', (path) => {
  test.each([
    ['light', false, 1440],
    ['dark', true, 1440],
    ['light on a phone', false, 390],
    ['dark on a phone', true, 390],
  ])('has nothing for axe to find, %s', async (_name, dark, width) => {
    const page = await openPage(path, { dark, width, height: 844 });
    await page.getByRole('heading', { level: 1 }).waitFor();
    expect(await findings(page)).toEqual([]);
    expect(errorsOf(page)).toEqual([]);
  });

  test('does not move sideways from 320 to 1920 px', async () => {
    const page = await openPage(path, { width: 1920, height: 800 });
    for (const width of [1920, 1200, 1199, 900, 720, 719, 390, 320]) {
      await page.setViewportSize({ width, height: 800 });
      expect.soft(await overflow(page), `${width} px`).toBe(0);
    }
  });
});

test('follows the system, and a chosen theme is kept and there before the first paint', async () => {
  const page = await openPage('/help', { dark: true });
  expect(await background(page)).toBe(stone.dark);
  await page.getByRole('contentinfo').getByRole('radio', { name: 'light' }).click();
  await expect.poll(() => background(page)).toBe(stone.light);
  // Before any module script has run the attribute stands: the script in the head put it there.
  await page.addInitScript(() => {
    document.addEventListener('readystatechange', () => {
      document.documentElement.dataset.themeAtInteractive ??= document.documentElement.dataset.theme;
    });
  });
  await page.reload();
  expect(await page.evaluate(() => document.documentElement.dataset.themeAtInteractive)).toBe('light');
  expect(await background(page)).toBe(stone.light);
  await page.getByRole('contentinfo').getByRole('radio', { name: 'system' }).click();
  await expect.poll(() => background(page)).toBe(stone.dark);
});

test('the first tab stop skips to the sheet', async () => {
  const page = await openPage('/help');
  await page.keyboard.press('Tab');
  await expect.poll(() => page.evaluate(() => document.activeElement?.textContent)).toBe('Skip to the sheet');
  await page.keyboard.press('Enter');
  await expect.poll(() => page.evaluate(() => document.activeElement?.id)).toBe('sheet');
});

test('H lists the keys, O the rooms, and letters can be turned off', async () => {
  const page = await openPage('/help');
  await page.getByRole('button', { name: 'All keys (H)' }).waitFor();
  await expect
    .poll(async () => {
      await page.keyboard.press('h');
      return page.getByRole('dialog', { name: 'Keys' }).count();
    })
    .toBe(1);
  expect(await findings(page)).toEqual([]);
  await page.keyboard.press('Escape');
  await expect.poll(() => page.getByRole('dialog').count()).toBe(0);

  await page.keyboard.press('o');
  const rooms = page.getByRole('dialog', { name: 'Rooms' });
  await rooms.getByRole('link', { name: 'Bench' }).waitFor();
  await page.keyboard.press('Escape');

  await page.keyboard.press('h');
  await page.getByRole('checkbox', { name: 'Single letters act' }).uncheck();
  await page.keyboard.press('Escape');
  await page.keyboard.press('o');
  expect(await page.getByRole('dialog').count()).toBe(0);
  await page.reload();
  await page.keyboard.press('o');
  expect(await page.getByRole('dialog').count()).toBe(0);
  await page.getByRole('button', { name: 'All keys (H)' }).click();
  await page.getByRole('checkbox', { name: 'Single letters act' }).check();
});

test('on a phone the rooms stand behind a button', async () => {
  const page = await openPage('/help', { width: 390, height: 844, touch: true });
  expect(await page.getByRole('navigation', { name: 'Rooms' }).count()).toBe(0);
  await expect
    .poll(async () => {
      await page.getByRole('button', { name: 'Rooms' }).click();
      return page.getByRole('dialog', { name: 'Rooms' }).count();
    })
    .toBe(1);
  expect(await findings(page)).toEqual([]);
  await page.getByRole('dialog').getByRole('link', { name: 'Bench' }).click();
  await page.waitForURL('**/bench');
});

test('what does not exist is said in one sentence, with the status that belongs to it', async () => {
  const answer = await send('/nothing/of/the/kind');
  expect(answer.status).toBe(404);
  const page = await openPage('/nothing/of/the/kind');
  await page.getByRole('heading', { name: 'There is nothing here that you can see.' }).waitFor();
  expect(await findings(page)).toEqual([]);
});

test('every page carries a policy with a nonce of its own, and may not be framed', async () => {
  const [first, second] = await Promise.all([send('/help'), send('/help')]);
  const policy = first.headers.get('content-security-policy') ?? '';
  expect(policy).toMatch(/script-src 'self' 'nonce-[A-Za-z0-9+/=]{16,}' 'strict-dynamic'/);
  expect(policy).toContain("frame-ancestors 'none'");
  expect(policy).not.toContain("script-src-attr 'unsafe-inline'");
  expect(second.headers.get('content-security-policy')).not.toBe(policy);
  expect(first.headers.get('x-content-type-options')).toBe('nosniff');
  expect(first.headers.get('referrer-policy')).toBe('strict-origin-when-cross-origin');
  expect(first.headers.get('permissions-policy')).toContain('camera=()');
});

test('print shows the sheet only', async () => {
  const page = await openPage('/help');
  await page.emulateMedia({ media: 'print' });
  expect(await page.getByRole('banner').isVisible()).toBe(false);
  expect(await page.getByRole('contentinfo').isVisible()).toBe(false);
  expect(await page.getByRole('main').isVisible()).toBe(true);
});

test('who asks for less motion gets none', async () => {
  const page = await openPage('/help', { still: true });
  const lay = await page.evaluate(() => getComputedStyle(document.documentElement).getPropertyValue('--lay'));
  expect(Number.parseFloat(lay)).toBe(0);
});
