import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { record } from '@/lib/audit/record';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import { roleMay } from '@/lib/permissions';
import { ApiToken } from '@/models/api-token';
import type { MemberRole } from '@/models/role';
import { type Scope, scopes as allScopes } from '@/models/scope';
import { longestLife, longestTokenName, mostTokens, shortestLife } from './limits';

export interface TokenWish {
  readonly name: string;
  readonly scopes: readonly Scope[];
  /** Days from now on which it holds. */
  readonly days: number;
}

export type TokenMade =
  | { readonly outcome: 'made'; readonly id: string; readonly secret: string; readonly expiresAt: Date }
  /** `at` says which part of the wish has to change; `token` when it is none of them. */
  | { readonly outcome: 'refused'; readonly at: 'name' | 'scopes' | 'days' | 'token'; readonly why: string };

const millisecondsADay = 24 * 3600 * 1000;
/** Characters of the end of a token that are kept, so that its owner knows it again; the rest has more than 200 random bits. */
const endingLength = 4;

/**
 * Makes a token by which a script acts for the member in the group. The secret is in what is returned and nowhere else: only
 * its hash is kept.
 */
export async function makeToken(member: Member, wish: TokenWish): Promise<TokenMade> {
  const name = wish.name.trim().normalize('NFC');
  const scopes = allScopes.filter((scope) => wish.scopes.includes(scope));
  const wrong = faultOf({ name, scopes, days: wish.days });
  if (wrong !== undefined) return wrong;
  return database().transaction(async (transaction) => {
    const role = await roleUnderLock(member, transaction);
    if (role === undefined)
      return refuse('token', 'You are no longer in this group, so no token can act for you in it.');
    if (scopes.includes('write') && !roleMay(role, 'identity-write'))
      return refuse('scopes', 'A reader changes nothing, so a token of yours cannot write. Leave out write.');
    const live = await countLive(member, transaction);
    if (live >= mostTokens)
      return refuse('token', `You have ${live} tokens that work, and ${mostTokens} are the most. Revoke one first.`);
    const secret = `qdl_${newSecret()}`;
    const made = await ApiToken.create(
      {
        groupId: member.group.id,
        userId: member.person.id,
        name,
        tokenHash: hashSecret(secret),
        ending: secret.slice(-endingLength),
        scopes,
        expiresAt: new Date(Date.now() + wish.days * millisecondsADay),
      },
      { transaction },
    );
    const deed = { groupId: member.group.id, actor: member.person, action: 'token-made', subject: name } as const;
    await record({ ...deed, detail: { scopes: scopes.join(', '), days: wish.days } }, transaction);
    return { outcome: 'made', id: made.id, secret, expiresAt: made.expiresAt };
  });
}

const refuse = (at: (TokenMade & { outcome: 'refused' })['at'], why: string): TokenMade => ({
  outcome: 'refused',
  at,
  why,
});

function faultOf({ name, scopes, days }: TokenWish): TokenMade | undefined {
  if (name === '') return refuse('name', 'Give the token a name, such as the script that will use it.');
  if ([...name].length > longestTokenName)
    return refuse('name', `A name has at most ${longestTokenName} characters; this one has ${[...name].length}.`);
  if (/[\p{Cc}\p{Cs}]/u.test(name)) return refuse('name', 'A name is one line of text without control characters.');
  if (scopes.length === 0) return refuse('scopes', 'Choose at least one thing that the token may do.');
  if (!Number.isInteger(days) || days < shortestLife || days > longestLife)
    return refuse('days', `Give a whole number of days from ${shortestLife} to ${longestLife}.`);
  return undefined;
}

/**
 * The role the member has now. Until the transaction ends the seat stays locked, so that of two tokens made at once the second
 * sees the first. The group comes first, in the order in which those who change a seat lock the two.
 */
async function roleUnderLock({ group, person }: Member, transaction: Transaction): Promise<MemberRole | undefined> {
  await database().query('SELECT 1 FROM groups WHERE id = $1 FOR KEY SHARE', { bind: [group.id], transaction });
  const [seat] = await database().query<{ role: MemberRole }>(
    'SELECT role FROM memberships WHERE group_id = $1 AND user_id = $2 FOR UPDATE',
    { bind: [group.id, person.id], type: QueryTypes.SELECT, transaction },
  );
  return seat?.role;
}

async function countLive({ group, person }: Member, transaction: Transaction): Promise<number> {
  const [row] = await database().query<{ live: number }>(
    `SELECT count(*)::int AS live FROM api_tokens
      WHERE group_id = $1 AND user_id = $2 AND revoked_at IS NULL AND expires_at > now()`,
    { bind: [group.id, person.id], type: QueryTypes.SELECT, transaction },
  );
  return row?.live ?? 0;
}
