import { describe, expect, test } from 'vitest';
import { eventually, expectWord, openBench, written } from './bench-page';

describe('the written line', () => {
  test('an error is shown at its column, in the line and under it, and the last answer is marked old', async () => {
    const bench = await openBench({ field: 'Q', statement: '[5][6] + <2> + <3> = [-1][6] + <5> + <30>' });
    await expectWord(bench, 'Equal');
    await bench.line.fill('[5][6] + <2> + <3 = [-1][6] + <5> + <30>');
    const note = bench.page.locator('.fault');
    await eventually(() => note.innerText()).toMatch(/^Column 19\./);
    expect(await bench.page.locator('.line-bad').innerText()).toBe('=');
    expect((await bench.page.locator('.line-open').allInnerTexts()).join('')).toContain('<3');
    expect(await bench.status.innerText()).toBe('Not read past column 18.');
    expect(await bench.page.locator('.old').innerText()).toMatch(/^Old answer\./);
    expect(await bench.page.locator('[data-mark=old]').count()).toBe(1);
    await note.getByRole('button', { name: '>' }).first().click();
    await expectWord(bench, 'Equal');
    expect(await written(bench)).toContain('<3 >=');
  });

  test('an entry that is zero in the field is refused at its column', async () => {
    const bench = await openBench({ field: 'Q', statement: '[2][1-1]' });
    const note = bench.page.locator('.fault');
    await eventually(() => note.innerText()).toMatch(/^Column 5\. .*unit/);
    expect(await bench.page.locator('.line-bad').count()).toBe(1);
  });

  test('a field that is none is refused beside the field, in plain words', async () => {
    const bench = await openBench({ field: 'F_6', statement: '[5]' });
    await eventually(() => bench.page.locator('.hint-field').innerText()).toMatch(/6/);
  });

  test('insertion keys put the caret inside, and Alt with a bracket encloses what is chosen', async () => {
    const bench = await openBench();
    await bench.page.getByRole('button', { name: 'Symbol' }).click();
    await bench.page.keyboard.type('2');
    expect(await written(bench)).toBe('[2]');
    await bench.line.fill('3');
    await bench.line.press('Control+a');
    await bench.line.press('Alt+[');
    expect(await written(bench)).toBe('[3]');
    await bench.line.fill('5');
    await bench.line.press('Control+a');
    await bench.page.keyboard.press('Alt+Shift+Comma');
    expect(await written(bench)).toBe('<5>');
    await bench.page.getByRole('button', { name: 'Eta' }).click();
    await bench.page.getByRole('button', { name: 'Symbol' }).click();
    await bench.page.keyboard.type('7');
    expect(await written(bench)).toContain('η[7]');
  });

  test('the partner of the bracket at the caret is underlined', async () => {
    const bench = await openBench();
    await bench.line.pressSequentially('[2]<3>');
    await eventually(() => bench.page.locator('.line-partner').allInnerTexts()).toEqual(['<']);
  });

  test.each([
    '[2] + <3',
    '<<2,3>> + h[5] = ',
    '[2][3] = = 4',
    '\\langle 2\\rangle + [3]',
    '[[2]]]',
    '[1/2] ; char != 2',
  ])('every key goes where the caret is, also while marks come and go: %s', async (text) => {
    const bench = await openBench();
    await bench.line.pressSequentially(text, { delay: 40 });
    for (let step = 0; step < 3; step += 1) await bench.line.press('ArrowLeft');
    await bench.page.keyboard.type('7', { delay: 40 });
    expect(await written(bench)).toBe(`${text.slice(0, -3)}7${text.slice(-3)}`);
  });

  test('Ctrl+Enter asks at once, Esc leaves the line', async () => {
    const bench = await openBench();
    await bench.line.pressSequentially('<4> = 1');
    await bench.line.press('Control+Enter');
    await expectWord(bench, 'Equal');
    await bench.line.press('Escape');
    expect(await bench.line.evaluate((line) => line === document.activeElement)).toBe(false);
    await bench.page.keyboard.press('i');
    expect(await bench.line.evaluate((line) => line === document.activeElement)).toBe(true);
    expect(await written(bench)).toBe('<4> = 1');
  });

  test('a long text does not hold up the keys', async () => {
    const bench = await openBench();
    const long = Array.from({ length: 2500 }, (_, index) => `[${index + 2}]`).join(' + ');
    await bench.line.fill(long);
    await bench.line.press('End');
    await bench.page.keyboard.type(' + <7>');
    await eventually(() => written(bench)).toMatch(/\+ <7>$/);
  });

  test('long work can be stopped', async () => {
    const bench = await openBench();
    await bench.page.route('**/api/v1/compare', () => undefined);
    await bench.line.fill('[2] = [3]');
    const stop = bench.page.getByRole('button', { name: 'Stop' });
    await stop.waitFor();
    await bench.line.press('Escape');
    await bench.page.keyboard.press('s');
    await eventually(() => bench.status.innerText()).toMatch(/Stopped before an answer came\./);
  });

  test('a refusal for too many questions says when to ask again', async () => {
    const bench = await openBench();
    await bench.page.route('**/api/v1/compare', (route) =>
      route.fulfill({
        status: 429,
        headers: { 'Retry-After': '40' },
        contentType: 'application/problem+json',
        body: JSON.stringify({
          type: '/help#error-quota',
          title: 'Too many',
          status: 429,
          code: 'quota',
          detail: 'Too many.',
        }),
      }),
    );
    await bench.line.fill('[2] = [3]');
    await eventually(() => bench.status.innerText()).toMatch(
      /^Too many questions from this address\. Ask again in 40 seconds\./,
    );
  });
});
