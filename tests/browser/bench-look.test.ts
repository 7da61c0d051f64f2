import { describe, expect, test } from 'vitest';
import { findings, type Sight } from '../harness/browser';
import { eventually, expectWord, openBench, scrollsSideways, written } from './bench-page';

const equal = { field: 'Q', statement: '[5][6] + <2> + <3> = [-1][6] + <5> + <30>' };
const different = { field: 'Q', statement: '[6] = [2] + [3]' };
const expression = { field: 'Q', statement: '[5][2] + <2>[5][3]' };
const chain = { field: 'Q', statement: '[6] = [2] + <2>[3] = [2] + [3]' };
const unread = { field: 'Q', statement: '[6] = <2' };

const sights: readonly (readonly [string, Sight])[] = [
  ['at a desk', { width: 1440, height: 900 }],
  ['at a desk in the dark', { width: 1440, height: 900, dark: true }],
  ['on a phone', { width: 390, height: 844, touch: true }],
  ['on a phone in the dark', { width: 390, height: 844, dark: true, touch: true }],
  ['at twice the size', { width: 640, height: 430 }],
];

describe('the bench can be used by everyone', () => {
  describe.each(sights)('%s', (_, sight) => {
    test.each([
      ['equal', equal, '.floor'],
      ['different', different, '#minus'],
      ['an expression', expression, '#residues table'],
      ['a chain', chain, '#steps'],
      ['a line that cannot be read', unread, '.fault'],
      ['nothing yet', undefined, '.empty'],
    ] as const)('%s: no finding of axe, nothing sideways', async (_state, asked, part) => {
      const bench = await openBench(asked, sight);
      await bench.page.locator(part).first().waitFor();
      expect(await findings(bench.page)).toEqual([]);
      expect(await scrollsSideways(bench.page)).toBe(false);
    });

    test('choosing a field: no finding of axe, nothing sideways', async () => {
      const bench = await openBench(undefined, sight);
      await bench.picker.click();
      await bench.page.getByRole('dialog').waitFor();
      expect(await findings(bench.page)).toEqual([]);
      expect(await scrollsSideways(bench.page)).toBe(false);
    });
  });

  test('by the keyboard alone: choose a field, write, read the verdict, walk the tiles, open the evidence', async () => {
    const { page, line, picker, ...bench } = await openBench();
    await page.keyboard.press('f');
    const name = page.getByRole('textbox', { name: 'Name of the field' });
    await name.waitFor();
    expect(await name.evaluate((input) => input === document.activeElement)).toBe(true);
    await name.press('Control+a');
    await page.keyboard.type('F_6');
    await eventually(() => page.locator('.hint-wrong').count()).toBe(1);
    await name.press('Control+a');
    await page.keyboard.type('Q');
    await page.keyboard.press('Enter');
    await eventually(() => page.getByRole('dialog').count()).toBe(0);
    await page.keyboard.press('i');
    await page.keyboard.type('<2> + <3> = <5> + <30>');
    await expectWord({ page, line, picker, ...bench }, 'Equal');
    await page.keyboard.press('Escape');
    const focused = () => page.evaluate(() => document.activeElement?.getAttribute('aria-label') ?? '');
    for (let press = 0; press < 30 && !/degree 0/.test(await focused()); press += 1) await page.keyboard.press('Tab');
    const first = await focused();
    expect(first).toMatch(/degree 0/);
    await page.keyboard.press('ArrowRight');
    expect(await focused()).not.toBe(first);
    await page.keyboard.press('Enter');
    await eventually(() => page.locator('#apart').count()).toBe(1);
    expect(await written({ page, line, picker, ...bench })).toBe('<2> + <3> = <5> + <30>');
  });

  test('a verdict is announced once it is steady', async () => {
    const bench = await openBench(different);
    await expectWord(bench, 'Different');
    await eventually(() => bench.page.locator('[aria-live=polite]').allInnerTexts()).toContain(
      'Different, in degree 1, at 3.',
    );
  });
});
