import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { onTestFinished } from 'vitest';

const program = path.join(import.meta.dirname, 'small-launcher.mjs');

export interface Launched {
  readonly child: ChildProcess;
  /** Resolves with what the launcher reports once it is ready; rejects when it ends before. */
  readonly ready: Promise<Record<string, unknown>>;
  /** Exit code or signal, and all it said. */
  readonly over: Promise<{ code: number | null; signal: string | null; output: string }>;
}

/** A state folder for one test, with nothing in it; a closed one cannot be entered by other accounts of the machine. */
export function makeStateFolder(options: { closed?: boolean } = {}): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'quadrel-state-'));
  if (options.closed !== true) chmodSync(folder, 0o711);
  onTestFinished(() => {
    const elsewhere = path.join(folder, 'cluster-folder');
    if (existsSync(elsewhere)) rmSync(readFileSync(elsewhere, 'utf8').trim(), { recursive: true });
    rmSync(folder, { recursive: true, force: true });
  });
  return folder;
}

/** Starts a small launcher on the same machinery as `npm start`: it opens what its first argument says and waits. */
export function startLauncher(stateFolder: string, what: 'sleeper' | 'database' | 'serving'): Launched {
  const { DATABASE_URL: _unused, ...environment } = process.env;
  const child = spawn(process.execPath, [program, what], {
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...environment, QUADREL_STATE_FOLDER: stateFolder },
  });
  let output = '';
  const ready = new Promise<Record<string, unknown>>((resolve, reject) => {
    const hear = (data: Buffer) => {
      output += data.toString();
      const report = /^ready (.*)$/m.exec(output)?.[1];
      if (report !== undefined) resolve(JSON.parse(report) as Record<string, unknown>);
    };
    child.stdout.on('data', hear);
    child.stderr.on('data', hear);
    child.once('close', () => reject(new Error(`The launcher ended:\n${output}`)));
  });
  ready.catch(() => undefined);
  const over = once(child, 'close').then(([code, signal]: (number | string | null)[]) => ({
    code: typeof code === 'number' ? code : null,
    signal: typeof signal === 'string' ? signal : null,
    output,
  }));
  onTestFinished(async () => {
    child.kill('SIGTERM');
    await over;
  });
  return { child, ready, over };
}

/** Whether a process is there and not merely unburied. */
export function isRunning(pid: unknown): boolean {
  try {
    return !/^State:\s+Z/m.test(readFileSync(`/proc/${String(pid)}/status`, 'utf8'));
  } catch {
    return false;
  }
}
