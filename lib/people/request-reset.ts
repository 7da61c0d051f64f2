import 'server-only';
import { setTimeout as pause } from 'node:timers/promises';
import { waitWords } from '@/lib/contracts/wait';
import { database } from '@/lib/database/connection';
import { enqueue } from '@/lib/jobs/enqueue';
import { PasswordReset } from '@/models/password-reset';
import { User } from '@/models/user';
import { type Refused, refuse } from './refused';
import { attempt } from './throttle';

const resetMinutes = 60;
/** Every answer takes at least this long, which covers the work that only an address with an account causes. */
const leastMilliseconds = 300;

/**
 * Asks for a link to set a new password. The answer is the same whether or not the address has an account, and so is the time
 * it takes. Links that were sent before stop working.
 */
export async function requestReset(email: string, address: string): Promise<{ readonly asked: true } | Refused> {
  const waits = await Promise.all([attempt('reset-account', email), attempt('reset-address', address)]);
  const seconds = Math.max(...waits.map((wait) => wait ?? 0));
  if (seconds > 0) return refuse(waitWords(seconds));
  await Promise.all([makeReset(email), pause(leastMilliseconds)]);
  return { asked: true };
}

async function makeReset(email: string): Promise<void> {
  await database().transaction(async (transaction) => {
    const user = await User.findOne({ where: { email }, transaction, lock: true });
    if (user === null) return;
    await PasswordReset.update({ usedAt: new Date() }, { where: { userId: user.id, usedAt: null }, transaction });
    const reset = await PasswordReset.create(
      { userId: user.id, expiresAt: new Date(Date.now() + resetMinutes * 60 * 1000) },
      { transaction },
    );
    await enqueue('mail-password-reset', { resetId: reset.id }, transaction);
  });
}
