import type { Page } from 'playwright-core';
import { expect } from 'vitest';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { Member } from '@/lib/people/caller';
import type { MemberRole } from '@/models/role';
import { openContext, type Sight, watch } from '../harness/browser';
import { post, serverUrl } from '../harness/http';
import { newGroup, tokenOf } from '../harness/people';
import { newAccount, sessionOf } from '../harness/sign-in';
import { eventually } from './bench-page';

const sessions = new Map<string, Promise<string>>();

/** A page of a member who is signed in, in a context of its own. */
export async function pageOf(member: Member, path: string, sight?: Sight): Promise<Page> {
  const { email } = member.person;
  const session = sessions.get(email) ?? sessionOf(email);
  sessions.set(email, session);
  const [name = '', value = ''] = (await session).split(/=(.*)/s);
  const context = await openContext(sight);
  await context.addCookies([{ name, value, url: serverUrl() }]);
  const page = watch(await context.newPage());
  await page.goto(path, { waitUntil: 'load' });
  return page;
}

/** A new group with one member of a role, by default an author. */
export const newKeeper = async (role: MemberRole = 'author', name?: string): Promise<Member> =>
  newAccount(await newGroup(), role, name);

/** Keeps an identity by the API. */
export async function keptBy(member: Member, content: Record<string, unknown>): Promise<IdentityAnswer> {
  const answer = await post('/api/v1/identities', { field: 'Q', ...content }, await tokenOf(member));
  expect(answer.text, 'the identity is kept').toContain('"key"');
  return answer.body as IdentityAnswer;
}

/** The form in which an identity is written. */
export const formOf = (page: Page) => ({
  line: page.getByRole('textbox', { name: /^(Statement|Class)$/ }),
  name: page.getByLabel('Name', { exact: true }),
  tags: page.getByLabel(/^Tags/),
  reference: page.getByLabel('Where it comes from'),
  doi: page.getByLabel('DOI'),
  arxiv: page.getByLabel('arXiv'),
  remark: page.getByLabel('What else to know about it'),
  change: page.getByLabel(/^What is changed/),
  keep: page.getByRole('button', { name: /^Keep as/ }),
  word: page.locator('.verdict h2'),
});

/** Replaces what stands in the written line. */
export async function writeLine(page: Page, text: string): Promise<void> {
  const { line } = formOf(page);
  await line.click();
  await page.keyboard.press('ControlOrMeta+a');
  await page.keyboard.insertText(text);
}

/** The statements in the ledger of the register, by their names. */
export const namesListed = (page: Page): Promise<string[]> => page.locator('.register .nm').allInnerTexts();

/** Waits until the ledger lists exactly these, in this order. */
export const expectListed = (page: Page, names: readonly string[]): Promise<void> =>
  eventually(async () => (await namesListed(page)).map((text) => text.replace(/^\d+ · /, ''))).toEqual(names);
