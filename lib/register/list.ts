import 'server-only';
import { QueryTypes } from 'sequelize';
import { declined, isAnswer, type Reply } from '@/lib/compute/request';
import type { IdentityList, IdentityQuery, Sort } from '@/lib/contracts/identity-query';
import { problemOf } from '@/lib/contracts/problem';
import { database } from '@/lib/database/connection';
import type { Member } from '@/lib/people/caller';
import type { IdentityState } from '@/models/identity-words';
import { type Place, readCursor, sortKey, writeCursor } from './cursor';
import { type Conditions, conditionsOf } from './filter';
import { identityColumns, type IdentityRow, lastCheck, revisionColumns, summaryOf } from './present';

/** A page of the register of the member's group, with how many there are in each state. */
export async function listIdentities(member: Member, query: IdentityQuery): Promise<Reply<IdentityList>> {
  const { state, sort, limit, cursor } = query;
  const place = cursor === undefined ? undefined : readCursor(cursor, sort);
  if (cursor !== undefined && place === undefined)
    return declined(
      problemOf('invalid', 'This cursor is none that was given for this order. Begin again without it.', {
        part: 'cursor',
      }),
    );
  const read = conditionsOf(member.group.id, query);
  if (!isAnswer(read)) return read;
  const conditions = read.answer;
  const states = await statesOf(conditions);
  if (state !== undefined) conditions.add(`i.state = ${conditions.bind(state)}`);
  // One more than is shown says whether there is more.
  const rows = await pageOf(conditions, { sort, place, limit: limit + 1 });
  const shown = rows.slice(0, limit);
  const last = shown.at(-1);
  const answer = {
    identities: shown.map(summaryOf),
    total: state === undefined ? states.draft + states.checked + states.withdrawn : states[state],
    states,
    ...(rows.length > limit && last !== undefined ? { next: writeCursor(sort, placeOf(last, sort)) } : {}),
  };
  return { status: 200, answer };
}

/** How many identities there are in each state. */
async function statesOf(conditions: Conditions): Promise<Record<IdentityState, number>> {
  const rows = await database().query<{ state: IdentityState; count: number }>(
    `SELECT i.state, count(*)::int AS count FROM identities i WHERE ${conditions.sql} GROUP BY i.state`,
    { bind: [...conditions.binds], type: QueryTypes.SELECT },
  );
  const counted = Object.fromEntries(rows.map(({ state, count }) => [state, count]));
  return { draft: 0, checked: 0, withdrawn: 0, ...counted };
}

type Row = IdentityRow & { readonly changed_exactly: string };

/** What each order compares, most significant first. The number comes last, so that no two rows are alike. */
const orders: Readonly<Record<ReturnType<typeof sortKey>, readonly (readonly [keyof Place, string, string])[]>> = {
  changed: [
    ['changed', 'i.changed_at', 'timestamptz'],
    ['number', 'i.number', 'int'],
  ],
  name: [
    ['name', 'i.name', 'text'],
    ['number', 'i.number', 'int'],
  ],
  number: [['number', 'i.number', 'int']],
  state: [
    ['state', 'i.state', 'text'],
    ['changed', 'i.changed_at', 'timestamptz'],
    ['number', 'i.number', 'int'],
  ],
};

/** Rows after a place, in an order. The page is cut from the identities first and then joined, so that an index serves it. */
export async function pageOf(
  conditions: Conditions,
  { sort, place, limit }: { readonly sort: Sort; readonly place: Place | undefined; readonly limit: number },
): Promise<Row[]> {
  const { sql, binds } = pageSql(conditions, { sort, place, limit });
  return database().query<Row>(sql, { bind: binds, type: QueryTypes.SELECT });
}

/** The query for a page, also for the bench that asks how it is planned. */
export function pageSql(
  conditions: Conditions,
  { sort, place, limit }: { readonly sort: Sort; readonly place: Place | undefined; readonly limit: number },
): { readonly sql: string; readonly binds: unknown[] } {
  const binds = [...conditions.binds];
  const bind = (value: unknown) => `$${binds.push(value)}`;
  const descending = sort.startsWith('-');
  const keys = orders[sortKey(sort)];
  const after =
    place === undefined
      ? ''
      : `AND (${keys.map(([, column]) => column).join(', ')}) ${descending ? '<' : '>'}
             (${keys.map(([key, , type]) => `${bind(place[key])}::${type}`).join(', ')})`;
  const order = keys.map(([, column]) => `${column} ${descending ? 'DESC' : 'ASC'}`).join(', ');
  const sql = `SELECT ${identityColumns}, ${revisionColumns},
      to_char(i.changed_at AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"') AS changed_exactly
    FROM (SELECT i.* FROM identities i WHERE ${conditions.sql} ${after} ORDER BY ${order} LIMIT ${bind(limit)}) i
    JOIN groups g ON g.id = i.group_id
    JOIN revisions r ON r.identity_id = i.id AND r.number = i.revision
    ${lastCheck}
    ORDER BY ${order}`;
  return { sql, binds };
}

function placeOf(row: Row, sort: Sort): Place {
  const whole: Required<Place> = { number: row.number, changed: row.changed_exactly, name: row.name, state: row.state };
  return Object.fromEntries(orders[sortKey(sort)].map(([key]) => [key, whole[key]])) as unknown as Place;
}
