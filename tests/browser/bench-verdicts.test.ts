import { describe, expect, test } from 'vitest';
import { errorsOf, findings } from '../harness/browser';
import { eventually, expectWord, openBench, scrollsSideways } from './bench-page';

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
  ['any', '[a][1+a] = [-1][1+a]', 'Equal', 'Steinberg at -a and 1 + a'],
  ['F_7(t)', '[t][1-t] = 0', 'Equal', 'Steinberg'],
  ['F_7(t)', '[t][2] = 0', 'Different', 'the residue at t is [2], and 2 is not 1'],
  ['Q(t)', '[t^2+1][-t^2] = 0', 'Equal', 'Steinberg'],
  ['Q(t)', '<t^2+1> = 1', 'Different', 't^2 + 1 is no square'],
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

  test('what fails over some field says where, shows what was tried, and opens there', async () => {
    const bench = await openBench({ field: 'any', statement: '[a][b] = [a+b][-ab]' });
    await expectWord(bench, 'Different');
    const { page } = bench;
    expect(await page.locator('.verdict .lead').innerText()).toMatch(/It fails over/);
    // Finite fields have no K_2: they cannot separate symbols, so the tile that is cut stands for another field.
    const cells = page.getByRole('table', { name: 'Substitutions tried' }).getByRole('cell');
    expect(await cells.filter({ hasText: 'different' }).count()).toBe(1);
    expect(await findings(page)).toEqual([]);
    await page.getByRole('link', { name: /^Open it over/ }).click();
    await page.waitForURL(/field=Q/);
    await eventually(() => page.locator('.verdict h2').innerText()).toBe('Different');
    expect(await page.getByRole('link', { name: /^Open it over/ }).count()).toBe(0);
    expect(errorsOf(page)).toEqual([]);
  });

  test('what holds over every field shows the relations that add up to it', async () => {
    const bench = await openBench({ field: 'any', statement: '[a][b] = [a+b][-b/a]' });
    await expectWord(bench, 'Equal');
    // [a/(a+b)][b/(a+b)] = 0, since the two add up to 1.
    await eventually(() => bench.page.locator('#relations tbody tr').count()).toBe(1);
    expect(await findings(bench.page)).toEqual([]);
  });

  test('what cannot be decided is called undecided, with what was sought and what can be done', async () => {
    const bench = await openBench({ field: 'any', statement: 'eta[-1][a^4+3a^2b^2+b^4+2ab+1] = 0' });
    await expectWord(bench, 'Undecided');
    const { page } = bench;
    expect(await page.locator('[data-mark=undecided]').count()).toBe(1);
    expect(await page.locator('.verdict .lead').innerText()).toMatch(/ended at/);
    for (const side of ['substitutions tried', 'proof sought', 'what can be done'])
      expect(await page.getByRole('heading', { name: side }).count(), side).toBe(1);
    expect(await page.locator('.notes').innerText()).toMatch(/side conditions[^]*how far it was looked/);
    expect(await findings(page)).toEqual([]);
    expect(await scrollsSideways(page)).toBe(false);
  });

  test('over rational functions an expression shows its residues, infinity among them', async () => {
    const { page } = await openBench({ field: 'F_7(t)', statement: '[t][3]' });
    // t has its zero at t and its pole at infinity, and [3] is not zero.
    await eventually(() => page.locator('#residues tbody tr').count()).toBe(2);
    expect(await page.locator('#residues').innerText()).toMatch(/At every place not listed the residue is zero/);
    expect(errorsOf(page)).toEqual([]);
  });
});
