import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { record } from '@/lib/audit/record';
import { hidden } from '@/lib/contracts/plain-text';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { type Refused, refuse } from '@/lib/people/refused';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import { ApiToken } from '@/models/api-token';
import type { MemberRole } from '@/models/role';
import { scopes as allScopes } from '@/models/scope';
import { longestLife, longestTokenName, mostTokens, shortestLife } from './limits';
import { scopesOf } from './scopes';

export interface TokenWish {
  readonly name: string;
  /** Of the scopes those that the token is to have; other words are none. */
  readonly scopes: readonly string[];
  /** Days from now on which it holds. */
  readonly days: number;
}

export interface TokenMade {
  readonly id: string;
  readonly name: string;
  /** The token itself, here and nowhere else. */
  readonly secret: string;
  readonly expiresAt: Date;
}

const millisecondsADay = 24 * 3600 * 1000;
/** Characters of the end of a token that are kept, so that its owner knows it again; the rest has more than 200 random bits. */
const endingLength = 4;

/**
 * Makes a token by which a script acts for the member in the group. The secret is in what is returned and nowhere else: only
 * its hash is kept.
 */
export async function makeToken(member: Member, wish: TokenWish): Promise<TokenMade | Refused> {
  const name = wish.name.trim().normalize('NFC');
  const scopes = allScopes.filter((scope) => wish.scopes.includes(scope));
  const wrong = faultOf({ name, scopes, days: wish.days });
  if (wrong !== undefined) return wrong;
  return database().transaction(async (transaction) => {
    const role = await roleUnderLock(member, transaction);
    if (role === undefined) return refuse('You are no longer in this group, so no token can act for you in it.');
    if (!scopes.every((scope) => scopesOf(role).includes(scope)))
      return refuse('A reader changes nothing, so a token of yours cannot write. Leave out write.', 'scopes');
    const live = await countLive(member, transaction);
    if (live >= mostTokens)
      return refuse(`You have ${live} tokens that work, and ${mostTokens} are the most. Revoke one first.`);
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
    return { id: made.id, name, secret, expiresAt: made.expiresAt };
  });
}

function faultOf({ name, scopes, days }: TokenWish): Refused | undefined {
  if (name === '') return refuse('Give the token a name, such as the script that will use it.', 'name');
  if ([...name].length > longestTokenName)
    return refuse(`A name has at most ${longestTokenName} characters; this one has ${[...name].length}.`, 'name');
  if (hidden.test(name)) return refuse('A name is one line of text without control characters.', 'name');
  if (scopes.length === 0) return refuse('Choose at least one thing that the token may do.', 'scopes');
  if (!Number.isInteger(days) || days < shortestLife || days > longestLife)
    return refuse(`Give a whole number of days from ${shortestLife} to ${longestLife}.`, 'days');
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
