import { randomBytes } from 'node:crypto';
import type { Page } from 'playwright-core';
import type { Member } from '@/lib/people/caller';
import { hashPassword } from '@/lib/people/passwords';
import type { MemberRole } from '@/models/role';
import { send } from './http';
import { newMember, query, serverDatabase, type TestGroup } from './people';

/** The password of every account that the tests make. */
export const testPassword = 'granite and lichen';
let hashed: Promise<string> | undefined;

/** Somebody new in a group of the server under test, who can sign in with the password of the tests. */
export async function newAccount(group: TestGroup, role: MemberRole, name?: string): Promise<Member> {
  hashed ??= hashPassword(testPassword);
  return newMember(group, role, { name, passwordHash: await hashed });
}

/** Makes the server forget what it counted: all tests come from one address. */
export async function forgetAttempts(limit: string): Promise<void> {
  await query(serverDatabase(), 'DELETE FROM rate_limits WHERE key LIKE $1', [`${limit}:%`]);
}

/** Starts a group by the page, with a new account, which is then signed in. */
export async function signUp(
  page: Page,
  { name = 'Odile Farrant', group = 'Skerry seminar' } = {},
): Promise<{ readonly email: string; readonly slug: string }> {
  await forgetAttempts('start-address');
  const mark = randomBytes(5).toString('hex');
  const email = `odile-${mark}@skerry.example`;
  const slug = `skerry-x${mark}`;
  await page.goto('/start');
  await page.getByLabel('Name of the group').fill(group);
  await page.getByLabel('Short name').fill(slug);
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('Your e-mail address').fill(email);
  await page.getByLabel('Password').fill(testPassword);
  await page.getByRole('button', { name: 'Start the group' }).click();
  await page.waitForURL('**/group');
  return { email, slug };
}

/** Signs a page in by the door, and stays where that leads. */
export async function signInAs(page: Page, email: string, password = testPassword, next = '/account'): Promise<void> {
  await page.goto(`/sign-in?next=${encodeURIComponent(next)}`);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(`**${next}`);
}

const cookiesOf = (headers: Headers): string[] => headers.getSetCookie().map((cookie) => cookie.split(';')[0] ?? '');

/** Signs in without a browser. Returns the value of the header `Cookie` for requests of that session. */
export async function sessionOf(email: string, password = testPassword): Promise<string> {
  const token = await send('/api/auth/csrf');
  const { csrfToken } = token.body as { csrfToken: string };
  const answer = await send('/api/auth/callback/credentials', {
    method: 'POST',
    redirect: 'manual',
    headers: { 'content-type': 'application/x-www-form-urlencoded', cookie: cookiesOf(token.headers).join('; ') },
    body: new URLSearchParams({ csrfToken, email, password, json: 'true' }).toString(),
  });
  const session = cookiesOf(answer.headers).find((cookie) => /quadrel-session=./.test(cookie));
  if (session === undefined) throw new Error(`${email} could not sign in: ${answer.status} ${answer.text}`);
  return session;
}
