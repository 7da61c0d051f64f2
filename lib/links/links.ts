import 'server-only';
import { Permalink } from '@/models/permalink';
import { database } from '@/lib/database/connection';
import { isCode, linkCode, longestCode, shortestCode } from './code';

/** What PostgreSQL can keep of a text: no NUL and no half of a surrogate pair. */
const storable = (text: string): string => Buffer.from(text, 'utf8').toString('utf8').replaceAll('\0', '\ufffd');

/**
 * Keeps a statement over a field and returns its code. Keeping the same one again returns the same code. Should two
 * different statements ever share a code, the later one gets a longer code.
 */
export async function saveLink(field: string, statement: string): Promise<string> {
  database();
  const wanted = { field: storable(field), statement: storable(statement) };
  for (let length = shortestCode; length <= longestCode; length += 1) {
    const code = linkCode(wanted.field, wanted.statement, length);
    await Permalink.bulkCreate([{ code, ...wanted }], { ignoreDuplicates: true });
    const kept = await Permalink.findByPk(code, { rejectOnEmpty: true });
    if (kept.field === wanted.field && kept.statement === wanted.statement) return code;
  }
  throw new Error('Two different statements have the same SHA-256.');
}

/** What is kept under a code, or undefined when nothing is. */
export async function openLink(code: string): Promise<{ field: string; statement: string } | undefined> {
  if (!isCode(code)) return undefined;
  database();
  const kept = await Permalink.findByPk(code);
  return kept === null ? undefined : { field: kept.field, statement: kept.statement };
}
