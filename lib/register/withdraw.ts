import 'server-only';
import { record } from '@/lib/audit/record';
import type { Reply } from '@/lib/compute/request';
import type { WithdrawRequest } from '@/lib/contracts/identities';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { problemOf } from '@/lib/contracts/problem';
import type { Member } from '@/lib/people/caller';
import { changeIdentity } from './change';
import { writeState } from './state';

/** Marks an identity as one that nobody should rely on. It stays where it is, with the reason. */
export const withdrawIdentity = (
  member: Member,
  key: string,
  { base, reason }: WithdrawRequest,
): Promise<Reply<IdentityAnswer>> =>
  changeIdentity(member, key, base, async (held, transaction) => {
    if (held.state === 'withdrawn')
      return problemOf('conflict', 'This identity is withdrawn already; `current` has the reason.');
    await writeState(held, key, { state: 'withdrawn', reason }, transaction);
    await record(
      {
        groupId: member.group.id,
        actor: member.person,
        action: 'identity-withdrawn',
        subject: key,
        detail: { revision: held.revision, reason },
      },
      transaction,
    );
    return undefined;
  });
