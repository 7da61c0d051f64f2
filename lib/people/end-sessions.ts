import 'server-only';
import type { Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';
import { PasswordReset } from '@/models/password-reset';
import { User } from '@/models/user';

/** Ends every session of a person at once: the ones there are carry the version before. Returns the new version. */
export async function endSessions(userId: string): Promise<number> {
  return database().transaction(async (transaction) => {
    const user = await User.findByPk(userId, { transaction, lock: true, rejectOnEmpty: true });
    await user.update({ sessionVersion: user.sessionVersion + 1 }, { transaction });
    return user.sessionVersion;
  });
}

/** Gives a locked account a new password. Sessions end, and links to set a password that were sent before stop working. */
export async function replacePassword(user: User, passwordHash: string, transaction: Transaction): Promise<void> {
  await user.update({ passwordHash, sessionVersion: user.sessionVersion + 1 }, { transaction });
  await PasswordReset.update({ usedAt: new Date() }, { where: { userId: user.id, usedAt: null }, transaction });
}
