import 'server-only';
import { record } from '@/lib/audit/record';
import { database } from '@/lib/database/connection';
import type { Member } from './caller';
import { type Refused, refuse } from './refused';
import { hasOtherSteward, lockGroup, roleIn } from './steward';
import { unseat } from './unseat';

/** Leaves the group. The last steward stays until there is another one. */
export async function leaveGroup({ person, group: { id } }: Member): Promise<{ readonly group: string } | Refused> {
  return database().transaction(async (transaction) => {
    const group = await lockGroup(id, transaction);
    const role = await roleIn(id, person.id, transaction);
    if (group === null || role === undefined) return refuse('You are no longer in this group.');
    if (role === 'steward' && !(await hasOtherSteward(id, person.id, transaction)))
      return refuse('You are the only steward. Make another member a steward first.');
    await unseat(id, person.id, transaction);
    await record({ groupId: id, actor: person, action: 'member-left', subject: group.name }, transaction);
    return { group: group.name };
  });
}
