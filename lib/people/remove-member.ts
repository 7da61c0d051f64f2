import 'server-only';
import { record } from '@/lib/audit/record';
import { User } from '@/models/user';
import type { Member } from './caller';
import { type Refused, refuse } from './refused';
import { asSteward, hasOtherSteward, roleIn } from './steward';
import { unseat } from './unseat';

/** Removes a member from the steward's group. What the person kept stays in the register. */
export async function removeMember(member: Member, userId: string): Promise<{ readonly name: string } | Refused> {
  return asSteward(member, async (group, transaction) => {
    const role = await roleIn(group.id, userId, transaction);
    if (role === undefined) return refuse('This person is no longer in the group.');
    if (role === 'steward' && !(await hasOtherSteward(group.id, userId, transaction)))
      return refuse('A group needs a steward. Make another member a steward first.');
    const person = await User.findByPk(userId, { transaction, rejectOnEmpty: true });
    await unseat(group.id, userId, transaction);
    await record(
      {
        groupId: group.id,
        actor: member.person,
        action: 'member-removed',
        subject: person.name,
        detail: { email: person.email, role },
      },
      transaction,
    );
    return { name: person.name };
  });
}
