import { describe, expect, test } from 'vitest';
import { errorsOf } from '../harness/browser';
import { newAccount } from '../harness/sign-in';
import { eventually } from './bench-page';
import { formOf, keptBy, newKeeper, pageOf, writeLine } from './register-page';

const stated = (statement: string, field = 'Q') => `/register/keep?${new URLSearchParams({ field, statement })}`;
const kept = 'Your text is kept as you write.';

describe('nothing typed into the form is lost', () => {
  test('what was typed is kept on the server, offered after a reload, and forgotten once it is an identity', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, stated('[2] = [2]'));
    await formOf(page).name.fill('Begun today');
    await writeLine(page, '[2] + [3] = [3] + [2]');
    await eventually(() => page.getByText(kept).count()).toBe(1);
    await page.reload();
    expect(await formOf(page).name.inputValue()).toBe('');
    await page.getByRole('button', { name: 'Go on with it' }).click();
    expect(await formOf(page).name.inputValue()).toBe('Begun today');
    await eventually(() => formOf(page).line.innerText()).toBe('[2] + [3] = [3] + [2]');

    // on another device too, where no other statement is brought
    const elsewhere = await pageOf(member, '/register/keep');
    expect(await formOf(elsewhere).name.inputValue()).toBe('Begun today');
    await eventually(() => formOf(elsewhere).word.innerText()).toBe('Equal');
    await formOf(elsewhere).keep.click();
    await elsewhere.waitForURL('**/identities/*-1');
    await elsewhere.goto('/register/keep');
    expect(await formOf(elsewhere).name.inputValue()).toBe('');
    expect(await elsewhere.getByText('Your text was kept.').count()).toBe(0);
  });

  test('a draft is left when it is not wanted', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, stated('[2] = [2]'));
    await formOf(page).name.fill('Not wanted');
    await eventually(() => page.getByText(kept).count()).toBe(1);
    await page.reload();
    await page.getByRole('button', { name: 'Close' }).click();
    await eventually(() => page.getByText('Your text was kept.').count()).toBe(0);
    await page.waitForLoadState('networkidle');
    await page.reload();
    expect(await page.getByText('Your text was kept.').count()).toBe(0);
  });

  test('on an error everything stays, and the first wrong field has the focus and says what to change', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, stated('[2] = [2]'));
    const form = formOf(page);
    await form.doi.fill('10/abc');
    await form.tags.fill('good, not_good');
    await form.remark.fill('Stays.');
    await form.keep.click();
    await eventually(() => page.getByText('Give it a name, so that it can be found.').count()).toBe(1);
    expect(await form.name.evaluate((field) => field === document.activeElement)).toBe(true);
    expect(await page.getByText('This is no DOI').count()).toBe(1);
    expect(await page.getByText('A tag has at most 40 letters').count()).toBe(1);
    expect([await form.doi.inputValue(), await form.tags.inputValue(), await form.remark.inputValue()]).toEqual([
      '10/abc',
      'good, not_good',
      'Stays.',
    ]);
    await form.name.fill('Named');
    await form.doi.fill('10.1000/abc');
    await form.tags.fill('good');
    await form.keep.click();
    await page.waitForURL('**/identities/*-1');
  });

  test('a statement that cannot be read says at which column, as on the bench', async () => {
    const member = await newKeeper();
    const page = await pageOf(member, stated('[2] = [3'));
    const form = formOf(page);
    await form.name.fill('Half a statement');
    await eventually(() => page.locator('.fault').innerText()).toMatch(/^Column \d+\./);
    await form.keep.click();
    await eventually(() =>
      page.getByText('It cannot be read. The note under the line says where, and why.').count(),
    ).toBe(1);
    expect(page.url()).toContain('/register/keep');
    await writeLine(page, '[2][3]');
    await form.keep.click();
    await eventually(() => page.getByText('An identity needs an equals sign between two sides.').count()).toBe(1);
    await writeLine(page, '[0] = [3]');
    await form.keep.click();
    await eventually(() => page.locator('.slip').innerText()).toMatch(/unit/);
    expect(await form.name.inputValue()).toBe('Half a statement');
  });
});

describe('on two screens', () => {
  test('whoever is second sees both versions, loses nothing, and goes on from the first', async () => {
    const member = await newKeeper();
    const other = await newAccount(member.group, 'reviewer', 'Maren Iwuji');
    const { key } = await keptBy(member, { name: 'Two', statement: '[2] = [2]', reference: 'Note 1' });
    const slow = await pageOf(member, `/identities/${key}/revise`);
    const fast = await pageOf(other, `/identities/${key}/revise`);
    await writeLine(fast, '[2] + [3] = [3] + [2]');
    await formOf(fast).change.fill('Says it with two terms.');
    await formOf(fast).keep.click();
    await fast.waitForURL(`**/identities/${key}`);

    await writeLine(slow, '[2] + [5] = [5] + [2]');
    await formOf(slow).name.fill('Two and five');
    await formOf(slow).change.fill('Five is clearer.');
    await formOf(slow).keep.click();
    const conflict = slow.locator('#conflict');
    await eventually(() => conflict.count()).toBe(1);
    expect(await conflict.innerText()).toContain('Maren Iwuji made revision 2 while you were writing');
    expect(await conflict.innerText()).toContain('Says it with two terms.');
    expect((await conflict.locator('del').allInnerTexts()).join(' ')).toContain('[3]');
    expect((await conflict.locator('ins').allInnerTexts()).join(' ')).toContain('[5]');
    await slow.getByRole('button', { name: 'Go on from theirs, with your text' }).click();
    await eventually(() => conflict.count()).toBe(0);
    expect(await formOf(slow).name.inputValue()).toBe('Two and five');
    expect(await formOf(slow).change.inputValue()).toBe('Five is clearer.');
    await eventually(() => formOf(slow).line.innerText()).toBe('[2] + [5] = [5] + [2]');
    expect(await formOf(slow).keep.innerText()).toBe('Keep as revision 3');
    await formOf(slow).keep.click();
    await slow.waitForURL(`**/identities/${key}`);
    expect(await slow.locator('.revs tbody tr').count()).toBe(3);
    expect(await slow.getByRole('heading', { level: 1 }).innerText()).toBe('Two and five');
    expect(errorsOf(slow)).toEqual([]);
  });

  test('the text of a revision that was begun is offered again, and goes back to the revision it began from', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, { name: 'Two', statement: '[2] = [2]' });
    const page = await pageOf(member, `/identities/${key}/revise`);
    await formOf(page).name.fill('Two, again');
    await eventually(() => page.getByText(kept).count()).toBe(1);
    await page.goto(`/identities/${key}/revise`);
    await page.getByRole('button', { name: 'Go on with it' }).click();
    expect(await formOf(page).name.inputValue()).toBe('Two, again');
  });

  test('a withdrawal of an identity that was revised meanwhile is not carried out', async () => {
    const member = await newKeeper();
    const { key } = await keptBy(member, { name: 'Two', statement: '[2] = [2]' });
    const first = await pageOf(member, `/identities/${key}`);
    const second = await pageOf(member, `/identities/${key}/revise`);
    await formOf(second).name.fill('Two, renamed');
    await formOf(second).keep.click();
    await second.waitForURL(`**/identities/${key}`);
    await first.getByRole('button', { name: 'Withdraw' }).click();
    await first.getByLabel('Why, in a sentence').fill('It is wrong.');
    await first.getByRole('dialog').getByRole('button', { name: 'Withdraw' }).click();
    await eventually(() => first.getByText('It was changed meanwhile.').count()).toBe(1);
    await second.reload();
    expect(await second.locator('.stands').innerText()).toMatch(/^Checked\./);
  });
});
