import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { randomBytes } from 'node:crypto';
import path from 'node:path';
import { requireLoopback } from './database';

export interface JobWorker {
  readonly pid: number;
  /** All it said so far. */
  output(): string;
  /** Asks it to end, and waits until it has. Returns its exit code. */
  stop(): Promise<number | null>;
  /** Ends it as a loss of power would. */
  kill(): Promise<void>;
}

/**
 * Starts a job worker with the settings of a server (`settings` of `startServer`), or with a DATABASE_URL and an SMTP_URL of
 * a test's own, and waits until it does jobs.
 */
export async function startJobWorker(
  settings: Readonly<Record<string, string>> & { readonly DATABASE_URL: string; readonly SMTP_URL: string },
): Promise<JobWorker> {
  requireLoopback(settings.DATABASE_URL);
  const root = path.resolve(import.meta.dirname, '..', '..');
  const child = spawn(process.execPath, [path.join(root, 'dist', 'jobs.worker.mjs')], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      NEXTAUTH_SECRET: randomBytes(32).toString('base64url'),
      ...settings,
    },
  });
  let output = '';
  const closed = once(child, 'close');
  await new Promise<void>((resolve, reject) => {
    const hear = (data: Buffer) => {
      output += data.toString();
      if (output.includes('Jobs are being done.')) resolve();
    };
    child.stdout.on('data', hear);
    child.stderr.on('data', hear);
    child.once('error', reject);
    child.once('close', () => reject(new Error(`The job worker ended. What it said:\n${output}`)));
  });
  return {
    pid: child.pid ?? -1,
    output: () => output,
    async stop() {
      child.kill('SIGTERM');
      await closed;
      return child.exitCode;
    },
    async kill() {
      child.kill('SIGKILL');
      await closed;
    },
  };
}
