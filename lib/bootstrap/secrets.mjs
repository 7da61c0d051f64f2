import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import { inState, makeStateFolder } from './paths.mjs';

const file = () => inState('secrets.json');

const random = (bytes) => randomBytes(bytes).toString('base64url');

/** The secrets of this clone: made at random when they are first needed, kept where only their owner can read them. */
export function secrets() {
  makeStateFolder();
  const kept = fs.existsSync(file()) ? JSON.parse(fs.readFileSync(file(), 'utf8')) : {};
  const complete = { databasePassword: random(24), sessionSecret: random(48), ...kept };
  if (Object.keys(complete).length > Object.keys(kept).length) {
    // Put in place as a whole: half a file would lock the clone out of its own database.
    const draft = `${file()}.${process.pid}`;
    fs.writeFileSync(draft, `${JSON.stringify(complete, null, 2)}\n`, { mode: 0o600 });
    fs.renameSync(draft, file());
  }
  return complete;
}
