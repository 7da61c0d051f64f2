import { type Problem, problemOf } from '@/lib/contracts/problem';
import { byteStream, type SentFile } from './sent-file';

/** What every answer of the API says to a browser: data, never a page, and not to be kept. */
const always = {
  'Cache-Control': 'no-store',
  'X-Content-Type-Options': 'nosniff',
  'Content-Security-Policy': "default-src 'none'; frame-ancestors 'none'",
} as const;

/** Seconds a client is asked to wait when the service has too much to do or its database is away. */
const waitSeconds = 2;

export function jsonResponse(body: unknown, status: number, headers: Readonly<Record<string, string>>): Response {
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'Content-Type': 'application/json', ...always, ...headers },
  });
}

/** A file as a response, to be kept and not to be shown. */
export const fileResponse = ({ type, name, chunks }: SentFile, headers: Readonly<Record<string, string>>): Response =>
  new Response(byteStream(chunks), {
    headers: { 'Content-Type': type, 'Content-Disposition': `attachment; filename="${name}"`, ...always, ...headers },
  });

/** A problem document as a response. */
export function problemResponse(problem: Problem, headers: Readonly<Record<string, string>> = {}): Response {
  const wait: Readonly<Record<string, string>> =
    problem.code === 'busy' || problem.code === 'database' ? { 'Retry-After': String(waitSeconds) } : {};
  return new Response(JSON.stringify(problem), {
    status: problem.status,
    headers: { 'Content-Type': 'application/problem+json', ...always, ...wait, ...headers },
  });
}

/** 404 as a problem document. */
export const notFound = (pathname: string, headers: Readonly<Record<string, string>>): Response =>
  problemResponse(problemOf('not-found', `Nothing answers at ${pathname.slice(0, 200)}.`), headers);
