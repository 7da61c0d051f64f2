import { randomUUID } from 'node:crypto';
import { runSql } from '../harness/database';

const quoted = (text: string): string => `'${text.replaceAll("'", "''")}'`;

/** Rows a mail is made from, put into a database as they are. */
export interface MailRows {
  readonly invitationId: string;
  readonly resetId: string;
  readonly email: string;
}

/** A group, somebody in it, an invitation to `email` and a password reset, both open for an hour. */
export async function insertMailRows(
  url: string,
  { group = 'Skerry seminar', inviter = 'Tobias Renk' }: { group?: string; inviter?: string } = {},
): Promise<MailRows> {
  const [userId, groupId, invitationId, resetId] = Array.from({ length: 4 }, () => randomUUID());
  const email = `maren.${String(userId).slice(0, 8)}@skerry.example`;
  await runSql(
    url,
    `INSERT INTO users (id, email, name, password_hash)
     VALUES ('${userId}', ${quoted(email.replace('maren', 'tobias'))}, ${quoted(inviter)}, 'unused')`,
    `INSERT INTO groups (id, name, slug) VALUES ('${groupId}', ${quoted(group)}, 'group-x${String(groupId).replaceAll('-', '')}')`,
    `INSERT INTO invitations (id, group_id, email, role, invited_by, expires_at)
     VALUES ('${invitationId}', '${groupId}', '${email}', 'author', '${userId}', now() + interval '1 hour')`,
    `INSERT INTO password_resets (id, user_id, expires_at) VALUES ('${resetId}', '${userId}', now() + interval '1 hour')`,
  );
  return { invitationId: String(invitationId), resetId: String(resetId), email };
}
