import { runSql } from '../harness/database';

const columns = `
  SELECT format('column     %s.%s %s%s%s', c.relname, a.attname, format_type(a.atttypid, a.atttypmod),
                CASE WHEN a.attnotnull THEN ' not null' ELSE '' END,
                coalesce(' default ' || pg_get_expr(d.adbin, d.adrelid), '')) AS line
    FROM pg_class c JOIN pg_attribute a ON a.attrelid = c.oid LEFT JOIN pg_attrdef d ON d.adrelid = c.oid AND d.adnum = a.attnum
   WHERE c.relkind IN ('r', 'p') AND a.attnum > 0 AND NOT a.attisdropped AND c.relnamespace = 'public'::regnamespace
   ORDER BY c.relname COLLATE "C", a.attnum`;

// Newer servers list "not null" as constraints too; it stands with the columns already.
const constraints = `
  SELECT format('constraint %s.%s %s', conrelid::regclass, conname, pg_get_constraintdef(oid)) AS line
    FROM pg_constraint WHERE connamespace = 'public'::regnamespace AND contype <> 'n' ORDER BY 1`;

const indexes = `SELECT format('index      %s', indexdef) AS line FROM pg_indexes WHERE schemaname = 'public' ORDER BY 1`;

const others = `
  SELECT format('%s %s', CASE relkind WHEN 'S' THEN 'sequence  ' WHEN 'v' THEN 'view      ' ELSE 'other     ' END, relname) AS line
    FROM pg_class WHERE relnamespace = 'public'::regnamespace AND relkind NOT IN ('r', 'p', 'i') ORDER BY 1`;

/** The schema of a database as lines of text that do not depend on the version of the server. */
export async function describeSchema(url: string): Promise<string> {
  const lines: string[] = [];
  for (const query of [columns, constraints, indexes, others]) {
    for (const { line } of await runSql(url, query)) lines.push(String(line));
  }
  return `${lines.join('\n')}\n`;
}
