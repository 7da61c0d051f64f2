import fs from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { heard } from './pg-client.mjs';
import { Trouble } from './trouble.mjs';

const notOfAnExtension = (object) => `NOT EXISTS (SELECT FROM pg_depend WHERE objid = ${object}.oid AND deptype = 'e')`;

/**
 * Removes all that Quadrel may have put into the database, also what a newer version added and the backup does not know. The
 * schema `public` itself stays: it belongs to whoever made the database.
 */
const clear = `
SET lock_timeout = '60s';
SET client_min_messages = warning;
DROP SCHEMA IF EXISTS graphile_worker CASCADE;
DO $clear$
DECLARE
  statement text;
BEGIN
  FOR statement IN
    SELECT format('DROP %s IF EXISTS %s CASCADE',
                  CASE c.relkind WHEN 'v' THEN 'VIEW' WHEN 'm' THEN 'MATERIALIZED VIEW' WHEN 'S' THEN 'SEQUENCE' ELSE 'TABLE' END,
                  c.oid::regclass)
      FROM pg_class c
     WHERE c.relnamespace = 'public'::regnamespace AND c.relkind IN ('r', 'p', 'v', 'm', 'S') AND ${notOfAnExtension('c')}
     UNION ALL
    SELECT format('DROP ROUTINE IF EXISTS %s CASCADE', p.oid::regprocedure)
      FROM pg_proc p WHERE p.pronamespace = 'public'::regnamespace AND ${notOfAnExtension('p')}
     UNION ALL
    SELECT format('DROP TYPE IF EXISTS %s CASCADE', t.oid::regtype)
      FROM pg_type t
     WHERE t.typnamespace = 'public'::regnamespace AND t.typtype IN ('e', 'd') AND ${notOfAnExtension('t')}
  LOOP
    EXECUTE statement;
  END LOOP;
END
$clear$;
`;

/** The list of what a backup holds, in a file, without the schema that stays. */
function writeList(run, list) {
  const folder = fs.mkdtempSync(path.join(tmpdir(), 'quadrel-restore-'));
  run.ownFolder(folder);
  const file = path.join(folder, 'list');
  const kept = list
    .split('\n')
    .filter((line) => !/^\d+; \d+ \d+ (SCHEMA - public|COMMENT - SCHEMA public) /.test(line));
  fs.writeFileSync(file, kept.join('\n'));
  return file;
}

/**
 * Replaces everything by what the backup holds, in one transaction: it is ended by COMMIT only when the whole file was read,
 * and a connection that ends without it leaves the database as it was.
 */
export async function replaceRows(run, client, file, list) {
  const psql = client.start(
    'psql',
    ['--no-psqlrc', '--quiet', '--set=ON_ERROR_STOP=1', '--file=-', client.dbname],
    ['pipe', 'ignore', 'pipe'],
  );
  const said = heard(psql.child.stderr);
  // That psql ended early is told by its exit code.
  psql.child.stdin.on('error', () => undefined);
  psql.child.stdin.write(`BEGIN;\n${clear}`);
  const chosen = ['--no-owner', '--no-privileges', `--use-list=${writeList(run, list)}`];
  const reading = client.start('pg_restore', [...chosen, '--file=-', file], ['ignore', 'pipe', 'pipe']);
  const errors = heard(reading.child.stderr);
  const passedOn = new Promise((resolve) => reading.child.stdout.once('close', resolve));
  reading.child.stdout.pipe(psql.child.stdin, { end: false });
  void psql.ended.then(() => reading.child.stdout.destroy());
  const { code } = await reading.ended;
  await passedOn;
  psql.child.stdin.end(code === 0 ? '\nCOMMIT;\n' : '');
  const result = await psql.ended;
  if (code === 0 && result.code === 0) return;
  throw new Trouble(
    `The backup could not be put into the database: ${said() || errors() || 'it was interrupted'}`,
    'See to what it says, then try again. The database is as it was.',
  );
}
