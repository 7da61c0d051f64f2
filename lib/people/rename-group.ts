import 'server-only';
import { record } from '@/lib/audit/record';
import type { Member } from './caller';
import type { Refused } from './refused';
import { asSteward } from './steward';

/** Gives the group another name. Its short name stays, because keys of identities begin with it. */
export async function renameGroup(member: Member, name: string): Promise<{ readonly name: string } | Refused> {
  return asSteward(member, async (group, transaction) => {
    const before = group.name;
    if (before === name) return { name };
    await group.update({ name }, { transaction });
    await record(
      { groupId: group.id, actor: member.person, action: 'group-renamed', subject: name, detail: { from: before } },
      transaction,
    );
    return { name };
  });
}
