import 'server-only';
import { QueryTypes } from 'sequelize';
import { record } from '@/lib/audit/record';
import { database } from '@/lib/database/connection';
import { isUuid } from '@/lib/database/uuid';
import type { Member } from '@/lib/people/caller';
import { may } from '@/lib/permissions';

export type TokenRevoked =
  | { readonly outcome: 'revoked'; readonly name: string }
  /** It had been revoked before; nothing was changed. */
  | { readonly outcome: 'already' }
  | { readonly outcome: 'not-there' };

interface Row {
  readonly name: string;
  readonly ending: string;
  readonly revoked: boolean;
  readonly user_id: string;
  readonly owner: string;
}

/** Ends a token at once: one's own, or for whoever manages the members any of the group. Others do not exist for the caller. */
export async function revokeToken(member: Member, id: string): Promise<TokenRevoked> {
  if (!isUuid(id)) return { outcome: 'not-there' };
  return database().transaction(async (transaction) => {
    const [token] = await database().query<Row>(
      `SELECT t.name, t.ending, t.revoked_at IS NOT NULL AS revoked, t.user_id, u.name AS owner
         FROM api_tokens t JOIN users u ON u.id = t.user_id
        WHERE t.id = $1 AND t.group_id = $2 AND ($3 OR t.user_id = $4) FOR UPDATE OF t`,
      {
        bind: [id, member.group.id, may(member, 'members-manage'), member.person.id],
        type: QueryTypes.SELECT,
        transaction,
      },
    );
    if (token === undefined) return { outcome: 'not-there' };
    if (token.revoked) return { outcome: 'already' };
    await database().query('UPDATE api_tokens SET revoked_at = now() WHERE id = $1', { bind: [id], transaction });
    const detail = { ending: token.ending, ...(token.user_id !== member.person.id && { of: token.owner }) };
    const deed = { groupId: member.group.id, actor: member.person, action: 'token-revoked' } as const;
    await record({ ...deed, subject: token.name, detail }, transaction);
    return { outcome: 'revoked', name: token.name };
  });
}
