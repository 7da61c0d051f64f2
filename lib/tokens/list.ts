import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { isUuid } from '@/lib/database/uuid';
import type { Member } from '@/lib/people/caller';
import type { Scope } from '@/models/scope';

/** Only a live token opens anything. One that is unseated belongs to a person who is no longer in the group. */
export type TokenState = 'live' | 'expired' | 'revoked' | 'unseated';

export interface ListedToken {
  readonly id: string;
  readonly name: string;
  readonly ending: string;
  readonly scopes: readonly Scope[];
  readonly owner: string;
  readonly own: boolean;
  readonly madeAt: Date;
  readonly expiresAt: Date;
  readonly lastUsedAt: Date | null;
  readonly state: TokenState;
}

export interface TokenPage {
  readonly tokens: readonly ListedToken[];
  /** The token after which the older ones begin; undefined when there are none. */
  readonly older: string | undefined;
}

const pageSize = 50;

/**
 * Tokens of the member's group, the newest first: the member's own, or everyone's.
 *
 * @param whose - whose tokens; everyone's are for whoever manages the members
 * @param after - the token after which the page begins, as `older` of the page before; anything else gives the first page
 */
export async function listTokens(member: Member, whose: 'own' | 'group', after?: string): Promise<TokenPage> {
  const cursor = after !== undefined && isUuid(after) ? after : null;
  const rows = await database().query<ListedToken>(
    `SELECT t.id, t.name, t.ending, t.scopes, u.name AS owner, t.user_id = $2 AS own, t.created_at AS "madeAt",
            t.expires_at AS "expiresAt", t.last_used_at AS "lastUsedAt",
            CASE WHEN t.revoked_at IS NOT NULL THEN 'revoked' WHEN t.expires_at <= now() THEN 'expired'
                 WHEN m.user_id IS NULL THEN 'unseated' ELSE 'live' END AS state
       FROM api_tokens t
       JOIN users u ON u.id = t.user_id
       LEFT JOIN memberships m ON m.group_id = t.group_id AND m.user_id = t.user_id
      WHERE t.group_id = $1 AND ($3 OR t.user_id = $2)
        AND ($4::uuid IS NULL OR (t.created_at, t.id) <
             (SELECT c.created_at, c.id FROM api_tokens c WHERE c.id = $4::uuid AND c.group_id = $1))
      ORDER BY t.created_at DESC, t.id DESC
      LIMIT ${pageSize + 1}`,
    { bind: [member.group.id, member.person.id, whose === 'group', cursor], type: QueryTypes.SELECT },
  );
  const tokens = rows.slice(0, pageSize);
  return { tokens, older: rows.length > pageSize ? tokens.at(-1)?.id : undefined };
}
