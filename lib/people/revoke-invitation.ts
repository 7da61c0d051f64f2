import 'server-only';
import { record } from '@/lib/audit/record';
import { Invitation } from '@/models/invitation';
import type { Member } from './caller';
import { type Refused, refuse } from './refused';
import { asSteward } from './steward';

/** Takes an invitation back that nobody has accepted yet: its link stops working. */
export async function revokeInvitation(
  member: Member,
  invitationId: string,
): Promise<{ readonly email: string } | Refused> {
  return asSteward(member, async (group, transaction) => {
    const invitation = await Invitation.findOne({
      where: { id: invitationId, groupId: group.id, acceptedAt: null, revokedAt: null },
      transaction,
      lock: true,
    });
    if (invitation === null) return refuse('This invitation is no longer open. Read the page again.');
    await invitation.update({ revokedAt: new Date() }, { transaction });
    await record(
      { groupId: group.id, actor: member.person, action: 'invitation-revoked', subject: invitation.email },
      transaction,
    );
    return { email: invitation.email };
  });
}
