import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import net from 'node:net';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { clusterFromEnvironment, createDatabase, dropDatabase } from './database';

export interface RunningServer {
  readonly url: string;
  readonly databaseUrl: string;
  /** What it was started with; `startJobWorker` takes the same, once an SMTP_URL is among it. */
  readonly settings: Readonly<Record<string, string>> & { readonly DATABASE_URL: string };
  stop(): Promise<void>;
}

async function freePort(): Promise<number> {
  const server = net.createServer();
  server.listen(0, '127.0.0.1');
  await once(server, 'listening');
  const address = server.address();
  server.close();
  await once(server, 'close');
  if (address === null || typeof address === 'string') throw new Error('No free port was found.');
  return address.port;
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const exit = once(child, 'exit');
  child.kill('SIGTERM');
  const patience = setTimeout(() => child.kill('SIGKILL'), 10_000);
  await exit;
  clearTimeout(patience);
}

/**
 * Starts the server that was built, with a database of its own and the given settings, and waits until it is well. No quota
 * holds unless one is set here. A server that is to send mail is given a mailbox (`SMTP_URL`), and a job worker beside it.
 */
export async function startServer(settings: Readonly<Record<string, string>> = {}): Promise<RunningServer> {
  const cluster = clusterFromEnvironment();
  const databaseUrl = await createDatabase(cluster);
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const given = {
    NEXTAUTH_SECRET: randomBytes(32).toString('base64url'),
    NEXTAUTH_URL: url,
    PUBLIC_URL: url,
    COMPUTE_QUOTA_PER_MINUTE: '0',
    TOKEN_QUOTA_PER_MINUTE: '0',
    ...settings,
    PORT: String(port),
    DATABASE_URL: databaseUrl,
  };
  const root = path.resolve(import.meta.dirname, '..', '..');
  const child = spawn(
    process.execPath,
    [path.join(root, 'node_modules/next/dist/bin/next'), 'start', '-H', '127.0.0.1', '-p', String(port)],
    {
      cwd: root,
      stdio: ['ignore', 'pipe', 'pipe'],
      env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1', ...given },
    },
  );
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (data: Buffer) => (output += data.toString()));
  const stop = async () => {
    await end(child);
    await dropDatabase(cluster, databaseUrl);
  };
  for (const limit = Date.now() + 90_000; Date.now() < limit && child.exitCode === null; await pause(100)) {
    const response = await fetch(`${url}/api/v1/health`).catch(() => undefined);
    if (response?.ok === true) return { url, databaseUrl, settings: given, stop };
  }
  await stop();
  throw new Error(`The server did not become well. What it said:\n${output}`);
}
