import { describe, expect, test } from 'vitest';
import { errorsOf, openContext, openPage, watch } from '../harness/browser';
import { signInAs, testPassword } from '../harness/sign-in';
import { benchOf, eventually, expectWord } from './bench-page';
import { expectListed, formOf, keptBy, newKeeper, pageOf, writeLine } from './register-page';

async function textOf(stream: AsyncIterable<Buffer>): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk);
  return Buffer.concat(chunks).toString('utf8');
}

describe('from the bench into the register and on', () => {
  test('an identity is kept, found, revised, withdrawn and cited', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, `/bench?${new URLSearchParams({ field: 'Q', statement: '[5][6] = [-1][6]' })}`);
    await expectWord(benchOf(page), 'Equal');
    await page.keyboard.press('k');
    await page.waitForURL('**/register/keep?**');
    const form = formOf(page);
    await form.name.fill('Steinberg at six');
    await form.tags.fill('steinberg, symbols');
    await form.reference.fill('Seminar note 4, lemma 2');
    await form.doi.fill('https://doi.org/10.1000/lemma-2');
    await form.arxiv.fill('arXiv:2301.01234v2');
    await form.remark.fill('Used twice.');
    await eventually(() => form.keep.innerText()).toBe('Keep as identity');
    await form.keep.click();
    await page.waitForURL('**/identities/*-1');
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('Steinberg at six');
    expect(await page.locator('.stands').innerText()).toMatch(/^Checked\. Tobias Renk kept it on .*; revision 1\.$/);
    expect(await page.getByRole('link', { name: 'doi:10.1000/lemma-2' }).getAttribute('href')).toBe(
      'https://doi.org/10.1000/lemma-2',
    );
    expect(await page.getByRole('link', { name: 'arXiv:2301.01234v2' }).count()).toBe(1);

    // found by a word, by the beginning of one, by state, field and tag
    await page.getByRole('link', { name: 'Register', exact: true }).first().click();
    await page.waitForURL('**/register');
    await expectListed(page, ['Steinberg at six']);
    const words = page.getByLabel('Words in a name');
    await words.fill('stein');
    await page.waitForURL('**/register?words=stein');
    await expectListed(page, ['Steinberg at six']);
    await words.fill('lemma nowhere');
    await eventually(() => page.getByText('No identity fits what is looked for.').count()).toBe(1);
    await page.getByRole('link', { name: 'Drop the filters' }).click();
    await expectListed(page, ['Steinberg at six']);
    expect(await words.inputValue()).toBe('');
    await page.getByRole('link', { name: /^Draft/ }).click();
    await eventually(() => page.getByText('No identity fits what is looked for.').count()).toBe(1);
    await page.getByRole('link', { name: /^Checked/ }).click();
    await expectListed(page, ['Steinberg at six']);
    await page.getByLabel('Field', { exact: true }).selectOption('Q');
    await page.waitForURL(/field=Q/);
    await page.getByLabel('Tag', { exact: true }).selectOption('symbols');
    await page.waitForURL(/tag=symbols/);
    await expectListed(page, ['Steinberg at six']);

    // revised: checked anew, and what changed is said and marked
    await page.getByRole('link', { name: /^Steinberg at six/ }).click();
    await page.waitForURL('**/identities/*-1');
    await page.getByRole('link', { name: 'Revise' }).click();
    await page.waitForURL('**/revise');
    await form.line.waitFor();
    await writeLine(page, '[5][6] + [2] = [-1][6] + [2]');
    await form.change.fill('[2] on both sides.');
    await eventually(() => form.word.innerText()).toBe('Equal');
    await form.keep.click();
    await page.waitForURL('**/identities/*-1');
    const revisions = page.locator('.revs tbody tr');
    expect(await revisions.count()).toBe(2);
    expect(await revisions.first().innerText()).toContain('[2] on both sides.');
    expect(await revisions.first().innerText()).toContain('Changes the statement.');
    expect(await revisions.first().locator('ins').allInnerTexts()).toEqual(['+ [2]', '+ [2]']);
    await page.getByRole('link', { name: 'Revision 1' }).click();
    await page.waitForURL('**/identities/*-1/1');
    expect(await page.locator('.stands').innerText()).toMatch(/^Revision 1 of 2\./);
    expect(await page.getByRole('button', { name: 'Withdraw' }).count()).toBe(0);
    await page.getByRole('link', { name: 'To the current one' }).click();
    await page.waitForURL('**/identities/*-1');

    // checked again, then withdrawn with a reason
    await page.getByRole('button', { name: 'Check again' }).click();
    await eventually(() => page.getByText('Checked again: equal.').count()).toBe(1);
    await page.getByRole('button', { name: 'Withdraw' }).click();
    const leaf = page.getByRole('dialog');
    await leaf.getByRole('button', { name: 'Withdraw' }).click();
    expect(await leaf.innerText()).toContain('Say in a sentence why nobody should rely on it.');
    await leaf.getByLabel('Why, in a sentence').fill('Stated twice; the other one stays.');
    await leaf.getByRole('button', { name: 'Withdraw' }).click();
    await eventually(() => page.locator('.stands').innerText()).toMatch(
      /^Withdrawn\. Stated twice; the other one stays\./,
    );
    expect(await page.getByRole('link', { name: 'Revise and bring it back' }).count()).toBe(1);

    // cited
    await page.getByRole('button', { name: 'Copy for BibTeX' }).click();
    const clipboard = () => page.evaluate(() => navigator.clipboard.readText());
    await eventually(clipboard).toMatch(/^@misc\{skerry-x[0-9a-f]+-1-2,/);
    expect(await clipboard()).toContain('title  = {Steinberg at six}');
    expect(errorsOf(page)).toEqual([]);
  });

  test('a visitor signs in on the way and comes back with the statement', async () => {
    const member = await newKeeper();
    const asked = new URLSearchParams({ field: 'any', statement: '[a][-a] = 0' });
    const page = await openPage(`/bench?${asked}`);
    await expectWord(benchOf(page), 'Equal');
    await page.getByRole('button', { name: 'Keep as identity' }).click();
    await page.waitForURL('**/sign-in?**');
    await page.getByLabel('E-mail address').fill(member.person.email);
    await page.getByLabel('Password').fill(testPassword);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL('**/register/keep?**');
    await eventually(() => formOf(page).line.innerText()).toBe('[a][-a] = 0');
    await eventually(() => formOf(page).word.innerText()).toBe('Equal');
  });

  test('a long statement travels under a code', async () => {
    const member = await newKeeper();
    const long = `${Array.from({ length: 300 }, (_, index) => `[${index + 2}]`).join(' + ')} = 0`;
    const page = await pageOf(member, '/bench');
    const bench = benchOf(page);
    await bench.line.click();
    await page.keyboard.insertText(long);
    await expectWord(bench, 'Different');
    await page.getByRole('button', { name: 'Keep as a warning' }).click();
    await page.waitForURL('**/register/keep?code=*');
    await eventually(async () => (await formOf(page).line.innerText()).replace(/\s+/g, ' ')).toBe(long);
  });

  test('a pair that differs is kept as a warning, and says so with ≠', async () => {
    const member = await newKeeper();
    const asked = new URLSearchParams({ field: 'Q', statement: '[6] = [2] + [3]' });
    const page = await pageOf(member, `/register/keep?${asked}`);
    const form = formOf(page);
    await eventually(() => form.keep.innerText()).toBe('Keep as a warning');
    await form.name.fill('Six is no sum');
    await form.keep.click();
    await page.waitForURL('**/identities/*-1');
    expect(await page.locator('.stands').innerText()).toMatch(/^Checked, a warning\./);
    expect(await page.locator('.set').innerText()).toContain('Not equal:');
    expect(await page.locator('.set').innerText()).toContain('≠');
    expect(await page.getByRole('heading', { name: 'left and right apart' }).count()).toBe(1);
  });

  test('a residue is kept with its place, uniformizer and value', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, '/register/keep');
    const form = formOf(page);
    await page.getByRole('radio', { name: 'a residue' }).click();
    await form.line.click();
    await page.keyboard.insertText('[7][10]');
    await page.getByLabel('Place', { exact: true }).fill('7');
    await page.getByRole('button', { name: 'Take the residue that was found' }).click();
    expect(await page.getByLabel('Value', { exact: true }).inputValue()).toBe('[3]');
    await eventually(() => form.word.innerText()).toBe('Equal');
    await form.name.fill('Seven and ten');
    await form.keep.click();
    await page.waitForURL('**/identities/*-1');
    expect(await page.locator('.set').innerText()).toMatch(/∂/);
    expect(await page.locator('#holds-for').innerText()).toMatch(/at\s+7/);
    expect(await page.locator('.stands').innerText()).toMatch(/^Checked\./);
  });

  test('the ledger is sorted by its heads, and goes on page by page', async () => {
    const member = await newKeeper();
    for (let number = 1; number <= 27; number += 1)
      await keptBy(member, {
        name: `Number ${String(number).padStart(2, '0')}`,
        statement: `[${number + 1}] = [${number + 1}]`,
      });
    const page = await pageOf(member, '/register');
    expect(await page.locator('.register tbody tr').count()).toBe(25);
    expect(await page.locator('.pages').innerText()).toContain('25 of 27.');
    await page.getByRole('link', { name: 'The other two' }).click();
    await page.waitForURL(/cursor=/);
    await expectListed(page, ['Number 02', 'Number 01']);
    expect(await page.locator('.pages').innerText()).toContain('26 to 27 of 27.');
    await page.getByRole('link', { name: 'From the beginning' }).click();
    await eventually(() => page.locator('.register tbody tr').count()).toBe(25);
    await page.getByRole('link', { name: 'statement', exact: true }).click();
    await page.waitForURL(/sort=name/);
    await eventually(() => page.locator('.register .nm').first().innerText()).toBe('1 · Number 01');
    expect(await page.locator('th[aria-sort=ascending]').innerText()).toBe('statement');
    await page.getByRole('link', { name: 'statement', exact: true }).click();
    await page.waitForURL(/sort=-name/);
    await eventually(() => page.locator('.register .nm').first().innerText()).toBe('27 · Number 27');
  });

  test('what the filters leave is written out', async () => {
    const member = await newKeeper();
    await keptBy(member, { name: 'First', statement: '[2] = [2]', tags: ['one'] });
    await keptBy(member, { name: 'Second', statement: '[3] = [3]', tags: ['two'] });
    const page = await pageOf(member, '/register?tag=two');
    await page.getByText('write out as').click();
    for (const [name, file, says] of [
      ['TeX', /-register\.tex$/, '\\paragraph{Second.}'],
      ['BibTeX', /-register\.bib$/, 'title  = {Second}'],
      ['CSV', /-register\.csv$/, 'Second'],
      ['JSON', /-register\.json$/, '"name":"Second"'],
    ] as const) {
      const [download] = await Promise.all([
        page.waitForEvent('download'),
        page.getByRole('link', { name, exact: true }).click(),
      ]);
      expect(download.suggestedFilename()).toMatch(file);
      const text = await textOf(await download.createReadStream());
      expect(text).toContain(says);
      expect(text).not.toContain('First');
    }
  });

  test('it works without scripts', async () => {
    const member = await newKeeper();
    await keptBy(member, { name: 'First', statement: '[2] = [2]' });
    await keptBy(member, { name: 'Second', statement: '[3] = [3]' });
    const context = await openContext();
    const page = watch(await context.newPage());
    await signInAs(page, member.person.email, undefined, '/register');
    const plain = await context.browser()?.newContext({
      javaScriptEnabled: false,
      storageState: await context.storageState(),
      baseURL: new URL(page.url()).origin,
    });
    if (!plain) throw new Error('There is no browser.');
    try {
      const still = await plain.newPage();
      await still.goto('/register');
      await still.getByLabel('Words in a name').fill('second');
      await still.keyboard.press('Enter');
      await still.waitForURL(/words=second/);
      expect(await still.locator('.register .nm').allInnerTexts()).toEqual(['2 · Second']);
    } finally {
      await plain.close();
    }
  });
});
