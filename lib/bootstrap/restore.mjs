// npm run restore -- <file> [--yes]: puts the rows of a backup in the place of those the database holds.
import fs from 'node:fs';
import path from 'node:path';
import { reachDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { holdings } from './holdings.mjs';
import { launch } from './launch.mjs';
import { openClient } from './pg-client.mjs';
import { replaceRows } from './replace-rows.mjs';
import { requireBackup } from './require-backup.mjs';
import { servingRun } from './run.mjs';
import { Trouble, say } from './trouble.mjs';

const usage = 'Give it as in: npm run restore -- .quadrel/backups/2027-03-01T14-05-00.dump';

function source(given) {
  if (given === undefined) throw new Trouble('No file was named to restore from.', usage);
  const file = path.resolve(process.env.INIT_CWD ?? process.cwd(), given);
  try {
    if (fs.statSync(file).isFile()) return file;
  } catch {
    // Told below, with everything else that is no file.
  }
  throw new Trouble(`There is no file ${file}.`, usage);
}

const words = process.argv.slice(2);
const confirmed = words.includes('--yes');
const serving = servingRun();

await launch(serving === undefined ? 'server' : 'restore', 'npm run restore', 130, async (run) => {
  requireNode();
  if (serving !== undefined) {
    throw new Trouble(
      `The server of this clone runs (process ${serving.pid}, ${serving.address}), and a restore would change the rows under it.`,
      'Stop it first (Ctrl-C in its window, or kill with its number), then restore.',
    );
  }
  const file = source(words.find((word) => !word.startsWith('--')));
  await ensureDependencies(run);
  const url = await reachDatabase(run);
  const client = await openClient(run, url);
  const list = await requireBackup(client, file);
  const before = await holdings(url);
  if (before.tables > 0 && !confirmed) {
    throw new Trouble(
      `The database holds ${before.words}, and a restore replaces all of it.`,
      `To keep what is there: npm run backup. To replace it: npm run restore -- ${file} --yes`,
    );
  }
  await replaceRows(run, client, file, list);
  const after = await holdings(url);
  say(
    `Restored ${after.words} from ${file}, in place of ${before.words}. npm start brings them up to date and serves them.`,
  );
  return 0;
});
