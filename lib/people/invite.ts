import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { record } from '@/lib/audit/record';
import { waitWords } from '@/lib/contracts/wait';
import { database } from '@/lib/database/connection';
import { enqueue } from '@/lib/jobs/enqueue';
import { Invitation } from '@/models/invitation';
import type { MemberRole } from '@/models/role';
import type { Member } from './caller';
import { type Refused, refuse } from './refused';
import { asSteward } from './steward';
import { attempt } from './throttle';

const invitationDays = 7;

/**
 * Invites an address into the group with a role. An earlier invitation of the same address is taken back, so that one link
 * works. The mail is a job of the same transaction.
 */
export async function invite(
  member: Member,
  { email, role }: { readonly email: string; readonly role: MemberRole },
): Promise<{ readonly invitationId: string } | Refused> {
  const seconds = await attempt('invite-group', member.group.id);
  if (seconds !== undefined) return refuse(waitWords(seconds));
  return asSteward(member, async (group, transaction) => {
    const seat = await seatOfAddress(group.id, email, transaction);
    if (seat !== undefined) return refuse(`${seat.name} is in this group already, as ${seat.role}.`, 'email');
    await Invitation.update(
      { revokedAt: new Date() },
      { where: { groupId: group.id, email, acceptedAt: null, revokedAt: null }, transaction },
    );
    const invitation = await Invitation.create(
      {
        groupId: group.id,
        email,
        role,
        invitedBy: member.person.id,
        expiresAt: new Date(Date.now() + invitationDays * 24 * 3600 * 1000),
      },
      { transaction },
    );
    await record(
      { groupId: group.id, actor: member.person, action: 'member-invited', subject: email, detail: { role } },
      transaction,
    );
    await enqueue('mail-invitation', { invitationId: invitation.id }, transaction);
    return { invitationId: invitation.id };
  });
}

async function seatOfAddress(
  groupId: string,
  email: string,
  transaction: Transaction,
): Promise<{ readonly name: string; readonly role: MemberRole } | undefined> {
  const [seat] = await database().query<{ name: string; role: MemberRole }>(
    `SELECT u.name, m.role FROM memberships m JOIN users u ON u.id = m.user_id
      WHERE m.group_id = $1 AND u.email = $2`,
    { bind: [groupId, email], type: QueryTypes.SELECT, transaction },
  );
  return seat;
}
