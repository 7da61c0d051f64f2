import 'server-only';
import { QueryTypes } from 'sequelize';
import { draftKey, type IdentityDraft, identityDraft } from '@/lib/contracts/identity-draft';
import { database } from '@/lib/database/connection';
import { Draft } from '@/models/draft';

/** Drafts one person may have; the oldest give way. */
const mostDrafts = 50;

/** Bytes one draft may have as JSON. */
const largestDraft = 200_000;

export interface KeptDraft {
  readonly draft: IdentityDraft;
  readonly changedAt: Date;
}

/** PostgreSQL keeps no NUL in JSON, and half of a surrogate pair neither. */
const storable = (value: unknown): unknown =>
  typeof value === 'string' ? Buffer.from(value, 'utf8').toString('utf8').replaceAll('\0', '\ufffd') : value;

/**
 * Keeps what a person has begun to write, in place of what was kept under the same key. Whatever has not the shape of a draft is
 * not kept.
 *
 * @returns whether it was kept
 */
export async function keepDraft(userId: string, key: unknown, body: unknown): Promise<boolean> {
  const place = draftKey.safeParse(key);
  const draft = identityDraft.safeParse(body);
  if (!place.success || !draft.success) return false;
  const json = JSON.stringify(draft.data, (_, value: unknown) => storable(value));
  if (Buffer.byteLength(json) > largestDraft) return false;
  await database().transaction(async (transaction) => {
    await database().query(
      `INSERT INTO drafts (user_id, key, body, changed_at) VALUES ($1, $2, $3::jsonb, now())
        ON CONFLICT (user_id, key) DO UPDATE SET body = EXCLUDED.body, changed_at = EXCLUDED.changed_at`,
      { bind: [userId, place.data, json], type: QueryTypes.INSERT, transaction },
    );
    await database().query(
      `DELETE FROM drafts WHERE user_id = $1 AND key NOT IN
        (SELECT key FROM drafts WHERE user_id = $1 ORDER BY changed_at DESC, key LIMIT ${mostDrafts})`,
      { bind: [userId], type: QueryTypes.DELETE, transaction },
    );
  });
  return true;
}

/** What is kept under a key, or undefined. One that an earlier version of the program kept in another shape is none. */
export async function openDraft(userId: string, key: string): Promise<KeptDraft | undefined> {
  database();
  const kept = await Draft.findOne({ where: { userId, key } });
  const draft = identityDraft.safeParse(kept?.body);
  return kept !== null && draft.success ? { draft: draft.data, changedAt: kept.changedAt } : undefined;
}

/** Forgets a draft: it was kept as an identity, or its writer wants it no more. */
export async function dropDraft(userId: string, key: string): Promise<void> {
  database();
  await Draft.destroy({ where: { userId, key } });
}
