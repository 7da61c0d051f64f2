import NextAuth from 'next-auth';
import { authOptions } from '@/lib/people/auth-options';

const handler = (request: Request, context: { params: Promise<{ nextauth: string[] }> }): Promise<Response> =>
  (NextAuth(authOptions()) as (request: Request, context: unknown) => Promise<Response>)(request, context);

export { handler as GET, handler as POST };
