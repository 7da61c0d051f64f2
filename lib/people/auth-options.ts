import 'server-only';
import type { NextAuthOptions } from 'next-auth';
import Credentials from 'next-auth/providers/credentials';
import { config } from '@/lib/config/config';
import { addressOf } from '@/lib/http/incoming';
import { isSecure, sessionCookie, sessionSeconds } from './session';
import { checkPassword } from './sign-in';

/** How next-auth signs people in: by password, with a signed token that names the person and the version of the session. */
export const authOptions = (): NextAuthOptions => ({
  secret: config().NEXTAUTH_SECRET,
  session: { strategy: 'jwt', maxAge: sessionSeconds },
  pages: { signIn: '/sign-in', signOut: '/account', error: '/sign-in' },
  useSecureCookies: isSecure(),
  cookies: {
    sessionToken: {
      name: sessionCookie(),
      options: { httpOnly: true, sameSite: 'lax', path: '/', secure: isSecure() },
    },
  },
  providers: [
    Credentials({
      credentials: { email: { label: 'E-mail address' }, password: { label: 'Password', type: 'password' } },
      async authorize(given, request) {
        const headers = new Headers(request.headers as Record<string, string> | undefined);
        const checked = await checkPassword(given?.email ?? '', given?.password ?? '', addressOf(headers)).catch(
          (error: unknown) => {
            // next-auth tells the browser what was thrown; what failed inside is for the log alone.
            console.error('A sign-in failed:', error);
            throw new Error('failed');
          },
        );
        // The message travels to the sign-in page as the error of the attempt.
        if (checked.outcome === 'too-often') throw new Error(`wait-${checked.seconds}`);
        return checked.outcome === 'right' ? { id: checked.id, version: checked.version } : null;
      },
    }),
  ],
  callbacks: {
    jwt({ token, user }) {
      return user === undefined ? token : { sub: user.id, version: (user as { version?: number }).version };
    },
    // The session as browsers may ask for it says nothing: pages are told who it is by the server.
    session: ({ session }) => ({ expires: session.expires }),
  },
});
