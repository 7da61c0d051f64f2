// npm run backup [file]: writes the whole database, with the queue of jobs, into one file. The server may run meanwhile.
import fs from 'node:fs';
import path from 'node:path';
import { hasDatabase, reachDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { holdings, schemas } from './holdings.mjs';
import { launch } from './launch.mjs';
import { inState } from './paths.mjs';
import { heard, openClient } from './pg-client.mjs';
import { servingRun } from './run.mjs';
import { Trouble, say } from './trouble.mjs';

/** Where the backup goes; relative to where the command was given, for npm moves to the clone. */
function target(given) {
  if (given !== undefined) return path.resolve(process.env.INIT_CWD ?? process.cwd(), given);
  const folder = inState('backups');
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  return path.join(folder, `${new Date().toISOString().slice(0, 19).replaceAll(':', '-')}.dump`);
}

/** Opens the file under another name first: half a backup is never found under the name of a whole one. */
function openDraft(file) {
  if (fs.existsSync(file)) throw new Trouble(`${file} is there already.`, 'Name another file, or move that one away.');
  const draft = `${file}.part`;
  try {
    return { draft, output: fs.openSync(draft, 'w', 0o600) };
  } catch (error) {
    throw new Trouble(`${draft} cannot be written: ${error.message}`, 'Name a file in a folder that can be written.');
  }
}

// Without a server the cluster is started for the backup, and no server may start meanwhile: it would start it too.
const name = servingRun() !== undefined || process.env.DATABASE_URL ? 'backup' : 'server';

await launch(name, 'npm run backup', 130, async (run) => {
  requireNode();
  await ensureDependencies(run);
  if (!hasDatabase()) {
    throw new Trouble('This clone has no database yet, so there is nothing to back up.', 'npm start makes one.');
  }
  const file = target(process.argv[2]);
  const { draft, output } = openDraft(file);
  try {
    const url = await reachDatabase(run);
    const { words, tables } = await holdings(url);
    if (tables === 0)
      throw new Trouble('The database is empty, so there is nothing to back up.', 'npm start fills it.');
    const client = await openClient(run, url);
    const dump = client.start(
      'pg_dump',
      ['--format=custom', '--no-owner', '--no-privileges', ...schemas.map((one) => `--schema=${one}`), client.dbname],
      ['ignore', output, 'pipe'],
    );
    const errors = heard(dump.child.stderr);
    const { code } = await dump.ended;
    if (run.leaving) return 130;
    if (code !== 0) {
      throw new Trouble(`pg_dump failed: ${errors()}`, 'See to what it says, then try again. No backup was made.');
    }
    fs.fsyncSync(output);
    fs.renameSync(draft, file);
    say(
      `Backed up ${words}: ${file}\nIt holds addresses and what signs people in; keep it as closely as the database.`,
    );
    return 0;
  } finally {
    fs.closeSync(output);
    fs.rmSync(draft, { force: true });
  }
});
