import 'server-only';
import { cookies } from 'next/headers';
import { encode } from 'next-auth/jwt';
import { config } from '@/lib/config/config';
import { groupCookie, isSecure, sessionCookie, sessionSeconds } from './session';

const options = () => ({ httpOnly: true, sameSite: 'lax', path: '/', secure: isSecure() }) as const;

/** Signs the browser in that this action answers, with a token just as the sign-in makes one. */
export async function openSession(userId: string, version: number): Promise<void> {
  const token = await encode({
    token: { sub: userId, version },
    secret: config().NEXTAUTH_SECRET,
    maxAge: sessionSeconds,
  });
  (await cookies()).set(sessionCookie(), token, { ...options(), maxAge: sessionSeconds });
}

/** Signs the browser out that this action answers. */
export async function closeSession(): Promise<void> {
  const jar = await cookies();
  for (const name of [sessionCookie(), groupCookie()]) jar.set(name, '', { ...options(), maxAge: 0 });
}

/** Remembers in which group one is. It grants nothing: who is in no such group is in the first of theirs. */
export async function rememberGroup(slug: string): Promise<void> {
  (await cookies()).set(groupCookie(), slug, { ...options(), maxAge: 365 * 24 * 3600 });
}
