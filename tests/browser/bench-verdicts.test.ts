import { describe, expect, test } from 'vitest';
import { errorsOf } from '../harness/browser';
import { eventually, expectWord, openBench } from './bench-page';

/** Each is true or false by a one-line reason. */
const cases: readonly (readonly [field: string, statement: string, word: string, reason: string])[] = [
  [
    'Q',
    '[5][6] + <2> + <3> = [-1][6] + <5> + <30>',
    'Equal',
    'Steinberg at -5 + 6 = 1, and the Witt relation at 2 + 3 = 5',
  ],
  ['Q', '[6] = [2] + [3]', 'Different', 'the term with η is missing: 2 is no square modulo 3'],
  ['F_7', '[3][5] = 0', 'Equal', 'K_2 of a finite field is zero, and so is I^2'],
  ['F_7', '<3> = 1', 'Different', '3 is no square modulo 7'],
  ['F_9', '[z][z+1] = 0', 'Equal', 'K_2 of a finite field is zero, and so is I^2'],
  ['F_9', '[z] = [z+1]', 'Different', 'modulo η they are different units'],
  ['R', '<2> = 1', 'Equal', '2 is a square'],
  ['R', '<-1> = 1', 'Different', 'the signatures are -1 and 1'],
  ['C', '<-1> = 1', 'Equal', '-1 is a square'],
  ['Q_2', '<17> = 1', 'Equal', '17 is 1 modulo 8, so a square'],
  ['Q_2', '<5> = 1', 'Different', '5 is 5 modulo 8, so no square'],
  ['Q_5', '<-1> = 1', 'Equal', '-1 is a square modulo 5'],
  ['Q_5', '<2> = 1', 'Different', '2 is no square modulo 5'],
  ['any', '[a b] = [a] + <a>[b]', 'Equal', 'twisted additivity'],
  ['any', '[a b] = [a] + [b]', 'Different', 'the term with η is missing'],
];

describe('the bench decides', () => {
  test.each(cases)('over %s: %s is %s, for %s', async (field, statement, word) => {
    const bench = await openBench({ field, statement });
    await expectWord(bench, word);
    expect(errorsOf(bench.page)).toEqual([]);
  });

  test('an answer comes as one types, and says when', async () => {
    const bench = await openBench();
    await bench.line.pressSequentially('[6] = [2] + [3]');
    await expectWord(bench, 'Different');
    expect(await bench.page.locator('.lead').first().innerText()).toMatch(/in degree 1, at 3\./);
    expect(await bench.status.innerText()).toMatch(/^Read to the end\. Answered [\d.]+ m?s after the last key\.$/);
  });

  test('an expression is brought to its canonical form, with its derivation and its residues', async () => {
    const bench = await openBench({ field: 'Q', statement: '[5][2] + <2>[5][3]' });
    await eventually(() => bench.page.locator('.mark-tile').count()).toBe(1);
    await eventually(() => bench.page.locator('.lead').first().innerText()).toMatch(
      /is its canonical form, in degree 2/,
    );
    await eventually(() => bench.page.locator('#why .chain tr').count()).toBeGreaterThan(1);
    // [5][2] + <2>[5][3] = [5][6] = [-1][6] ramifies at 3 only (Steinberg at -5 + 6 = 1).
    await eventually(() => bench.page.locator('#residues tbody tr').count()).toBe(1);
    expect(await bench.page.locator('#residues tbody td').first().innerText()).toContain('3');
    expect(await bench.page.locator('#residues .hint').innerText()).toMatch(/At every place not listed/);
  });

  test('of a chain every step is judged, the first wrong one is marked, and its floor is shown', async () => {
    const bench = await openBench({ field: 'Q', statement: '[6] = [2] + <2>[3] = [2] + [3] = [3] + [2]' });
    await expectWord(bench, 'Different');
    await eventually(() => bench.page.locator('#steps .chain-step').allInnerTexts()).toEqual([
      'Equal',
      'Different, the first wrong step',
      'Equal',
    ]);
    expect(await bench.page.locator('#steps tr.wrong').count()).toBe(1);
    expect(await bench.page.locator('.tile.split').count()).toBe(1);
    await bench.page.getByRole('button', { name: 'Equal' }).first().click();
    await eventually(() => bench.page.locator('.tile.split').count()).toBe(0);
  });

  test('left and right apart: every invariant with both values, opened by a tile or by W', async () => {
    const bench = await openBench({ field: 'Q', statement: '<2> + <3> = <5> + <30>' });
    await expectWord(bench, 'Equal');
    expect(await bench.page.locator('#apart').count()).toBe(0);
    await bench.page.locator('.tile.whole').first().click();
    await eventually(() => bench.page.locator('#apart tbody tr').count()).toBeGreaterThan(2);
    expect(await bench.page.locator('#apart [data-same=false]').count()).toBe(0);
    await bench.page.keyboard.press('w');
    await eventually(() => bench.page.locator('#apart').count()).toBe(0);
  });

  test('the missing term is offered, and makes the sides equal', async () => {
    const bench = await openBench({ field: 'Q', statement: '[6] = [2] + [3]' });
    await expectWord(bench, 'Different');
    await bench.page.getByRole('button', { name: /^Add/ }).click();
    await expectWord(bench, 'Equal');
  });

  test('what cannot be decided is called undecided', async () => {
    const { page, line, word } = await openBench();
    const value = { text: '0', tex: '0' };
    const evidence = { kind: 'invariants', theorem: '', modEta: false, modH: false };
    await page.route('**/api/v1/compare', (route) =>
      route.fulfill({
        json: {
          engine: '0',
          field: { text: 'any', tex: '\\text{any field}' },
          statement: { text: '[a] = 0', tex: '[a] = 0' },
          sides: [{ text: '[a]', tex: '[a]' }, value],
          verdict: 'undecided',
          parts: [{ degree: 1, verdict: 'undecided', group: { tex: 'K^{\\mathrm{MW}}_1' }, compared: [] }],
          sideConditions: [{ text: 'a != 0', tex: 'a \\ne 0' }],
          evidence,
        },
      }),
    );
    await line.fill('[a] = 0');
    await eventually(() => word.innerText()).toBe('Undecided');
    expect(await page.locator('[data-mark=undecided]').count()).toBe(1);
    expect(await page.locator('.notes').innerText()).toMatch(/side conditions/);
  });
});
