import 'server-only';
import { record } from '@/lib/audit/record';
import { Membership } from '@/models/membership';
import type { MemberRole } from '@/models/role';
import { User } from '@/models/user';
import type { Member } from './caller';
import { type Refused, refuse } from './refused';
import { asSteward, hasOtherSteward } from './steward';

/** Gives a member of the steward's group another role. A group always keeps a steward. */
export async function changeRole(
  member: Member,
  { userId, role }: { readonly userId: string; readonly role: MemberRole },
): Promise<{ readonly name: string; readonly role: MemberRole } | Refused> {
  return asSteward(member, async (group, transaction) => {
    const seat = await Membership.findOne({ where: { groupId: group.id, userId }, transaction });
    if (seat === null) return refuse('This person is no longer in the group.');
    const person = await User.findByPk(userId, { transaction, rejectOnEmpty: true });
    const before = seat.role;
    if (before === role) return { name: person.name, role };
    if (before === 'steward' && !(await hasOtherSteward(group.id, userId, transaction)))
      return refuse('A group needs a steward. Make another member a steward first.', 'role');
    await seat.update({ role }, { transaction });
    await record(
      {
        groupId: group.id,
        actor: member.person,
        action: 'role-changed',
        subject: person.name,
        detail: { from: before, to: role },
      },
      transaction,
    );
    return { name: person.name, role };
  });
}
