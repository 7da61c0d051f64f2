import { execFileSync } from 'node:child_process';
import path from 'node:path';
import { runStatement } from './database.mjs';
import { clientPrograms, ensurePackages, postgresFolders } from './packages.mjs';
import { Trouble } from './trouble.mjs';

const majorOf = (folder) =>
  Number(/(\d+)(?:\.|\s|$)/.exec(execFileSync(path.join(folder, 'pg_dump'), ['--version'], { encoding: 'utf8' }))?.[1]);

/** The folder whose programs fit the server: of its own version, or else the nearest newer one; an older one cannot read it. */
async function fittingFolder(run, url) {
  await ensurePackages(run, ['postgresql-client']);
  const { rows } = await runStatement(url, 'SHOW server_version_num');
  const wanted = Math.floor(Number(rows[0].server_version_num) / 10_000);
  const found = postgresFolders(clientPrograms)
    .map((folder) => ({ folder, major: majorOf(folder) }))
    .filter(({ major }) => major >= wanted)
    .sort((a, b) => a.major - b.major)[0];
  if (found !== undefined) return found.folder;
  throw new Trouble(
    `The database runs PostgreSQL ${wanted}, and this machine has older programs than that.`,
    `Install those of its version (apt-get install postgresql-client-${wanted}), then try again.`,
  );
}

/** Collects what a program says on one of its outputs. */
export function heard(stream) {
  const chunks = [];
  stream.on('data', (chunk) => chunks.push(chunk));
  return () => Buffer.concat(chunks).toString('utf8').trim();
}

/**
 * Starts the programs of PostgreSQL against a database. The password goes by the environment: a command line can be read by
 * everybody on the machine.
 */
export async function openClient(run, url) {
  const folder = await fittingFolder(run, url);
  const address = new URL(url);
  const password = decodeURIComponent(address.password);
  address.password = '';
  const env = { ...process.env, PGPASSWORD: password, PGCONNECT_TIMEOUT: '10', LC_ALL: 'C.UTF-8' };
  const start = (program, args, stdio) => run.start(path.join(folder, program), args, { stdio, env });
  return {
    start,
    dbname: `--dbname=${address.href}`,
    /** Runs a program to its end: its exit code and all it said. */
    async finish(program, args) {
      const { child, ended } = start(program, args, ['ignore', 'pipe', 'pipe']);
      const [output, errors] = [heard(child.stdout), heard(child.stderr)];
      const { code } = await ended;
      return { code, output: output(), errors: errors() };
    },
  };
}
