import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';
import { given } from './given';
import { hashSecret } from './secret-text';
import { attempt, giveBack } from './throttle';

export type OpenReset =
  | { readonly state: 'open'; readonly userId: string; readonly email: string }
  | { readonly state: 'expired' | 'used' | 'unknown' };

/** The link to set a new password as it is now. */
export async function findReset(token: string, transaction?: Transaction): Promise<OpenReset> {
  if (!given.linkToken.safeParse(token).success) return { state: 'unknown' };
  const [row] = await database().query<{ userId: string; email: string; used: boolean; expired: boolean }>(
    `SELECT r.user_id AS "userId", u.email, r.used_at IS NOT NULL AS used, r.expires_at <= now() AS expired
       FROM password_resets r JOIN users u ON u.id = r.user_id WHERE r.token_hash = $1`,
    { bind: [hashSecret(token)], type: QueryTypes.SELECT, transaction },
  );
  if (row === undefined) return { state: 'unknown' };
  if (row.used) return { state: 'used' };
  return row.expired ? { state: 'expired' } : { state: 'open', userId: row.userId, email: row.email };
}

/** Opens a link to set a new password. Links that are none are counted by the address they are tried from. */
export async function openReset(
  token: string,
  address: string,
): Promise<OpenReset | { readonly state: 'too-often'; readonly seconds: number }> {
  const seconds = await attempt('link-address', address);
  if (seconds !== undefined) return { state: 'too-often', seconds };
  const reset = await findReset(token);
  if (reset.state !== 'unknown') await giveBack('link-address', address);
  return reset;
}
