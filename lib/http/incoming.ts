import type { IncomingMessage } from 'node:http';
import { subscribe } from 'node:diagnostics_channel';
import { config } from '@/lib/config/config';

const marked = globalThis as typeof globalThis & { quadrelIncoming?: boolean };

/** The methods that the framework hands on to a route; on any other it fails. */
const known = new Set(['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS']);
const foreignHeader = 'x-foreign-method';

/**
 * Corrects every request that this process receives from now on, before the framework sees it. To be called once, before
 * serving.
 *
 * - `X-Forwarded-For` becomes the address of the socket, whatever the client wrote there, unless the configuration says that a
 *   proxy of one's own sets that header.
 * - A path with a percent sign that encodes no text gets `%25` for each: the framework fails on it, and so nothing is there.
 * - A foreign method, such as TRACE, becomes OPTIONS, which changes nothing anywhere, and is remembered for `foreignMethod`.
 */
export function correctIncoming(): void {
  if (marked.quadrelIncoming === true) return;
  marked.quadrelIncoming = true;
  const trustProxy = config().TRUST_PROXY === '1';
  subscribe('http.server.request.start', (message) => {
    if (!isRequestStart(message)) return;
    const { request } = message;
    if (!trustProxy) request.headers['x-forwarded-for'] = request.socket.remoteAddress ?? '';
    if (request.url !== undefined) request.url = decodable(request.url);
    delete request.headers[foreignHeader];
    if (request.method === undefined || known.has(request.method)) return;
    request.headers[foreignHeader] = request.method;
    request.method = 'OPTIONS';
  });
}

/** An address whose path can be decoded: as it is, or with its percent signs taken for themselves. */
function decodable(address: string): string {
  const end = address.search(/[?#]|$/);
  const path = address.slice(0, end);
  try {
    decodeURIComponent(path);
    return address;
  } catch {
    return path.replaceAll('%', '%25') + address.slice(end);
  }
}

const isRequestStart = (message: unknown): message is { readonly request: IncomingMessage } =>
  typeof message === 'object' && message !== null && 'request' in message;

/** The method of a request that came with one the service does not know. */
export const foreignMethod = (headers: Headers): string | undefined => headers.get(foreignHeader) ?? undefined;

/**
 * The address a request comes from: the socket's, or the last one in `X-Forwarded-For` behind a trusted proxy, which is the one
 * the proxy saw. As long as requests are not corrected, nothing the client says is believed and all share one.
 */
export function addressOf(headers: Headers): string {
  if (marked.quadrelIncoming !== true) return 'unknown';
  const last = headers.get('x-forwarded-for')?.split(',').at(-1)?.trim().toLowerCase() ?? '';
  return /^[0-9a-f.:%]{2,64}$/.test(last) ? last.replace(/^::ffff:(?=\d+\.)/, '') : 'unknown';
}
