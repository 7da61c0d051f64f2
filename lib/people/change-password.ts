import 'server-only';
import { waitWords } from '@/lib/contracts/wait';
import { database } from '@/lib/database/connection';
import { User } from '@/models/user';
import { replacePassword } from './end-sessions';
import { hashPassword, isPassword } from './passwords';
import { type Refused, refuse } from './refused';
import { attempt, forgive } from './throttle';

const wrong = 'This is not your password as it is now.';

/**
 * Changes the password of someone who knows it, and ends every session. Guesses count as those at the door do. Returns the
 * new version, with which this browser can be let in again.
 */
export async function changePassword(
  person: { readonly id: string; readonly email: string },
  { current, next }: { readonly current: string; readonly next: string },
): Promise<{ readonly sessionVersion: number } | Refused> {
  const seconds = await attempt('sign-in-account', person.email);
  if (seconds !== undefined) return refuse(waitWords(seconds), 'current');
  database();
  const seen = await User.findByPk(person.id, { rejectOnEmpty: true });
  if (!(await isPassword(current, seen.passwordHash))) return refuse(wrong, 'current');
  await forgive('sign-in-account', person.email);
  const passwordHash = await hashPassword(next);
  return database().transaction(async (transaction) => {
    const user = await User.findByPk(person.id, { transaction, lock: true, rejectOnEmpty: true });
    // Someone else set another one while this one was checked.
    if (user.passwordHash !== seen.passwordHash) return refuse(wrong, 'current');
    await replacePassword(user, passwordHash, transaction);
    return { sessionVersion: user.sessionVersion };
  });
}
