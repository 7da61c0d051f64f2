import 'server-only';
import { QueryTypes } from 'sequelize';
import { declined, type Reply } from '@/lib/compute/request';
import {
  type CheckAnswer,
  checkEvidence,
  type CheckEvidence,
  type IdentityAnswer,
} from '@/lib/contracts/identity-answer';
import { partsOfKey } from '@/lib/contracts/identity-key';
import { problemOf } from '@/lib/contracts/problem';
import { database } from '@/lib/database/connection';
import type { Caller } from '@/lib/people/caller';
import type { CheckVerdict } from '@/models/identity-words';
import {
  identityColumns,
  type IdentityRow,
  lastCheck,
  revisionAnswerOf,
  revisionColumns,
  type RevisionRow,
  summaryOf,
} from './present';
import { plainSentence } from './verdict';

type Row = IdentityRow & { readonly id: string; readonly revision_id: string; readonly current: number };

/**
 * An identity as the caller may see it, at a revision or at the current one: one of the caller's own group, or a public one.
 * Undefined for what is not there and for what is not the caller's to see, which is the same.
 */
export async function openIdentity(
  caller: Caller,
  key: string,
  revision?: number,
): Promise<IdentityAnswer | undefined> {
  const parts = partsOfKey(key);
  if (parts === undefined) return undefined;
  const [row] = await database().query<Row>(
    `SELECT i.id, i.revision AS current, r.id AS revision_id, ${identityColumns}, ${revisionColumns}
       FROM groups g
       JOIN identities i ON i.group_id = g.id
       JOIN revisions r ON r.identity_id = i.id AND r.number = coalesce($3, i.revision)
       ${lastCheck}
      WHERE g.slug = $1 AND i.number = $2 AND (i.visibility = 'public' OR i.group_id = $4)`,
    {
      bind: [parts.slug, parts.number, revision ?? null, caller.kind === 'member' ? caller.group.id : null],
      type: QueryTypes.SELECT,
    },
  );
  if (row === undefined) return undefined;
  const [revisions, checks, evidence] = await Promise.all([
    revisionsOf(row.id),
    checksOf(row.id),
    evidenceOf(row.revision_id),
  ]);
  return {
    ...summaryOf(row),
    current: row.current,
    revisions: revisions.map(revisionAnswerOf),
    checks,
    ...(evidence === undefined ? {} : { evidence }),
  };
}

/** The answer after something was done to an identity. */
export async function answerOf(caller: Caller, key: string, revision?: number): Promise<Reply<IdentityAnswer>> {
  const answer = await openIdentity(caller, key, revision);
  return answer === undefined
    ? declined(problemOf('not-found', 'There is nothing here that you can see.'))
    : { status: 200, answer };
}

const revisionsOf = (identityId: string): Promise<RevisionRow[]> =>
  database().query<RevisionRow>(
    `SELECT ${revisionColumns} FROM revisions r ${lastCheck} WHERE r.identity_id = $1 ORDER BY r.number DESC`,
    { bind: [identityId], type: QueryTypes.SELECT },
  );

interface CheckRow {
  readonly number: number;
  readonly verdict: CheckVerdict;
  readonly engine: string;
  readonly created_at: Date;
  readonly duration_ms: number;
  readonly sentence: string | null;
}

async function checksOf(identityId: string): Promise<CheckAnswer[]> {
  const rows = await database().query<CheckRow>(
    `SELECT r.number, k.verdict, k.engine, k.created_at, k.duration_ms, k.evidence->>'sentence' AS sentence
       FROM checks k JOIN revisions r ON r.id = k.revision_id
      WHERE r.identity_id = $1 ORDER BY k.id DESC LIMIT 100`,
    { bind: [identityId], type: QueryTypes.SELECT },
  );
  return rows.map(({ number, verdict, engine, created_at, duration_ms, sentence }) => ({
    revision: number,
    verdict,
    engine,
    at: created_at.toISOString(),
    durationMs: duration_ms,
    sentence: sentence ?? plainSentence[verdict],
  }));
}

/** The evidence of the last check; undefined where an older version kept it in another shape. */
async function evidenceOf(revisionId: string): Promise<CheckEvidence | undefined> {
  const [row] = await database().query<{ evidence: unknown }>(
    'SELECT evidence FROM checks WHERE revision_id = $1 ORDER BY id DESC LIMIT 1',
    { bind: [revisionId], type: QueryTypes.SELECT },
  );
  return checkEvidence.safeParse(row?.evidence).data;
}
