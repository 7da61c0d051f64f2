import 'server-only';
import { type Problem, problemOf } from '@/lib/contracts/problem';
import { memberOfToken } from '@/lib/people/bearer';
import { type Caller, visitor } from '@/lib/people/caller';
import { callerOfCookies } from '@/lib/people/session';
import { config } from '@/lib/config/config';

/** Who sends a request: by its token, else by its session, else a visitor. A token that does not hold is a problem. */
export async function callerOf(request: Request): Promise<{ readonly caller: Caller } | { readonly problem: Problem }> {
  const authorization = request.headers.get('authorization');
  if (authorization !== null) {
    const secret = /^Bearer +([\w-]{20,100})$/i.exec(authorization.trim())?.[1];
    const member = secret === undefined ? undefined : await memberOfToken(secret);
    if (member !== undefined) return { caller: member };
    return {
      problem: problemOf('unauthenticated', 'This token is not known, or expired, or revoked. Make a new one.'),
    };
  }
  const cookies = cookiesOf(request.headers);
  if (cookies.size === 0 || isForged(request)) return { caller: visitor };
  return { caller: await callerOfCookies((name) => cookies.get(name)) };
}

/**
 * Whether a request that could change something was sent by a page of another origin: a browser adds the session to it
 * unasked, so that session must not count.
 */
function isForged(request: Request): boolean {
  if (request.method === 'GET' || request.method === 'HEAD') return false;
  const origin = request.headers.get('origin');
  const ours = new URL(config().PUBLIC_URL).host;
  const host = request.headers.get('host');
  if (origin === null) return request.headers.get('sec-fetch-site') !== 'same-origin';
  if (!URL.canParse(origin)) return true;
  const { host: from } = new URL(origin);
  return from !== ours && from !== host;
}

function cookiesOf(headers: Headers): ReadonlyMap<string, string> {
  const pairs = (headers.get('cookie') ?? '').split(';').map((pair) => pair.trim());
  return new Map(
    pairs
      .filter((pair) => pair.includes('='))
      .map((pair) => {
        const at = pair.indexOf('=');
        return [pair.slice(0, at), unescaped(pair.slice(at + 1))] as const;
      }),
  );
}

function unescaped(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}
