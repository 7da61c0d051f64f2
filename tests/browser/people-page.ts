import type { Page } from 'playwright-core';
import { inject } from 'vitest';
import type { MemberRole } from '@/models/role';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import { type MailReader, readerOf } from '../harness/mailbox';
import { query, serverDatabase } from '../harness/people';

export const overflow = (page: Page): Promise<number> =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

/** The name of the field that has the focus. */
export const focusedName = (page: Page): Promise<string | null> =>
  page.evaluate(() => document.activeElement?.getAttribute('name') ?? null);

/** The mail of the server under test. */
export const mailbox = (): MailReader => readerOf(inject('mailboxFolder'));

/** An invitation as it is once its mail was made; the path of its link. */
export async function invitationLink(
  groupId: string,
  email: string,
  { role = 'author' as MemberRole, expired = false, revoked = false } = {},
): Promise<string> {
  const token = newSecret();
  await query(
    serverDatabase(),
    `INSERT INTO invitations (group_id, email, role, token_hash, expires_at, revoked_at)
     VALUES ($1, $2, $3, $4, now() + $5::interval, CASE WHEN $6 THEN now() END)`,
    [groupId, email, role, hashSecret(token), expired ? '-1 second' : '7 days', revoked],
  );
  return `/invitation/${token}`;
}

/** A link to set a new password as it is once its mail was made; its path. */
export async function resetLink(userId: string, { expired = false } = {}): Promise<string> {
  const token = newSecret();
  await query(
    serverDatabase(),
    'INSERT INTO password_resets (user_id, token_hash, expires_at) VALUES ($1, $2, now() + $3::interval)',
    [userId, hashSecret(token), expired ? '-1 second' : '1 hour'],
  );
  return `/reset/${token}`;
}
