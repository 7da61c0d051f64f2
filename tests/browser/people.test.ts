import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, test } from 'vitest';
import { errorsOf, findings, openContext, openPage, watch } from '../harness/browser';
import { newGroup, newMember, query, serverDatabase } from '../harness/people';
import { forgetAttempts, newAccount, signInAs, signUp, testPassword } from '../harness/sign-in';
import { focusedName, invitationLink, mailbox, overflow, resetLink } from './people-page';

beforeEach(async () => {
  for (const limit of ['sign-in-address', 'reset-address', 'link-address']) await forgetAttempts(limit);
});

const freshAddress = () => `${randomUUID()}@skerry.example`;
const pathOf = (link: string | undefined) => new URL(link ?? '').pathname;

test('a group is started, a member invited by mail, seated, given a role, and removed, each at once', async () => {
  const mail = mailbox();
  const steward = await openPage('/start');
  await signUp(steward, { group: 'Skerry seminar' });
  await expect.poll(() => steward.title()).toBe('Skerry seminar · Quadrel');
  const email = freshAddress();
  await steward.getByLabel('Invite by e-mail').fill(` ${email.toUpperCase()} `);
  await steward.getByLabel('Role', { exact: true }).selectOption('reader');
  await steward.getByRole('button', { name: 'Send the invitation' }).click();
  await steward
    .getByRole('status')
    .filter({ hasText: `on its way to ${email}, as reader` })
    .waitFor();
  await steward.getByRole('rowheader', { name: email }).waitFor();
  expect(await steward.getByLabel('Invite by e-mail').inputValue()).toBe('');

  const letter = await mail.waitForMail(email);
  const link = letter.links.find((one) => one.includes('/invitation/'));
  const guest = await openPage(pathOf(link));
  await guest.getByRole('heading', { level: 1, name: 'Join “Skerry seminar”' }).waitFor();
  expect(await guest.getByLabel('E-mail address').inputValue()).toBe(email);
  await guest.getByLabel('Your name').fill('Ines Calloway');
  await guest.getByLabel('Choose a password').fill('short');
  await guest.getByRole('button', { name: 'Join the group' }).click();
  await expect.poll(() => focusedName(guest)).toBe('password');
  expect(await guest.getByLabel('Your name').inputValue()).toBe('Ines Calloway');
  expect(await guest.getByLabel('Choose a password').inputValue()).toBe('');
  await guest.getByLabel('Choose a password').fill(testPassword);
  await guest.getByRole('button', { name: 'Join the group' }).click();
  await guest.waitForURL('**/register');
  await guest.getByRole('banner').getByRole('link', { name: 'Ines Calloway' }).waitFor();

  await guest.goto('/group');
  await guest.getByRole('rowheader', { name: 'Odile Farrant' }).waitFor();
  for (const name of ['Send the invitation', 'Change the role of Odile Farrant', 'Save the name'])
    expect(await guest.getByRole('button', { name }).count(), name).toBe(0);
  expect((await guest.request.get('/group/audit')).status()).toBe(404);

  await steward.reload();
  await steward.getByRole('button', { name: 'Change the role of Ines Calloway' }).click();
  await steward.getByRole('dialog').getByLabel('Role').selectOption('steward');
  await steward.getByRole('button', { name: 'Give the role' }).click();
  await steward.getByRole('status').filter({ hasText: 'Ines Calloway is steward now.' }).waitFor();
  await guest.reload();
  await guest.getByRole('button', { name: 'Send the invitation' }).waitFor();

  await steward.getByRole('button', { name: 'Remove Ines Calloway' }).click();
  await steward.getByRole('dialog').getByRole('button', { name: 'Remove' }).click();
  await steward.getByRole('status').filter({ hasText: 'Ines Calloway is no longer in the group.' }).waitFor();
  expect(await steward.getByRole('rowheader', { name: 'Ines Calloway' }).count()).toBe(0);
  // The page that is still open can do nothing any more.
  await guest.getByLabel('Invite by e-mail').fill(freshAddress());
  await guest.getByRole('button', { name: 'Send the invitation' }).click();
  await guest.getByRole('alert').filter({ hasText: 'This was not done' }).waitFor();
  await guest.goto('/register');
  await guest.waitForURL('**/account');
  await guest.getByText('You are in no group.').waitFor();
  expect(errorsOf(steward)).toEqual([]);
  expect(errorsOf(guest)).toEqual([]);
});

test('a password is set anew by mail, and every session from before is over', async () => {
  const mail = mailbox();
  const { person } = await newAccount(await newGroup(), 'author');
  const elsewhere = await openPage('/sign-in');
  await signInAs(elsewhere, person.email);

  const page = await openPage('/sign-in');
  await page.getByRole('link', { name: 'Send me a link to set a new password' }).click();
  await page.waitForURL('**/reset');
  const ask = async (email: string) => {
    await page.getByLabel('E-mail address of your account').fill(email);
    await page.getByRole('button', { name: 'Send the link' }).click();
    const slip = page.getByRole('status').filter({ hasText: email });
    return (await slip.textContent())?.replace(email, '…');
  };
  const unknown = await ask(freshAddress());
  expect(await ask(person.email)).toBe(unknown);

  const link = pathOf((await mail.waitForMail(person.email)).links.find((one) => one.includes('/reset/')));
  await page.goto(link);
  await page.getByLabel('New password', { exact: true }).fill('basalt and heather');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.waitForURL('**/account?said=password');
  await page.getByRole('status').filter({ hasText: 'Your password is set.' }).waitFor();
  await elsewhere.goto('/account');
  await elsewhere.waitForURL('**/sign-in?next=%2Faccount');
  await page.goto(link);
  await page.getByRole('heading', { name: 'This link sets no password' }).waitFor();
  await signInAs(elsewhere, person.email, 'basalt and heather');
});

test('signing out everywhere ends the session of a second browser; signing out ends one', async () => {
  const { person } = await newAccount(await newGroup(), 'author');
  const [one, two] = [await openPage('/sign-in'), await openPage('/sign-in')];
  await signInAs(one, person.email);
  await signInAs(two, person.email);
  await one.getByRole('button', { name: 'Sign out', exact: true }).click();
  await one.getByRole('status').filter({ hasText: 'You are signed out.' }).waitFor();
  await two.reload();
  await two.getByRole('heading', { level: 1, name: person.name }).waitFor();
  await signInAs(one, person.email);
  await one.getByRole('button', { name: 'Sign out everywhere' }).click();
  await one.getByRole('status').filter({ hasText: 'signed out on every device' }).waitFor();
  await two.goto('/account');
  await two.waitForURL('**/sign-in?next=%2Faccount');
  expect((await two.request.get('/register', { maxRedirects: 0 })).status()).toBe(307);
});

test('one changes name and password on the account, and stays signed in here only', async () => {
  const { person } = await newAccount(await newGroup(), 'author', 'Tobias Renk');
  const [here, there] = [await openPage('/sign-in'), await openPage('/sign-in')];
  await signInAs(here, person.email);
  await signInAs(there, person.email);
  await here.getByLabel('Your name').fill('Tobias Renk-Iwuji');
  await here.getByRole('button', { name: 'Save the name' }).click();
  await here.getByRole('banner').getByRole('link', { name: 'Tobias Renk-Iwuji' }).waitFor();

  await here.getByLabel('Your password now').fill('not this one');
  await here.getByLabel('New password').fill('basalt and heather');
  await here.getByRole('button', { name: 'Change the password' }).click();
  await expect.poll(() => focusedName(here)).toBe('current');
  await here.getByLabel('Your password now').fill(testPassword);
  await here.getByLabel('New password').fill('basalt and heather');
  await here.getByRole('button', { name: 'Change the password' }).click();
  await here.getByRole('status').filter({ hasText: 'Your password is changed.' }).waitFor();
  await here.reload();
  await here.getByRole('heading', { level: 1, name: 'Tobias Renk-Iwuji' }).waitFor();
  await there.goto('/account');
  await there.waitForURL('**/sign-in?next=%2Faccount');
});

test('one goes over from one group to another; what a page was opened for happens there or nowhere', async () => {
  const member = await newAccount(await newGroup(undefined, 'A first group'), 'steward');
  const second = await newGroup(undefined, 'B second group');
  await query(serverDatabase(), "INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, 'steward')", [
    second.id,
    member.person.id,
  ]);
  const page = await openPage('/sign-in');
  await signInAs(page, member.person.email, testPassword, '/group');
  await page.getByRole('heading', { level: 1, name: 'A first group' }).waitFor();
  const tab = watch(await page.context().newPage());
  await tab.goto('/account');
  await tab.getByRole('button', { name: 'Go over to B second group' }).click();
  await tab.getByRole('banner').getByRole('link', { name: 'B second group' }).waitFor();
  const email = freshAddress();
  await page.getByLabel('Invite by e-mail').fill(email);
  await page.getByRole('button', { name: 'Send the invitation' }).click();
  await page.getByRole('alert').filter({ hasText: 'This was not done' }).waitFor();
  expect(await page.getByLabel('Invite by e-mail').inputValue()).toBe(email);
  expect(await query(serverDatabase(), 'SELECT 1 FROM invitations WHERE email = $1', [email])).toEqual([]);
});

describe('the link of an invitation', () => {
  test('of an address with an account asks for its password, and joins', async () => {
    const known = await newAccount(await newGroup(), 'author');
    const group = await newGroup(undefined, 'Shoal seminar');
    const page = await openPage(await invitationLink(group.id, known.person.email));
    await page.getByLabel('Password of your account').fill('not the password');
    await page.getByRole('button', { name: 'Sign in and join' }).click();
    await expect.poll(() => focusedName(page)).toBe('password');
    await page.getByLabel('Password of your account').fill(testPassword);
    await page.getByRole('button', { name: 'Sign in and join' }).click();
    await page.waitForURL('**/register');
    await page.getByRole('banner').getByRole('link', { name: 'Shoal seminar' }).waitFor();
  });

  test('for someone else says so, and lets one step aside', async () => {
    const group = await newGroup();
    const { person } = await newAccount(group, 'author');
    const email = freshAddress();
    const link = await invitationLink(group.id, email);
    const page = await openPage('/sign-in');
    await signInAs(page, person.email);
    await page.goto(link);
    await page.getByText(`Only the account with ${email} can accept this invitation.`).waitFor();
    await page.getByRole('button', { name: 'Sign out and go on' }).click();
    await page.getByLabel('Choose a password').waitFor();
    expect(new URL(page.url()).pathname).toBe(link);
  });

  test.each([
    ['has run out', { expired: true }, 'This invitation has run out', 'Ask a steward'],
    ['was taken back', { revoked: true }, 'This invitation no longer holds', 'Look for the newest mail'],
  ])('that %s says what to do', async (_name, state, title, advice) => {
    const group = await newGroup();
    const page = await openPage(await invitationLink(group.id, freshAddress(), state), { width: 390, height: 844 });
    await page.getByRole('heading', { level: 1, name: title }).waitFor();
    await page.getByText(advice).waitFor();
    expect(await page.getByRole('textbox').count()).toBe(0);
    expect(await findings(page)).toEqual([]);
  });

  test('that is none, and one to set a password that has run out, say what to do', async () => {
    const { person } = await newMember(await newGroup(), 'author');
    const page = await openPage('/invitation/no-such-invitation-anywhere');
    await page.getByRole('heading', { level: 1, name: 'This link opens no invitation' }).waitFor();
    await page.goto(await resetLink(person.id, { expired: true }));
    await page.getByText('The link has run out. Ask for a new one; it is good for an hour.').waitFor();
    await page.getByRole('link', { name: 'Ask for a new link' }).click();
    await page.waitForURL('**/reset');
  });
});

describe('pages of people', () => {
  test.each([
    ['light', false, 1440],
    ['dark', true, 1440],
    ['light on a phone', false, 390],
    ['dark on a phone', true, 390],
  ])('have nothing for axe to find, %s', async (_name, dark, width) => {
    const group = await newGroup();
    const { person } = await newAccount(group, 'steward');
    await newMember(group, 'author', { name: 'Maren Iwuji' });
    const link = await invitationLink(group.id, freshAddress());
    const context = await openContext({ dark, width, height: 844 });
    const page = watch(await context.newPage());
    await signInAs(page, person.email);
    for (const path of ['/account', '/group', link, await resetLink(person.id)]) {
      await page.goto(path);
      await page.getByRole('heading', { level: 1 }).waitFor();
      expect(await findings(page), path).toEqual([]);
      expect(await overflow(page), path).toBe(0);
    }
    await page.goto('/group');
    await page.getByRole('button', { name: 'Remove Maren Iwuji' }).click();
    await page.getByRole('dialog').waitFor();
    expect(await findings(page)).toEqual([]);
    expect(errorsOf(page)).toEqual([]);
  });

  test('do not move sideways at 320 px, however long a name is', async () => {
    const group = await newGroup(undefined, `Seminar${'g'.repeat(70)}`);
    const { person } = await newAccount(group, 'steward', `Wide${'w'.repeat(70)}`);
    await invitationLink(group.id, `${'a'.repeat(60)}@${'b'.repeat(60)}.example`);
    const page = await openPage('/sign-in');
    await signInAs(page, person.email);
    for (const path of ['/account', '/group'])
      for (const width of [320, 719, 900, 1440]) {
        await page.setViewportSize({ width, height: 800 });
        await page.goto(path);
        expect.soft(await overflow(page), `${path} at ${width} px`).toBe(0);
      }
  });

  test('a member is removed by keyboard alone, and Esc leaves the leaf', async () => {
    const group = await newGroup();
    const { person } = await newAccount(group, 'steward');
    await newMember(group, 'author', { name: 'Maren Iwuji' });
    const page = await openPage('/sign-in');
    await signInAs(page, person.email, testPassword, '/group');
    const remove = page.getByRole('button', { name: 'Remove Maren Iwuji' });
    await remove.focus();
    await page.keyboard.press('Enter');
    await page.getByRole('dialog', { name: 'Remove Maren Iwuji?' }).waitFor();
    await page.keyboard.press('Escape');
    await expect.poll(() => page.getByRole('dialog').count()).toBe(0);
    expect(await remove.evaluate((button) => button === document.activeElement)).toBe(true);
    await page.keyboard.press('Enter');
    await page.getByRole('dialog').getByRole('button', { name: 'Remove' }).focus();
    await page.keyboard.press('Enter');
    await page.getByRole('status').filter({ hasText: 'Maren Iwuji is no longer in the group.' }).waitFor();
    await expect.poll(() => page.evaluate(() => document.activeElement?.getAttribute('aria-label'))).toBe('Members');
  });

  test('the last steward cannot leave and is told why; any other member leaves', async () => {
    const group = await newGroup();
    const steward = await newAccount(group, 'steward');
    const author = await newAccount(group, 'author');
    const page = await openPage('/sign-in');
    await signInAs(page, steward.person.email, testPassword, '/group');
    const leave = page.getByRole('button', { name: 'Leave the group' });
    expect(await leave.getAttribute('aria-disabled')).toBe('true');
    await leave.focus();
    await page
      .getByRole('button', { name: `Change the role of ${steward.person.name}` })
      .first()
      .click();
    await page.getByRole('dialog').getByLabel('Role').selectOption('reader');
    await page.getByRole('button', { name: 'Give the role' }).click();
    await page.getByText('A group needs a steward. Make another member a steward first.').waitFor();

    const other = await openPage('/sign-in');
    await signInAs(other, author.person.email, testPassword, '/group');
    await other.getByRole('button', { name: 'Leave the group' }).click();
    await other.getByRole('dialog').getByRole('button', { name: 'Leave the group' }).click();
    await other.getByRole('status').filter({ hasText: 'You have left the group.' }).waitFor();
  });

  test('an invitation is sent again and taken back', async () => {
    const group = await newGroup();
    const { person } = await newAccount(group, 'steward');
    const email = freshAddress();
    const link = await invitationLink(group.id, email, { expired: true });
    const page = await openPage('/sign-in');
    await signInAs(page, person.email, testPassword, '/group');
    await page.getByText('run out').waitFor();
    await page.getByRole('button', { name: `Send again to ${email}` }).click();
    await page
      .getByRole('status')
      .filter({ hasText: `A new invitation is on its way to ${email}` })
      .waitFor();
    await expect.poll(() => page.getByText('run out').count()).toBe(0);
    await mailbox().waitForMail(email);
    await page.getByRole('button', { name: `Take back the invitation of ${email}` }).click();
    await page
      .getByRole('status')
      .filter({ hasText: `The invitation of ${email} is taken back.` })
      .waitFor();
    await page.getByText('Nobody is being waited for.').waitFor();
    await page.goto(link);
    await page.getByRole('heading', { level: 1, name: 'This invitation no longer holds' }).waitFor();
  });
});
