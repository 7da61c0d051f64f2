import 'server-only';
import { createHash } from 'node:crypto';
import { QueryTypes, type Transaction } from 'sequelize';
import { problemOf, type Problem } from '@/lib/contracts/problem';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';

/** What a request made, if its key was used within the last day. */
export type Used = { readonly number: number } | { readonly problem: Problem } | undefined;

/** A request told from others: the same content has the same digest, in whatever order its keys came. */
export const digestOf = (content: Readonly<Record<string, unknown>>): string =>
  createHash('sha256')
    .update(JSON.stringify(Object.entries(content).sort(([a], [b]) => (a < b ? -1 : 1))))
    .digest('hex');

/** What was made under a key. A key that came with another request is a problem. */
export async function usedKey(member: Member, key: string, digest: string, transaction?: Transaction): Promise<Used> {
  const [row] = await database().query<{ request_digest: string; number: number }>(
    `SELECT k.request_digest, i.number FROM idempotency_keys k JOIN identities i ON i.id = k.identity_id
      WHERE k.user_id = $1 AND k.group_id = $2 AND k.key = $3 AND k.created_at > now() - interval '1 day'`,
    { bind: [member.person.id, member.group.id, key], type: QueryTypes.SELECT, transaction },
  );
  if (row === undefined) return undefined;
  if (row.request_digest === digest) return { number: row.number };
  return {
    problem: problemOf('idempotency-key', 'This Idempotency-Key came with another request before. Take a new one.'),
  };
}

/** Remembers what a request made, and forgets what was made more than a day ago. */
export async function rememberKey(
  member: Member,
  { key, digest, identityId }: { readonly key: string; readonly digest: string; readonly identityId: string },
  transaction: Transaction,
): Promise<void> {
  const owner = [member.person.id, member.group.id];
  await database().query(
    `DELETE FROM idempotency_keys WHERE user_id = $1 AND group_id = $2 AND created_at <= now() - interval '1 day'`,
    { bind: owner, transaction },
  );
  await database().query(
    'INSERT INTO idempotency_keys (user_id, group_id, key, request_digest, identity_id) VALUES ($1, $2, $3, $4, $5)',
    { bind: [...owner, key, digest, identityId], transaction },
  );
}
