import 'server-only';
import { Declined } from '@/lib/compute/declined';
import type { CheckSummary, IdentitySummary, RevisionAnswer } from '@/lib/contracts/identity-answer';
import { keyOf } from '@/lib/contracts/identity-key';
import type { CheckVerdict, IdentityKind, IdentityState, Visibility } from '@/models/identity-words';
import { texText } from './escape-tex';
import { plainSentence } from './verdict';
import { readWording, type TypesetWording, typesetWording } from './wording';

/** Columns of a revision `r` and of its last check `c`, as the rows below have them. */
export const revisionColumns = `r.number AS revision, r.name, r.kind, r.field, r.statement, r.hypotheses, r.place,
  r.uniformizer, r.value, r.warning, r.reference, r.doi, r.arxiv, r.tags, r.remark, r.typeset, r.change, r.author_name,
  r.created_at AS written_at, c.verdict AS check_verdict, c.engine AS check_engine, c.created_at AS check_at,
  c.duration_ms AS check_ms, c.sentence AS check_sentence`;

/** Joins the last check of the revision `r`. */
export const lastCheck = `LEFT JOIN LATERAL (
  SELECT k.verdict, k.engine, k.created_at, k.duration_ms, k.evidence->>'sentence' AS sentence
    FROM checks k WHERE k.revision_id = r.id ORDER BY k.id DESC LIMIT 1) c ON true`;

export interface RevisionRow {
  readonly revision: number;
  readonly name: string;
  readonly kind: IdentityKind;
  readonly field: string;
  readonly statement: string;
  readonly hypotheses: readonly string[];
  readonly place: string | null;
  readonly uniformizer: string | null;
  readonly value: string | null;
  readonly warning: boolean;
  readonly reference: string | null;
  readonly doi: string | null;
  readonly arxiv: string | null;
  readonly tags: string[];
  readonly remark: string | null;
  readonly typeset: unknown;
  readonly change: string | null;
  readonly author_name: string;
  readonly written_at: Date;
  readonly check_verdict: CheckVerdict | null;
  readonly check_engine: string | null;
  readonly check_at: Date | null;
  readonly check_ms: number | null;
  readonly check_sentence: string | null;
}

/** Columns of an identity `i` of the group `g`. */
export const identityColumns = `i.number, i.state, i.visibility, i.keeper_name, i.created_at, i.changed_at, i.degrees,
  i.withdrawn_reason, g.name AS group_name, g.slug`;

export interface IdentityRow extends RevisionRow {
  readonly number: number;
  readonly state: IdentityState;
  readonly visibility: Visibility;
  readonly keeper_name: string;
  readonly created_at: Date;
  readonly changed_at: Date;
  readonly degrees: number[];
  readonly withdrawn_reason: string | null;
  readonly group_name: string;
  readonly slug: string;
}

export const summaryOf = (row: IdentityRow): IdentitySummary => ({
  key: keyOf(row.slug, row.number),
  number: row.number,
  group: { name: row.group_name, slug: row.slug },
  revision: row.revision,
  state: row.state,
  visibility: row.visibility,
  ...wordingOf(row),
  degrees: row.degrees,
  keeper: row.keeper_name,
  createdAt: row.created_at.toISOString(),
  changedAt: row.changed_at.toISOString(),
  ...given({ withdrawnReason: row.withdrawn_reason }),
});

export const revisionAnswerOf = (row: RevisionRow): RevisionAnswer => ({
  number: row.revision,
  author: row.author_name,
  at: row.written_at.toISOString(),
  ...given({ change: row.change }),
  ...wordingOf(row),
});

function wordingOf(row: RevisionRow) {
  const tex = typesetOf(row);
  const set = (text: string | null, inTex = '') => (text === null ? undefined : { text, tex: inTex });
  return {
    kind: row.kind,
    name: row.name,
    field: { text: row.field, tex: tex.field },
    statement: { text: row.statement, tex: tex.statement },
    hypotheses: row.hypotheses.map((text, index) => ({ text, tex: tex.hypotheses[index] ?? texText(text) })),
    ...given({
      place: set(row.place, tex.place),
      uniformizer: set(row.uniformizer, tex.uniformizer),
      value: set(row.value, tex.value),
    }),
    warning: row.warning,
    ...given({ reference: row.reference, doi: row.doi, arxiv: row.arxiv, remark: row.remark }),
    tags: row.tags,
    ...given({ lastCheck: checkOf(row) }),
  };
}

function checkOf(row: RevisionRow): CheckSummary | undefined {
  const { check_verdict: verdict, check_engine: engine, check_at: at, check_ms: durationMs, check_sentence } = row;
  if (verdict === null || engine === null || at === null || durationMs === null) return undefined;
  return { verdict, engine, at: at.toISOString(), durationMs, sentence: check_sentence ?? plainSentence[verdict] };
}

/** What is kept set, or set now where it was not kept. A text that this grammar no longer reads is shown as it stands. */
function typesetOf(row: RevisionRow): TypesetWording {
  const kept = typesetWording.safeParse(row.typeset);
  if (kept.success) return kept.data;
  const { kind, field, statement, hypotheses, place, uniformizer, value } = row;
  const texts = { place: place ?? undefined, uniformizer: uniformizer ?? undefined, value: value ?? undefined };
  try {
    return readWording({ kind, field, statement, hypotheses: [...hypotheses], ...texts }).typeset;
  } catch (error) {
    if (!(error instanceof Declined)) throw error;
    const plain = (text: string | null) => (text === null ? undefined : `\\text{${texText(text)}}`);
    return {
      field: plain(field) ?? '',
      statement: plain(statement) ?? '',
      hypotheses: hypotheses.map((text) => plain(text) ?? ''),
      ...given({ place: plain(place), uniformizer: plain(uniformizer), value: plain(value) }),
    };
  }
}

type Present<T> = { [K in keyof T]?: Exclude<T[K], null | undefined> };

/** Only those keys that have a value. */
const given = <T extends object>(values: T): Present<T> =>
  Object.fromEntries(Object.entries(values).filter(([, value]) => value !== null && value !== undefined)) as Present<T>;
