import 'server-only';
import type { Transaction } from 'sequelize';
import type { RevisionContent } from '@/lib/contracts/identity-content';
import { database } from '@/lib/database/connection';
import type { IdentityState } from '@/models/identity-words';
import { Revision } from '@/models/revision';
import type { Checked } from './check';
import { type Held, vectorSql, weighedWords } from './store';

/** What a revision that is kept says. */
export const contentOf = (revision: Revision): RevisionContent => ({
  name: revision.name,
  kind: revision.kind,
  field: revision.field,
  statement: revision.statement,
  hypotheses: revision.hypotheses,
  place: revision.place ?? undefined,
  uniformizer: revision.uniformizer ?? undefined,
  value: revision.value ?? undefined,
  warning: revision.warning,
  reference: revision.reference ?? undefined,
  doi: revision.doi ?? undefined,
  arxiv: revision.arxiv ?? undefined,
  tags: revision.tags,
  remark: revision.remark ?? undefined,
});

/** One revision of an identity that is there. */
export function revisionOf(identityId: string, number: number, transaction?: Transaction): Promise<Revision> {
  database();
  return Revision.findOne({ where: { identityId, number }, rejectOnEmpty: true, transaction });
}

/** Gives an identity another state, and the last check if there was one. The word for the state can be searched for. */
export async function writeState(
  held: Held,
  key: string,
  now: { readonly state: IdentityState; readonly reason?: string; readonly checked?: Checked },
  transaction: Transaction,
): Promise<void> {
  const content = contentOf(await revisionOf(held.id, held.revision, transaction));
  const { state, reason, checked } = now;
  await database().query(
    `UPDATE identities
        SET state = $2, withdrawn_reason = CASE WHEN $2 = 'withdrawn' THEN coalesce($3, withdrawn_reason) END,
            changed_at = CASE WHEN state = $2 THEN changed_at ELSE now() END,
            verdict = coalesce($4, verdict), degrees = coalesce($5::int[], degrees), words = ${vectorSql(6)}
      WHERE id = $1`,
    {
      bind: [
        held.id,
        state,
        reason ?? null,
        checked?.verdict ?? null,
        checked?.degrees ?? null,
        ...weighedWords({ ...content, key, keeper: held.keeper_name, state }),
      ],
      transaction,
    },
  );
}
