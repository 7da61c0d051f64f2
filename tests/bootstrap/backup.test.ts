import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, readFileSync, readdirSync, statSync, truncateSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { rollBack } from '@/lib/database/migrate.mjs';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';
import { makeStateFolder, startLauncher } from './launcher';

const folder = path.resolve(import.meta.dirname, '../../lib/bootstrap');
const url = ownDatabase();
const other = ownDatabase({ empty: true });

interface Place {
  readonly state: string;
  /** Left out, the state folder's own cluster is meant. */
  readonly databaseUrl?: string;
}

/** Runs `npm run backup` or `npm run restore` and returns its exit code and all it said. */
async function run(command: 'backup' | 'restore', { state, databaseUrl }: Place, ...words: string[]) {
  const { DATABASE_URL: _unused, INIT_CWD: _neither, ...environment } = process.env;
  const child = spawn(process.execPath, [path.join(folder, `${command}.mjs`), ...words], {
    cwd: state,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...environment,
      QUADREL_STATE_FOLDER: state,
      ...(databaseUrl === undefined ? {} : { DATABASE_URL: databaseUrl }),
    },
  });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (data: Buffer) => (output += data.toString()));
  await once(child, 'close');
  return { code: child.exitCode, output };
}

const tables = async (database: string) =>
  (
    await runSql(
      database,
      `SELECT format('%I.%I', schemaname, tablename) AS name FROM pg_tables
        WHERE schemaname IN ('public', 'graphile_worker') ORDER BY 1`,
    )
  ).map(({ name }) => String(name));

/** Every row of every table, as text. */
async function everything(database: string): Promise<Record<string, unknown[]>> {
  const all: Record<string, unknown[]> = {};
  for (const table of await tables(database)) {
    all[table] = (await runSql(database, `SELECT t::text AS row FROM ${table} AS t ORDER BY 1`)).map(({ row }) => row);
  }
  return all;
}

const fill = (database: string) =>
  runSql(
    database,
    `INSERT INTO permalinks (code, field, statement) VALUES ('zzzzzzzzzz', 'Q', E'η[2] = ⟨3⟩ \\\\ \\'\\nCOMMIT;')`,
    `INSERT INTO users (email, name, password_hash) VALUES ('tobias@skerry.example', 'Tobias Renk', 'hash')`,
    `SELECT graphile_worker.add_job('mail-invitation', '{"invitationId": "later"}', run_at => now() + interval '1 day')`,
  );

describe('a backup', () => {
  test('holds every row with the waiting jobs, and brings them back over later changes', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    await fill(url());
    const before = await everything(url());
    expect(before['graphile_worker._private_jobs']).toHaveLength(1);

    const made = await run('backup', place);
    expect(made).toMatchObject({ code: 0 });
    const [name = ''] = readdirSync(path.join(place.state, 'backups'));
    const file = path.join(place.state, 'backups', name);
    expect(made.output).toContain(`: ${file}\n`);
    expect(name).toMatch(/^\d{4}-\d\d-\d\dT\d\d-\d\d-\d\d\.dump$/);
    expect(statSync(file).mode & 0o777).toBe(0o600);

    await runSql(
      url(),
      'DELETE FROM permalinks',
      `UPDATE users SET name = 'Maren Iwuji'`,
      'DELETE FROM graphile_worker._private_jobs',
      'CREATE TABLE later (of text)',
      `CREATE FUNCTION later() RETURNS int LANGUAGE sql AS 'SELECT 1'`,
    );
    const asked = await run('restore', place, file);
    expect(asked.code).toBe(1);
    expect(asked.output).toMatch(/The database holds \d+ tables with \d+ rows, and a restore replaces all of it\./);
    expect(asked.output).toContain(`npm run restore -- ${file} --yes`);
    expect(await tables(url())).toContain('public.later');

    const restored = await run('restore', place, file, '--yes');
    expect(restored).toMatchObject({ code: 0 });
    expect(restored.output).toMatch(
      /^Restored \d+ tables with \d+ rows from .*, in place of \d+ tables with \d+ rows\./,
    );
    expect(await everything(url())).toEqual(before);
    // What counts up goes on from where it was.
    await runSql(url(), `INSERT INTO permalinks (code, field, statement) VALUES ('yyyyyyyyyy', 'Q', '[2] = [2]')`);
    await runSql(url(), `SELECT graphile_worker.add_job('mail-invitation', '{}')`);
  });

  test('fills an empty database without asking', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    const file = path.join(place.state, 'one.dump');
    expect(await run('backup', place, file)).toMatchObject({ code: 0 });
    const restored = await run('restore', { ...place, databaseUrl: other() }, 'one.dump');
    expect(restored.output).toContain('in place of no table.');
    expect(await everything(other())).toEqual(await everything(url()));
    expect((await rollBack(other())).length).toBeGreaterThan(0);
  });

  test('does not write over a file, and leaves nothing behind when it cannot be made', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    const file = path.join(place.state, 'one.dump');
    writeFileSync(file, 'mine');
    expect((await run('backup', place, file)).output).toContain(`${file} is there already.`);
    expect(readFileSync(file, 'utf8')).toBe('mine');
    const wrong = url().replace(/:[^:@]+@/, ':wrong@');
    const refused = await run('backup', { ...place, databaseUrl: wrong }, `${file}2`);
    expect(refused).toMatchObject({ code: 1 });
    expect(refused.output).not.toContain('wrong');
    expect(existsSync(`${file}2`) || existsSync(`${file}2.part`)).toBe(false);
  });
});

describe('a file that is no whole backup of Quadrel is refused, and nothing is touched', () => {
  const refuse = async (file: string, place: Place, message: string) => {
    const before = await everything(url());
    const refused = await run('restore', place, file, '--yes');
    expect(refused.code).toBe(1);
    expect(refused.output).toContain(message);
    expect(await everything(url())).toEqual(before);
  };

  test('one that is not there, or is something else', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    const file = path.join(place.state, 'words.dump');
    await refuse(file, place, `There is no file ${file}.`);
    writeFileSync(file, 'DROP TABLE users;');
    await refuse(file, place, `${file} is no backup, or it is damaged: pg_restore: error:`);
  });

  test('one that was cut short', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    const file = path.join(place.state, 'cut.dump');
    await run('backup', place, file);
    truncateSync(file, statSync(file).size - 200);
    await refuse(file, place, `${file} is no backup, or it is damaged: pg_restore: error:`);
  });

  test('one of another database', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    await runSql(other(), 'DROP SCHEMA public CASCADE; CREATE SCHEMA public; CREATE TABLE ships (name text)');
    const file = path.join(place.state, 'ships.dump');
    await run('backup', { ...place, databaseUrl: other() }, file);
    await refuse(file, place, "was made from another database than Quadrel's.");
  });

  test('one of a newer version of the program', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    await runSql(url(), `INSERT INTO migrations (name) VALUES ('9999-from-the-future.mjs')`);
    const file = path.join(place.state, 'newer.dump');
    await run('backup', place, file);
    await runSql(url(), `DELETE FROM migrations WHERE name LIKE '9999%'`);
    await refuse(file, place, 'made by a newer version of the program (it has the migration 9999-from-the-future.mjs)');
  });

  test('one whose rows the database does not take', async () => {
    const place = { state: makeStateFolder(), databaseUrl: url() };
    const file = path.join(place.state, 'one.dump');
    await run('backup', place, file);
    await runSql(url(), 'CREATE SCHEMA elsewhere');
    await runSql(
      url(),
      `CREATE FUNCTION elsewhere.refuse() RETURNS event_trigger LANGUAGE plpgsql
         AS 'BEGIN RAISE EXCEPTION ''no index today''; END'`,
      `CREATE EVENT TRIGGER no_index ON ddl_command_start WHEN TAG IN ('CREATE INDEX') EXECUTE FUNCTION elsewhere.refuse()`,
    );
    await refuse(file, place, 'no index today');
    await runSql(url(), 'DROP EVENT TRIGGER no_index', 'DROP SCHEMA elsewhere CASCADE');
  });
});

describe('the cluster of a clone', () => {
  test('is started for a backup and for a restore, and stopped after; while a server runs only a backup is made', async () => {
    const state = makeStateFolder();
    expect((await run('backup', { state })).output).toContain('This clone has no database yet');
    const first = startLauncher(state, 'database');
    const { url: firstUrl } = await first.ready;
    await fill(String(firstUrl));
    const before = await everything(String(firstUrl));
    first.child.kill('SIGTERM');
    await first.over;

    const file = path.join(state, 'one.dump');
    expect(await run('backup', { state }, file)).toMatchObject({ code: 0 });
    expect(await run('restore', { state }, file, '--yes')).toMatchObject({ code: 0 });

    const second = startLauncher(state, 'serving');
    const { url: secondUrl } = await second.ready;
    expect(await everything(String(secondUrl))).toEqual(before);
    expect(await run('backup', { state }, `${file}2`)).toMatchObject({ code: 0 });
    const refused = await run('restore', { state }, file, '--yes');
    expect(refused.output).toContain(
      `The server of this clone runs (process ${second.child.pid}, http://127.0.0.1:1), and a restore would change the rows under it.\nStop it first`,
    );
    expect(await everything(String(secondUrl))).toEqual(before);
  });
});
