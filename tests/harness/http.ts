import { inject } from 'vitest';
import type {} from './provided';

export interface Answer {
  readonly status: number;
  /** The media type without parameters. */
  readonly type: string;
  readonly headers: Headers;
  readonly text: string;
  /** The JSON that was sent, or undefined when it was none. */
  readonly body: unknown;
}

/** Base address of the server under test. */
export const serverUrl = (): string => inject('serverUrl');

function parse(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return undefined;
  }
}

/** One request, as it is, to a path of the server under test or to a whole address. */
export async function send(target: string, request: RequestInit = {}): Promise<Answer> {
  const response = await fetch(new URL(target, serverUrl()), request);
  const text = await response.text();
  const type = (response.headers.get('content-type') ?? '').split(';')[0]?.trim() ?? '';
  return { status: response.status, type, headers: response.headers, text, body: parse(text) };
}

export const get = (target: string, headers: Record<string, string> = {}): Promise<Answer> => send(target, { headers });

/** Sends a value as JSON. */
export const post = (target: string, body: unknown, headers: Record<string, string> = {}): Promise<Answer> =>
  send(target, {
    method: 'POST',
    headers: { 'content-type': 'application/json', ...headers },
    body: JSON.stringify(body),
  });
