import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import type { MemberRole } from '@/models/role';
import type { Scope } from '@/models/scope';
import type { Member } from './caller';
import { hashSecret } from './secret-text';

interface Row {
  readonly token_id: string;
  readonly token_name: string;
  readonly scopes: Scope[];
  readonly expires_at: Date;
  readonly stale: boolean;
  readonly user_id: string;
  readonly user_name: string;
  readonly email: string;
  readonly group_id: string;
  readonly group_name: string;
  readonly slug: string;
  readonly role: MemberRole;
}

/**
 * The member a token acts for: undefined when there is no such token, or it is expired or revoked, or the person is no longer in
 * the group. The role is the one the person has now. That the token was used is noted, at most once a minute.
 */
export async function memberOfToken(secret: string): Promise<Member | undefined> {
  const [row] = await database().query<Row>(
    `SELECT t.id AS token_id, t.name AS token_name, t.scopes, t.expires_at,
            t.last_used_at IS NULL OR t.last_used_at < now() - interval '1 minute' AS stale,
            u.id AS user_id, u.name AS user_name, u.email, g.id AS group_id, g.name AS group_name, g.slug, m.role
       FROM api_tokens t
       JOIN memberships m ON m.group_id = t.group_id AND m.user_id = t.user_id
       JOIN users u ON u.id = t.user_id
       JOIN groups g ON g.id = t.group_id
      WHERE t.token_hash = $1 AND t.revoked_at IS NULL AND t.expires_at > now()`,
    { bind: [hashSecret(secret)], type: QueryTypes.SELECT },
  );
  if (row === undefined) return undefined;
  if (row.stale)
    await database().query('UPDATE api_tokens SET last_used_at = now() WHERE id = $1', { bind: [row.token_id] });
  return {
    kind: 'member',
    person: { id: row.user_id, name: row.user_name, email: row.email },
    group: { id: row.group_id, name: row.group_name, slug: row.slug, role: row.role },
    token: { id: row.token_id, name: row.token_name, scopes: row.scopes, expiresAt: row.expires_at },
  };
}
