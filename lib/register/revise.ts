import 'server-only';
import { record } from '@/lib/audit/record';
import { isAnswer, type Reply } from '@/lib/compute/request';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { IdentityRevision } from '@/lib/contracts/identity-content';
import type { Member } from '@/lib/people/caller';
import { changeIdentity, earlyProblem } from './change';
import { prepare } from './prepare';
import { copyIntoIdentity, writeRevision } from './store';
import { stateOf } from './verdict';

/** Makes a new revision of an identity, checked like a new one. A withdrawn identity is brought back by it. */
export async function reviseIdentity(
  member: Member,
  key: string,
  { base, change, ...content }: IdentityRevision,
  { signal }: { readonly signal?: AbortSignal } = {},
): Promise<Reply<IdentityAnswer>> {
  const early = await earlyProblem(member, key, base);
  if (early !== undefined) return early;
  const prepared = await prepare(content, signal);
  if (!isAnswer(prepared)) return prepared;
  const written = prepared.answer;
  const { verdict, degrees } = written.checked;
  return changeIdentity(member, key, base, async (held, transaction) => {
    const number = held.revision + 1;
    await writeRevision(written, { identityId: held.id, number, change }, member.person, transaction);
    const state = stateOf(verdict, content.warning);
    const now = { key, keeper: held.keeper_name, revision: number, state, verdict, degrees };
    await copyIntoIdentity(held.id, written.content, now, transaction);
    const detail = { revision: number, verdict, ...(change === undefined ? {} : { change }) };
    await record(
      { groupId: member.group.id, actor: member.person, action: 'identity-revised', subject: key, detail },
      transaction,
    );
    return undefined;
  });
}
