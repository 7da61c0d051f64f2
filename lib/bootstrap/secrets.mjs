import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import { inState, makeStateFolder } from './paths.mjs';

const file = () => inState('secrets.json');

/** The secrets of this clone: made at random when they are first needed, kept where only their owner can read them. */
export function secrets() {
  makeStateFolder();
  const kept = fs.existsSync(file()) ? JSON.parse(fs.readFileSync(file(), 'utf8')) : {};
  const complete = { databasePassword: randomBytes(24).toString('base64url'), ...kept };
  if (kept.databasePassword === undefined) {
    fs.writeFileSync(file(), `${JSON.stringify(complete, null, 2)}\n`, { mode: 0o600 });
  }
  return complete;
}
