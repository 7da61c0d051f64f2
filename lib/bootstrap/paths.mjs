import fs from 'node:fs';
import path from 'node:path';
import { Trouble } from './trouble.mjs';

export const root = path.resolve(import.meta.dirname, '..', '..');

/** What this clone makes for itself while it runs: the cluster, secrets, logs, records of runs. Ignored by git. */
export const stateFolder = path.resolve(root, process.env.QUADREL_STATE_FOLDER || '.quadrel');

export const inState = (...parts) => path.join(stateFolder, ...parts);

/** Makes the state folder; only its owner (and the account of the database, further down) may look inside. */
export function makeStateFolder() {
  try {
    fs.mkdirSync(stateFolder, { recursive: true, mode: 0o711 });
    fs.accessSync(stateFolder, fs.constants.R_OK | fs.constants.W_OK | fs.constants.X_OK);
  } catch {
    throw new Trouble(
      `${stateFolder} cannot be written by this user.`,
      'Start as the user who owns this folder (or who started here first), or make a clone of your own.',
    );
  }
}

/** The last lines of a log, for a message. */
export function tail(file, lines = 15) {
  try {
    return fs.readFileSync(file, 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
  } catch {
    return '(no log)';
  }
}
