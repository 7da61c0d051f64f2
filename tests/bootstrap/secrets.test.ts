import { execFileSync } from 'node:child_process';
import { readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { makeStateFolder } from './launcher';

const program = path.resolve(import.meta.dirname, '../../lib/bootstrap/secrets.mjs');

/** The secrets as a launcher of its own process gets them, for the folder is chosen when a process begins. */
const secretsIn = (state: string): Record<string, string> => {
  const script = `import(${JSON.stringify(program)}).then(({ secrets }) => console.log(JSON.stringify(secrets())))`;
  const options = { encoding: 'utf8', env: { ...process.env, QUADREL_STATE_FOLDER: state } } as const;
  return JSON.parse(execFileSync(process.execPath, ['-e', script], options)) as Record<string, string>;
};

describe('the secrets of a clone', () => {
  test('are random, kept, and readable by their owner alone', () => {
    const state = makeStateFolder();
    const made = secretsIn(state);
    expect(made.sessionSecret).toMatch(/^[\w-]{64}$/);
    expect(made.databasePassword).toMatch(/^[\w-]{32}$/);
    expect(secretsIn(state)).toEqual(made);
    expect(statSync(path.join(state, 'secrets.json')).mode & 0o777).toBe(0o600);
    expect(secretsIn(makeStateFolder()).sessionSecret).not.toBe(made.sessionSecret);
  });

  test('one that is missing is added, and the others stay', () => {
    const state = makeStateFolder();
    const file = path.join(state, 'secrets.json');
    writeFileSync(file, JSON.stringify({ databasePassword: 'kept-as-it-was' }), { mode: 0o600 });
    const completed = secretsIn(state);
    expect(completed.databasePassword).toBe('kept-as-it-was');
    expect(completed.sessionSecret).toMatch(/^[\w-]{64}$/);
    expect(JSON.parse(readFileSync(file, 'utf8'))).toEqual(completed);
    expect(statSync(file).mode & 0o777).toBe(0o600);
  });
});
