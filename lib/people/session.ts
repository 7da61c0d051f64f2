import 'server-only';
import { decode } from 'next-auth/jwt';
import { config } from '@/lib/config/config';
import { database } from '@/lib/database/connection';
import { User } from '@/models/user';
import { type Caller, visitor } from './caller';
import { seatsOf } from './seats';

/** Whether the program is reached over https; cookies are then never sent without. */
export const isSecure = (): boolean => config().PUBLIC_URL.startsWith('https://');

const prefix = (): string => (isSecure() ? '__Host-' : '');

/** The cookie with the session. */
export const sessionCookie = (): string => `${prefix()}quadrel-session`;
/** The cookie that says in which of the groups one is; it grants nothing. */
export const groupCookie = (): string => `${prefix()}quadrel-group`;

/** Seconds a session lasts: two weeks. */
export const sessionSeconds = 14 * 24 * 3600;

/**
 * Who comes with these cookies. The session is a signed token that says whose it is and of which version; the database says
 * whether that version still holds and what role the person has now, so that signing out everywhere, a new password and the
 * removal from a group act at once.
 */
export async function callerOfCookies(cookie: (name: string) => string | undefined): Promise<Caller> {
  const token = cookie(sessionCookie());
  if (token === undefined) return visitor;
  const held = await decode({ token, secret: config().NEXTAUTH_SECRET }).catch(() => null);
  if (typeof held?.sub !== 'string' || typeof held.version !== 'number') return visitor;
  database();
  const user = await User.findOne({ where: { id: held.sub, sessionVersion: held.version } });
  if (user === null) return visitor;
  const person = { id: user.id, name: user.name, email: user.email };
  const seats = await seatsOf(user.id);
  const chosen = cookie(groupCookie());
  const group = seats.find(({ slug }) => slug === chosen) ?? seats[0];
  return group === undefined ? { kind: 'visitor', person } : { kind: 'member', person, group };
}
