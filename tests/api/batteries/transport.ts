import net from 'node:net';
import { expect, test } from 'vitest';
import { send, serverUrl } from '../../harness/http';
import { expectProblem } from './described';

const json = { 'content-type': 'application/json' };

export interface Asking {
  readonly address: string;
  readonly headers: Readonly<Record<string, string>>;
}

export interface Transported {
  /** A body that the call serves any number of times. */
  readonly body: Readonly<Record<string, unknown>>;
  /** Where to send it and with the headers of whom, for calls that need to know; asked before every request. */
  readonly asking?: () => Promise<Asking>;
  /** The status of a success. */
  readonly success?: 200 | 201;
  /** Whether GET answers at this address too. */
  readonly readable?: boolean;
}

/**
 * What any call with a body must withstand before its service sees the request. The path is the one of the OpenAPI document.
 */
export function transportBattery(path: string, { body, asking, success = 200, readable = false }: Transported): void {
  const where = asking ?? (() => Promise.resolve({ address: path, headers: {} }));
  const raw = async (content: BodyInit, headers: Record<string, string> = json) => {
    const { address, headers: own } = await where();
    return send(address, { method: 'POST', headers: { ...own, ...headers }, body: content });
  };
  const post = (content: unknown, headers: Record<string, string> = {}) =>
    raw(JSON.stringify(content), { ...json, ...headers });
  const allowed = readable ? 'GET, HEAD, POST, OPTIONS' : 'POST, OPTIONS';
  const others = [...(readable ? [] : ['GET', 'HEAD']), 'PUT', 'PATCH', 'DELETE'];

  test.each(others)('%s is told what to use', async (method) => {
    const answer = await send((await where()).address, { method });
    expect(answer).toMatchObject({ status: 405, type: 'application/problem+json' });
    expect(answer.headers.get('allow')).toBe(allowed);
  });

  test('OPTIONS lists the methods and grants nothing to other origins', async () => {
    const answer = await send((await where()).address, {
      method: 'OPTIONS',
      headers: { origin: 'https://elsewhere.example', 'access-control-request-method': 'POST' },
    });
    expect(answer.status).toBe(204);
    expect(answer.headers.get('allow')).toBe(allowed);
    expect([...answer.headers.keys()].filter((name) => name.startsWith('access-control'))).toEqual([]);
  });

  test.each([
    ['text/plain'],
    ['application/x-www-form-urlencoded'],
    ['multipart/form-data; boundary=x'],
    ['application/jsonp'],
    ['text/html, application/json'],
    ['application/json; charset=utf-16'],
  ])('the content type %s is refused', async (type) => {
    await expectProblem(path, await raw(JSON.stringify(body), { 'content-type': type }), 415, 'content-type');
  });

  test('JSON with parameters or in capitals is JSON', async () => {
    const answer = await raw(JSON.stringify(body), { 'content-type': 'Application/JSON; Charset="UTF-8"' });
    expect(answer.status).toBe(success);
  });

  test('compressed bodies are not unpacked', async () => {
    const answer = await raw(JSON.stringify(body), { ...json, 'content-encoding': 'gzip' });
    await expectProblem(path, answer, 415, 'content-type');
  });

  test.each([
    ['nothing', ''],
    ['half an object', '{"field":'],
    ['two values', '{} {}'],
    ['NaN', '{"field":NaN}'],
  ])('%s is not readable', async (_, text) => {
    await expectProblem(path, await raw(text), 400, 'unreadable-json');
  });

  test.each([
    ['an array', '[]'],
    ['a string', '"Q"'],
    ['a number', '1'],
    ['null', 'null'],
  ])('%s is no object', async (_, text) => {
    await expectProblem(path, await raw(text), 400, 'unreadable-json');
  });

  test('bytes that are not UTF-8 are not readable', async () => {
    const bytes = new Uint8Array([...new TextEncoder().encode('{"field":"'), 0xff, 0xfe, 0x22, 0x7d]);
    await expectProblem(path, await raw(bytes), 400, 'unreadable-json');
  });

  test('deeply nested JSON is refused by its shape, not by a crash', async () => {
    const deep = `${'['.repeat(200_000)}${']'.repeat(200_000)}`;
    await expectProblem(path, await raw(`{"field":${deep}}`), 422, 'invalid');
  });

  test('a body over 1 MiB is refused, whatever length it declares', async () => {
    const large = JSON.stringify({ ...body, field: 'x'.repeat(1024 * 1024) });
    await expectProblem(path, await raw(large), 413, 'too-large');
    expect(await sendChunked(await where(), large)).toMatch(/^HTTP\/1\.1 413 /);
  });

  test('a body of exactly 1 MiB is read', async () => {
    const short = JSON.stringify({ ...body, unknown: '' });
    const whole = short.replace('"unknown":""', `"unknown":"${'x'.repeat(1024 * 1024 - short.length)}"`);
    expect(whole.length).toBe(1024 * 1024);
    await expectProblem(path, await raw(whole), 422, 'invalid');
  });

  test.each(['__proto__', 'constructor', 'prototype', 'toString'])(
    'the key %s is unknown and does no harm',
    async (key) => {
      const text = JSON.stringify(body).replace(/^\{/, `{${JSON.stringify(key)}:{"field":"Q","polluted":true},`);
      await expectProblem(path, await raw(text), 422, 'invalid', {
        errors: [{ key, detail: `There is no key “${key}” here.` }],
      });
      expect((await post(body)).status).toBe(success);
    },
  );

  test('markup in a key comes back as JSON that no browser takes for a page', async () => {
    const answer = await post({ ...body, '<script>alert(1)</script>': 1 });
    await expectProblem(path, answer, 422, 'invalid');
    expect(answer.headers.get('content-security-policy')).toContain("default-src 'none'");
  });

  test('a plain request id is kept and any other is replaced', async () => {
    const kept = await post(body, { 'x-request-id': 'night-run.0001' });
    expect(kept.headers.get('x-request-id')).toBe('night-run.0001');
    for (const given of ['<b>', 'a b', 'x'.repeat(65), 'set-cookie: a=b']) {
      const answer = await post(body, { 'x-request-id': given });
      expect(answer.headers.get('x-request-id')).toMatch(/^[0-9a-f-]{36}$/);
    }
  });

  test('nothing is kept by caches, and no cookie is set', async () => {
    const answer = await post(body);
    expect(answer.headers.get('cache-control')).toBe('no-store');
    expect(answer.headers.get('set-cookie')).toBeNull();
    expect(answer.headers.get('x-powered-by')).toBeNull();
  });
}

/** Sends a body in chunks, with no Content-Length, and returns the beginning of the answer. */
function sendChunked({ address, headers }: Asking, body: string): Promise<string> {
  const { hostname, port, host } = new URL(serverUrl());
  const own = Object.entries(headers)
    .map(([name, value]) => `${name}: ${value}\r\n`)
    .join('');
  return new Promise((resolve, reject) => {
    const socket = net.connect(Number(port), hostname);
    let answer = '';
    socket.on('data', (data: Buffer) => {
      answer += data.toString('latin1');
      if (answer.includes('\r\n\r\n')) {
        socket.destroy();
        resolve(answer);
      }
    });
    socket.on('error', (error) => (answer === '' ? reject(error) : resolve(answer)));
    socket.write(
      `POST ${address} HTTP/1.1\r\nHost: ${host}\r\n${own}Content-Type: application/json\r\nTransfer-Encoding: chunked\r\n\r\n`,
    );
    for (let at = 0; at < body.length; at += 65_536) {
      const chunk = body.slice(at, at + 65_536);
      socket.write(`${chunk.length.toString(16)}\r\n${chunk}\r\n`);
    }
    socket.write('0\r\n\r\n');
  });
}
