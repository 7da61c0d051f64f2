import { runStatement } from './database.mjs';

/** The schemas that are Quadrel's: its own tables, and the queue of jobs. */
export const schemas = ['public', 'graphile_worker'];

const plural = (number, word) => `${number} ${word}${number === 1 ? '' : 's'}`;

/** What a database holds: its tables with the number of their rows, and the same in words. */
export async function holdings(url) {
  const list = schemas.map((name) => `'${name}'`).join(', ');
  const { rows } = await runStatement(
    url,
    `SELECT format('%I.%I', schemaname, tablename) AS name FROM pg_tables WHERE schemaname IN (${list}) ORDER BY 1`,
  );
  const names = rows.map((row) => row.name);
  if (names.length === 0) return { tables: 0, words: 'no table' };
  const counts = names.map((name) => `SELECT count(*) AS number FROM ${name}`).join(' UNION ALL ');
  const counted = await runStatement(url, `SELECT sum(number)::text AS number FROM (${counts}) AS counted`);
  const total = Number(counted.rows[0].number);
  return { tables: names.length, words: `${plural(names.length, 'table')} with ${plural(total, 'row')}` };
}
