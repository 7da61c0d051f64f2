import 'server-only';
import type { Transaction } from 'sequelize';
import { ApiToken } from '@/models/api-token';
import { Membership } from '@/models/membership';

/**
 * Takes a person out of a group, under the lock of the group. The tokens made for it are revoked, so that they do not come to
 * life again should the person come back.
 */
export async function unseat(groupId: string, userId: string, transaction: Transaction): Promise<void> {
  await Membership.destroy({ where: { groupId, userId }, transaction });
  await ApiToken.update({ revokedAt: new Date() }, { where: { groupId, userId, revokedAt: null }, transaction });
}
