import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { record } from '@/lib/audit/record';
import { declined, isAnswer, type Reply } from '@/lib/compute/request';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { IdentityContent } from '@/lib/contracts/identity-content';
import { keyOf } from '@/lib/contracts/identity-key';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import type { Visibility } from '@/models/identity-words';
import { digestOf, rememberKey, usedKey } from './idempotency';
import { answerOf } from './open';
import { prepare } from './prepare';
import { seatProblem } from './seat';
import { vectorSql, weighedWords, type Written, writeRevision } from './store';
import { stateOf } from './verdict';

/**
 * Keeps an identity in the register of the member's group: reads it, checks it, and writes it down with its number, its first
 * revision, the check and the event, all or nothing. Under an idempotency key the same content makes one identity.
 */
export async function keepIdentity(
  member: Member,
  given: IdentityContent,
  { idempotencyKey, signal }: { readonly idempotencyKey?: string; readonly signal?: AbortSignal } = {},
): Promise<Reply<IdentityAnswer>> {
  const request = idempotencyKey === undefined ? undefined : { key: idempotencyKey, digest: digestOf(given) };
  const used = request && (await usedKey(member, request.key, request.digest));
  if (used !== undefined) return 'problem' in used ? declined(used.problem) : firstRevision(member, used.number);
  const { visibility, ...content } = given;
  const prepared = await prepare(content, signal);
  if (!isAnswer(prepared)) return prepared;
  const kept = await database().transaction(async (transaction) => {
    const number = await lockNextNumber(member.group.id, transaction);
    const problem = await seatProblem(member, transaction);
    if (problem !== undefined) return { problem };
    // Whoever sent the same request at the same time has held the lock before.
    const meanwhile = request && (await usedKey(member, request.key, request.digest, transaction));
    if (meanwhile !== undefined) return meanwhile;
    const identityId = await writeIdentity(member, { number, visibility }, prepared.answer, transaction);
    if (request !== undefined) await rememberKey(member, { ...request, identityId }, transaction);
    return { number };
  });
  return 'problem' in kept ? declined(kept.problem) : firstRevision(member, kept.number);
}

const firstRevision = (member: Member, number: number): Promise<Reply<IdentityAnswer>> =>
  answerOf(member, keyOf(member.group.slug, number), 1);

/** The next number of a group; nobody else gets one before the end of the transaction. */
async function lockNextNumber(groupId: string, transaction: Transaction): Promise<number> {
  const [row] = await database().query<{ next_number: number }>(
    'SELECT next_number FROM groups WHERE id = $1 FOR NO KEY UPDATE',
    { bind: [groupId], type: QueryTypes.SELECT, transaction },
  );
  return row?.next_number ?? 0;
}

async function writeIdentity(
  { group, person }: Member,
  { number, visibility }: { readonly number: number; readonly visibility: Visibility },
  written: Written,
  transaction: Transaction,
): Promise<string> {
  const { content, checked } = written;
  const key = keyOf(group.slug, number);
  const state = stateOf(checked.verdict, content.warning);
  await database().query('UPDATE groups SET next_number = $2 WHERE id = $1', {
    bind: [group.id, number + 1],
    transaction,
  });
  const [row] = await database().query<{ id: string }>(
    `INSERT INTO identities (group_id, number, revision, state, visibility, keeper_id, keeper_name, name, kind, field,
                             degrees, tags, verdict, words)
     VALUES ($1, $2, 1, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, ${vectorSql(13)}) RETURNING id`,
    {
      bind: [
        group.id,
        number,
        state,
        visibility,
        person.id,
        person.name,
        content.name,
        content.kind,
        content.field,
        checked.degrees,
        content.tags,
        checked.verdict,
        ...weighedWords({ ...content, key, keeper: person.name, state }),
      ],
      type: QueryTypes.SELECT,
      transaction,
    },
  );
  if (row === undefined) throw new Error('The row of a new identity has no id.');
  await writeRevision(written, { identityId: row.id, number: 1 }, person, transaction);
  const detail = { name: content.name, verdict: checked.verdict };
  await record({ groupId: group.id, actor: person, action: 'identity-kept', subject: key, detail }, transaction);
  return row.id;
}
