import 'server-only';
import { database } from '@/lib/database/connection';
import { User } from '@/models/user';
import { replacePassword } from './end-sessions';
import { findReset } from './open-reset';
import { hashPassword } from './passwords';
import { type Refused, refuse } from './refused';
import { forgive } from './throttle';

const noLongerOpen = 'This link no longer works. Ask for a new one; it is good for an hour.';

/** Sets a new password by a link from a mail, once. Every session of the person ends. */
export async function setPassword(
  token: string,
  password: string,
): Promise<{ readonly userId: string; readonly sessionVersion: number } | Refused> {
  const seen = await findReset(token);
  if (seen.state !== 'open') return refuse(noLongerOpen);
  const passwordHash = await hashPassword(password);
  const outcome = await database().transaction(async (transaction) => {
    // All that a link changes belongs to one account, so its row is the lock.
    const user = await User.findByPk(seen.userId, { transaction, lock: true, rejectOnEmpty: true });
    const reset = await findReset(token, transaction);
    if (reset.state !== 'open') return refuse(noLongerOpen);
    await replacePassword(user, passwordHash, transaction);
    return { userId: user.id, sessionVersion: user.sessionVersion };
  });
  // Whoever reads the mail of an account is not locked out of it by those who guess.
  if (!('refused' in outcome)) await forgive('sign-in-account', seen.email);
  return outcome;
}
