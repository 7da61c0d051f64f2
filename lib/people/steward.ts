import 'server-only';
import type { Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';
import { Group } from '@/models/group';
import { Membership } from '@/models/membership';
import type { MemberRole } from '@/models/role';
import type { Member } from './caller';
import { type Refused, refuse } from './refused';

/**
 * Locks the row of a group until the transaction ends. Whatever changes who is in a group, and as what, does so under this
 * lock, so that what it has counted still holds when it writes. Identities can be kept meanwhile.
 */
export async function lockGroup(groupId: string, transaction: Transaction): Promise<Group | null> {
  return Group.findByPk(groupId, { transaction, lock: transaction.LOCK.NO_KEY_UPDATE });
}

export async function roleIn(
  groupId: string,
  userId: string,
  transaction: Transaction,
): Promise<MemberRole | undefined> {
  const membership = await Membership.findOne({ where: { groupId, userId }, transaction });
  return membership?.role;
}

/** Whether the group has a steward beside this person. Asked under the lock of the group. */
export async function hasOtherSteward(groupId: string, userId: string, transaction: Transaction): Promise<boolean> {
  const stewards = await Membership.findAll({ where: { groupId, role: 'steward' }, transaction });
  return stewards.some((steward) => steward.userId !== userId);
}

/** Runs what only stewards may do, in a transaction of its own under the lock of the group, if the member still is one. */
export async function asSteward<Outcome>(
  member: Member,
  run: (group: Group, transaction: Transaction) => Promise<Outcome | Refused>,
): Promise<Outcome | Refused> {
  return database().transaction(async (transaction) => {
    const group = await lockGroup(member.group.id, transaction);
    const role = await roleIn(member.group.id, member.person.id, transaction);
    if (group === null || role !== 'steward') return refuse('You are no longer a steward of this group.');
    return run(group, transaction);
  });
}
