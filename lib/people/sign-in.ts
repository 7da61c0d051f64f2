import 'server-only';
import { database } from '@/lib/database/connection';
import { User } from '@/models/user';
import { isPassword } from './passwords';
import { attempt, forgive, giveBack } from './throttle';

export type SignedIn =
  | { readonly outcome: 'right'; readonly id: string; readonly version: number }
  | { readonly outcome: 'wrong' }
  | { readonly outcome: 'too-often'; readonly seconds: number };

/** Checks an address and a password. Guesses are counted by account and by address of the network, before they are tried. */
export async function checkPassword(email: string, password: string, address: string): Promise<SignedIn> {
  // The database takes no NUL, and no account has one.
  const account = email.replaceAll('\0', '\ufffd').trim().toLowerCase();
  const waits = await Promise.all([attempt('sign-in-account', account), attempt('sign-in-address', address)]);
  const seconds = Math.max(...waits.map((wait) => wait ?? 0));
  if (seconds > 0) return { outcome: 'too-often', seconds };
  database();
  const user = await User.findOne({ where: { email: account } });
  if (!(await isPassword(password, user?.passwordHash)) || user === null) return { outcome: 'wrong' };
  // A whole institute may come from one address: what is right does not count against the others.
  await Promise.all([forgive('sign-in-account', account), giveBack('sign-in-address', address)]);
  return { outcome: 'right', id: user.id, version: user.sessionVersion };
}
