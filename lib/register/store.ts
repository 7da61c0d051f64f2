import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import type { RevisionContent } from '@/lib/contracts/identity-content';
import { partsOfKey } from '@/lib/contracts/identity-key';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { Check } from '@/models/check';
import type { CheckVerdict, IdentityState } from '@/models/identity-words';
import { Revision } from '@/models/revision';
import type { Checked } from './check';
import type { TypesetWording } from './wording';
import { searchable } from './words';

/** A revision as it is kept: its texts read, its verdict known. */
export interface Written {
  readonly content: RevisionContent;
  readonly typeset: TypesetWording;
  readonly checked: Checked;
}

/** Writes a revision with its first check. */
export async function writeRevision(
  { content, typeset, checked }: Written,
  at: { readonly identityId: string; readonly number: number; readonly change?: string },
  author: Member['person'],
  transaction: Transaction,
): Promise<void> {
  database();
  const revision = await Revision.create(
    { ...content, ...at, typeset, authorId: author.id, authorName: author.name },
    { transaction },
  );
  await writeCheck(revision.id, checked, transaction);
}

/** Adds a check to the history of a revision. */
export async function writeCheck(revisionId: string, checked: Checked, transaction: Transaction): Promise<void> {
  database();
  const { verdict, engine, durationMs, evidence } = checked;
  await Check.create({ revisionId, verdict, engine, durationMs, evidence }, { transaction });
}

/** An identity that this transaction holds: nobody changes it before the end. */
export interface Held {
  readonly id: string;
  readonly number: number;
  readonly revision: number;
  readonly state: IdentityState;
  readonly visibility: string;
  readonly keeper_name: string;
}

/** Locks an identity of the member's group; undefined when there is none under this key. */
export async function holdIdentity(member: Member, key: string, transaction: Transaction): Promise<Held | undefined> {
  const number = numberIn(member, key);
  if (number === undefined) return undefined;
  const [held] = await database().query<Held>(
    `SELECT id, number, revision, state, visibility, keeper_name FROM identities
      WHERE group_id = $1 AND number = $2 FOR UPDATE`,
    { bind: [member.group.id, number], type: QueryTypes.SELECT, transaction },
  );
  return held;
}

/** The number of an identity of the member's group; undefined for a key of another group. */
export function numberIn(member: Member, key: string): number | undefined {
  const parts = partsOfKey(key);
  return parts?.slug === member.group.slug ? parts.number : undefined;
}

/** Everything of a revision that the register is searched by. */
interface Sought extends Pick<
  RevisionContent,
  'name' | 'statement' | 'hypotheses' | 'place' | 'value' | 'reference' | 'doi' | 'arxiv' | 'tags' | 'remark'
> {
  readonly key: string;
  readonly keeper: string;
  readonly state: IdentityState;
}

/** The words of an identity, heaviest first: for the weights A, B, C and D of the search vector. */
export function weighedWords(sought: Sought): readonly [string, string, string, string] {
  const { name, tags, statement, place, value, hypotheses, reference, doi, arxiv, remark, key, keeper, state } = sought;
  const join = (...texts: (string | undefined)[]) => searchable(texts.filter(Boolean).join(' '));
  return [
    join(name),
    join(...tags),
    join(statement, place, value, ...hypotheses),
    join(reference, doi, arxiv, remark, key, keeper, state),
  ];
}

/** SQL for the search vector of four binds, from `first` on. */
export const vectorSql = (first: number): string =>
  ['A', 'B', 'C', 'D']
    .map((weight, index) => `setweight(to_tsvector('simple', $${first + index}), '${weight}')`)
    .join(' || ');

/** Copies what the register is searched, filtered and sorted by from the current revision into the row of the identity. */
export async function copyIntoIdentity(
  identityId: string,
  content: RevisionContent,
  now: {
    readonly key: string;
    readonly keeper: string;
    readonly revision: number;
    readonly state: IdentityState;
    readonly verdict: CheckVerdict;
    readonly degrees: readonly number[];
  },
  transaction: Transaction,
): Promise<void> {
  await database().query(
    `UPDATE identities
        SET name = $2, kind = $3, field = $4, tags = $5, revision = $6, state = $7, verdict = $8, degrees = $9,
            withdrawn_reason = NULL, changed_at = now(), words = ${vectorSql(10)}
      WHERE id = $1`,
    {
      bind: [
        identityId,
        content.name,
        content.kind,
        content.field,
        content.tags,
        now.revision,
        now.state,
        now.verdict,
        now.degrees,
        ...weighedWords({ ...content, ...now }),
      ],
      transaction,
    },
  );
}
