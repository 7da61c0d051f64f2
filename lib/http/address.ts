import type { IncomingMessage } from 'node:http';
import { subscribe } from 'node:diagnostics_channel';
import { config } from '@/lib/config/config';

const marked = globalThis as typeof globalThis & { quadrelAddresses?: boolean };

/**
 * From now on every request this process receives carries the address of its socket in `X-Forwarded-For`, whatever the client
 * wrote there, unless the configuration says that a proxy of one's own sets that header. To be called once, before serving.
 */
export function markAddresses(): void {
  if (marked.quadrelAddresses === true) return;
  marked.quadrelAddresses = true;
  if (config().TRUST_PROXY === '1') return;
  subscribe('http.server.request.start', (message) => {
    if (!isRequestStart(message)) return;
    message.request.headers['x-forwarded-for'] = message.request.socket.remoteAddress ?? '';
  });
}

const isRequestStart = (message: unknown): message is { readonly request: IncomingMessage } =>
  typeof message === 'object' && message !== null && 'request' in message;

/**
 * The address a request comes from: the socket's, or the last one in `X-Forwarded-For` behind a trusted proxy, which is the one
 * the proxy saw. As long as addresses are not marked, nothing the client says is believed and all share one.
 */
export function addressOf(headers: Headers): string {
  if (marked.quadrelAddresses !== true) return 'unknown';
  const last = headers.get('x-forwarded-for')?.split(',').at(-1)?.trim().toLowerCase() ?? '';
  return /^[0-9a-f.:%]{2,64}$/.test(last) ? last.replace(/^::ffff:(?=\d+\.)/, '') : 'unknown';
}
