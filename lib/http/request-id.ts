import { randomUUID } from 'node:crypto';

/** The id of a request: the caller's own, when it is a plain word that cannot upset a log or a header, else a new one. */
export function requestId(headers: Headers): string {
  const given = headers.get('x-request-id') ?? '';
  return /^[\w.-]{8,64}$/.test(given) ? given : randomUUID();
}
