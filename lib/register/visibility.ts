import 'server-only';
import { record } from '@/lib/audit/record';
import type { Reply } from '@/lib/compute/request';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import type { Visibility } from '@/models/identity-words';
import { changeIdentity } from './change';

/** Shows an identity to the group alone or to anyone who has its address. */
export const changeVisibility = (member: Member, key: string, visibility: Visibility): Promise<Reply<IdentityAnswer>> =>
  changeIdentity(member, key, undefined, async (held, transaction) => {
    if (held.visibility === visibility) return undefined;
    await database().query('UPDATE identities SET visibility = $2 WHERE id = $1', {
      bind: [held.id, visibility],
      transaction,
    });
    await record(
      {
        groupId: member.group.id,
        actor: member.person,
        action: 'identity-shown',
        subject: key,
        detail: { visibility },
      },
      transaction,
    );
    return undefined;
  });
