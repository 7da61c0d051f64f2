import { describe, expect, test } from 'vitest';
import { openContext, openPage, watch } from '../harness/browser';
import { benchOf, eventually, expectWord, openBench, written } from './bench-page';

describe('nothing typed is lost', () => {
  test('a link reopens the same statement over the same field', async () => {
    const bench = await openBench({ field: 'F_9', statement: '[z][z+1] = 0' });
    await expectWord(bench, 'Equal');
    await bench.page.keyboard.press('l');
    const told = bench.page.locator('.told');
    await eventually(() => told.innerText()).toMatch(/^Copied the link \/bench\/[0-9a-z]{10}\.$/);
    const link = await bench.page.evaluate(() => navigator.clipboard.readText());
    const again = benchOf(await openPage(new URL(link).pathname));
    await expectWord(again, 'Equal');
    expect(await written(again)).toBe('[z][z+1] = 0');
    expect(await again.picker.innerText()).toMatch(/9/);
  });

  test('under a code that was never given there is nothing to see', async () => {
    const page = await openPage('/bench/0000000000');
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('There is nothing here that you can see.');
  });

  test('what is written survives a reload', async () => {
    const bench = await openBench();
    await bench.line.pressSequentially('[2] + <3');
    await bench.page.reload();
    await eventually(() => written(bench)).toBe('[2] + <3');
  });

  test('a kept text is offered where the address opens another one, and not overwritten', async () => {
    const context = await openContext();
    const page = watch(await context.newPage());
    await page.goto('/bench');
    const bench = benchOf(page);
    await bench.line.pressSequentially('[7] = [7]');
    await expectWord(bench, 'Equal');
    await page.goto('/bench?field=R&statement=%3C2%3E%20%3D%201');
    await expectWord(bench, 'Equal');
    expect(await written(bench)).toBe('<2> = 1');
    await eventually(() => page.getByText('Your text was kept on this device.').count()).toBe(1);
    await page.getByRole('button', { name: 'Go on with it' }).click();
    await eventually(() => written(bench)).toBe('[7] = [7]');
  });

  test('the last field is remembered', async () => {
    const bench = await openBench();
    await bench.picker.click();
    await bench.page.getByRole('textbox', { name: 'Name of the field' }).fill('F_7');
    await bench.page.keyboard.press('Enter');
    await eventually(() => bench.picker.innerText()).toMatch(/7/);
    await bench.page.reload();
    await eventually(() => bench.picker.innerText()).toMatch(/7/);
  });

  test('a statement is copied as text and as TeX', async () => {
    const bench = await openBench({ field: 'Q', statement: '<2> + <3> = <5> + <30>' });
    await expectWord(bench, 'Equal');
    const clipboard = () => bench.page.evaluate(() => navigator.clipboard.readText());
    await bench.page.keyboard.press('c');
    await eventually(clipboard).toMatch(/^<2>.*= <5>/);
    await bench.page.keyboard.press('t');
    await eventually(clipboard).toMatch(/\\langle 2\s*\\rangle/);
  });
});
