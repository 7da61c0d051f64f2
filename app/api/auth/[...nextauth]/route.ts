import NextAuth from 'next-auth';
import { notFound } from '@/lib/http/respond';
import { authOptions } from '@/lib/people/auth-options';

type Handler = (request: Request, context: { params: Promise<{ nextauth: string[] }> }) => Promise<Response>;

const serve = (request: Request, context: unknown): Promise<Response> =>
  (NextAuth(authOptions()) as (request: Request, context: unknown) => Promise<Response>)(request, context);

/** What signing in needs. The package has pages and calls of its own beside these, which nothing here uses. */
const used = { GET: ['csrf', 'providers', 'session'], POST: ['callback/credentials'] } as const;

const isForm = (request: Request): boolean =>
  /^application\/x-www-form-urlencoded\s*(;|$)/i.test(request.headers.get('content-type') ?? '');

const handlerOf =
  (method: keyof typeof used): Handler =>
  async (request, context) => {
    const { nextauth } = await context.params;
    const wanted = (used[method] as readonly string[]).includes(nextauth.join('/'));
    return wanted && (method === 'GET' || isForm(request))
      ? serve(request, context)
      : notFound(new URL(request.url).pathname, {});
  };

export const GET = handlerOf('GET');
export const POST = handlerOf('POST');
