import fs from 'node:fs';
import path from 'node:path';
import { root } from './paths.mjs';
import { Trouble } from './trouble.mjs';

const nothing = 'Nothing in the database was changed.';

/**
 * Sees, before anything is touched, that a file is a whole backup of Quadrel, and of no newer version than this one. Returns the
 * list of what it holds.
 */
export async function requireBackup(client, file) {
  const list = await client.finish('pg_restore', ['--list', file]);
  const whole = list.code === 0 ? await client.finish('pg_restore', ['--file=/dev/null', file]) : list;
  if (whole.code !== 0) {
    throw new Trouble(
      `${file} is no backup, or it is damaged: ${whole.errors}`,
      `Choose a file that npm run backup wrote. ${nothing}`,
    );
  }
  if (!/ TABLE public migrations /.test(list.output) || !/ TABLE public permalinks /.test(list.output)) {
    throw new Trouble(
      `${file} was made from another database than Quadrel's.`,
      `Choose a file that npm run backup wrote. ${nothing}`,
    );
  }
  const rows = await client.finish('pg_restore', [
    '--data-only',
    '--schema=public',
    '--table=migrations',
    '--file=-',
    file,
  ]);
  const known = new Set(fs.readdirSync(path.join(root, 'migrations')));
  const unknown = rows.output.split('\n').find((line) => /^\S+\.mjs$/.test(line) && !known.has(line));
  if (unknown === undefined) return list.output;
  throw new Trouble(
    `${file} was made by a newer version of the program (it has the migration ${unknown}).`,
    `Bring this clone up to that version first. ${nothing}`,
  );
}
