import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import type { AuditFilter } from './filter';

/** One event, as it was written down. */
export interface AuditEntry {
  readonly id: string;
  readonly at: Date;
  readonly actor: string;
  readonly action: string;
  readonly subject: string;
  readonly detail: Readonly<Record<string, unknown>>;
}

/** Where in the trail to read: older than an event, newer than one, or from the newest on. */
export type AuditPlace = { readonly before?: string; readonly after?: undefined } | { readonly after: string };

export interface AuditPage {
  /** The newest first. */
  readonly entries: readonly AuditEntry[];
  /** Ids to go on from, where there is more. */
  readonly older: string | undefined;
  readonly newer: string | undefined;
}

const pageSize = 50;
/** Digits an id can have without being too large for the column. */
const isEventId = (text: string | undefined): text is string => text !== undefined && /^\d{1,18}$/.test(text);

/** A page of what was done in a group. Pages begin at an event and not at a number, so that new ones shift nothing. */
export async function listAudit(groupId: string, filter: AuditFilter, place: AuditPlace = {}): Promise<AuditPage> {
  if (isEventId(place.after)) {
    const found = (await eventsOf(groupId, filter, { after: place.after }, pageSize + 1)).reverse();
    const entries = found.slice(-pageSize);
    // The newest page is always a full one, so a short answer is read again from its top.
    if (found.length <= pageSize) return listAudit(groupId, filter);
    return { entries, older: entries.at(-1)?.id, newer: entries[0]?.id };
  }
  const before = 'before' in place && isEventId(place.before) ? place.before : undefined;
  const found = await eventsOf(groupId, filter, { before }, pageSize + 1);
  const entries = found.slice(0, pageSize);
  return {
    entries,
    older: found.length > pageSize ? entries.at(-1)?.id : undefined,
    newer: before === undefined ? undefined : (entries[0]?.id ?? String(BigInt(before) - 1n)),
  };
}

/** Every event that the filter leaves, the newest first, read from the database in portions. */
export async function* everyAudit(groupId: string, filter: AuditFilter): AsyncGenerator<readonly AuditEntry[]> {
  const portion = 1000;
  for (let before: string | undefined; ;) {
    const entries = await eventsOf(groupId, filter, { before }, portion);
    if (entries.length > 0) yield entries;
    if (entries.length < portion) return;
    before = entries.at(-1)?.id;
  }
}

/** The names of those who did something in a group, for a choice. */
export async function auditPeople(groupId: string): Promise<readonly string[]> {
  const rows = await database().query<{ name: string }>(
    'SELECT DISTINCT actor_name AS name FROM audit_events WHERE group_id = $1 ORDER BY name LIMIT 500',
    { bind: [groupId], type: QueryTypes.SELECT },
  );
  return rows.map(({ name }) => name);
}

const eventsOf = (
  groupId: string,
  { person, action, from, to, words }: AuditFilter,
  { before, after }: { readonly before?: string; readonly after?: string },
  limit: number,
): Promise<AuditEntry[]> =>
  database().query<AuditEntry>(
    `SELECT id, at, actor_name AS actor, action, subject, detail FROM audit_events
      WHERE group_id = $1
        AND ($2::bigint IS NULL OR id < $2::bigint)
        AND ($3::bigint IS NULL OR id > $3::bigint)
        AND ($4::text IS NULL OR actor_name = $4)
        AND ($5::text IS NULL OR action = $5)
        AND ($6::date IS NULL OR at >= $6::date::timestamp AT TIME ZONE 'UTC')
        AND ($7::date IS NULL OR at < ($7::date + 1)::timestamp AT TIME ZONE 'UTC')
        AND subject ILIKE ALL ($8::text[])
      ORDER BY id ${after === undefined ? 'DESC' : 'ASC'}
      LIMIT ${limit}`,
    {
      bind: [
        groupId,
        before ?? null,
        after ?? null,
        person ?? null,
        action ?? null,
        from ?? null,
        to ?? null,
        (words ?? '').split(/\s+/).filter(Boolean).map(containing),
      ],
      type: QueryTypes.SELECT,
    },
  );

/** A pattern of LIKE for texts in which this word occurs as it stands. */
const containing = (word: string): string => `%${word.replaceAll(/[\\%_]/g, '\\$&')}%`;
