import { AxeBuilder } from '@axe-core/playwright';
import { expect, test } from 'vitest';
import { errorsOf, openPage } from '../harness/browser';

const calls = ['/api/v1/normalize', '/api/v1/compare', '/api/v1/compare/many', '/api/v1/residues', '/api/v1/health'];

test.each([
  ['light', false, 1440],
  ['dark on a phone', true, 390],
])('lists every call, %s', async (_name, dark, width) => {
  const page = await openPage('/help/api', { dark, width, height: 900 });
  for (const call of calls) await page.locator(`[data-path="${call}"]`).first().waitFor({ timeout: 90_000 });
  // The widget's own markup nests buttons in ways that axe objects to; its colours are ours and are checked, the page around it in full.
  const shell = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .exclude('.swagger-ui')
    .analyze();
  expect(shell.violations.map(({ id }) => id)).toEqual([]);
  const colours = await new AxeBuilder({ page }).include('.swagger-ui').withRules(['color-contrast']).analyze();
  expect(colours.violations.flatMap(({ nodes }) => nodes.map((node) => node.target.join(' ')))).toEqual([]);
  expect(await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)).toBe(
    0,
  );
  expect(errorsOf(page)).toEqual([]);
});

test('a call opens and can be tried', async () => {
  const page = await openPage('/help/api');
  const health = page.locator('.opblock', { has: page.locator('[data-path="/api/v1/health"]') });
  await health.locator('.opblock-summary-control').click();
  await health.getByRole('button', { name: 'Try it out' }).click();
  await health.getByRole('button', { name: 'Execute' }).click();
  await expect.poll(() => health.getByText('"status"').count()).toBeGreaterThan(0);
});
