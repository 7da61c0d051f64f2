import 'server-only';
import { QueryTypes } from 'sequelize';
import { fieldNameTex } from '@/engine/expression/to-tex';
import { readFieldName } from '@/grammar/read';
import { ReadingError } from '@/grammar/reading-error';
import type { Typeset } from '@/lib/contracts/typeset';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import { texText } from './escape-tex';

/** What there is to filter the register of a group by. */
export interface RegisterChoices {
  readonly fields: readonly Typeset[];
  readonly tags: readonly string[];
  readonly keepers: readonly string[];
  /** Highest first. */
  readonly degrees: readonly number[];
}

export async function registerChoices({ group }: Member): Promise<RegisterChoices> {
  const distinct = async <Value>(column: string, order = 'value'): Promise<Value[]> => {
    const rows = await database().query<{ value: Value }>(
      `SELECT DISTINCT ${column} AS value FROM identities WHERE group_id = $1 ORDER BY ${order} LIMIT 500`,
      { bind: [group.id], type: QueryTypes.SELECT },
    );
    return rows.map(({ value }) => value);
  };
  const [fields, tags, keepers, degrees] = await Promise.all([
    distinct<string>('field'),
    distinct<string>('unnest(tags)'),
    distinct<string>('keeper_name'),
    distinct<number>('unnest(degrees)', 'value DESC'),
  ]);
  return { fields: fields.map((text) => ({ text, tex: fieldTex(text) })), tags, keepers, degrees };
}

function fieldTex(text: string): string {
  try {
    return fieldNameTex(readFieldName(text));
  } catch (error) {
    if (error instanceof ReadingError) return `\\text{${texText(text)}}`;
    throw error;
  }
}
