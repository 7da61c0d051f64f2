import 'server-only';
import { record } from '@/lib/audit/record';
import { declined, isAnswer, type Reply } from '@/lib/compute/request';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { problemOf } from '@/lib/contracts/problem';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { Identity } from '@/models/identity';
import { changeIdentity } from './change';
import { checkWording } from './check';
import { contentOf, revisionOf, writeState } from './state';
import { numberIn, writeCheck } from './store';
import { stateOf } from './verdict';

/**
 * Checks the current revision again. The check is added to its history; the state follows it, unless the identity is withdrawn
 * or another revision was made meanwhile.
 */
export async function recheckIdentity(
  member: Member,
  key: string,
  { signal }: { readonly signal?: AbortSignal } = {},
): Promise<Reply<IdentityAnswer>> {
  const number = numberIn(member, key);
  database();
  const seen = number === undefined ? null : await Identity.findOne({ where: { groupId: member.group.id, number } });
  if (seen === null) return declined(problemOf('not-found', 'There is nothing here that you can see.'));
  const revision = await revisionOf(seen.id, seen.revision);
  const reply = await checkWording(contentOf(revision), signal);
  if (!isAnswer(reply)) return reply;
  const checked = reply.answer;
  return changeIdentity(member, key, undefined, async (held, transaction) => {
    await writeCheck(revision.id, checked, transaction);
    if (held.revision === revision.number) {
      const state = held.state === 'withdrawn' ? held.state : stateOf(checked.verdict, revision.warning);
      await writeState(held, key, { state, checked }, transaction);
    }
    await record(
      {
        groupId: member.group.id,
        actor: member.person,
        action: 'identity-checked',
        subject: key,
        detail: { revision: revision.number, verdict: checked.verdict },
      },
      transaction,
    );
    return undefined;
  });
}
