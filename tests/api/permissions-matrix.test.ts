import { beforeAll, describe, expect, test } from 'vitest';
import type { AnyContract } from '@/lib/contracts/contract';
import { contracts } from '@/lib/openapi/contracts';
import type { Caller } from '@/lib/people/caller';
import { visitor } from '@/lib/people/caller';
import { may } from '@/lib/permissions';
import { memberRoles, type MemberRole } from '@/models/role';
import { type Scope, scopes } from '@/models/scope';
import { type Answer, get, post } from '../harness/http';
import { newGroup, newMember, tokenOf } from '../harness/people';
import { forgetAttempts, newAccount, sessionOf } from '../harness/sign-in';
import { kept, newRoom, type Room, sample } from './batteries/room';

/** What the matrix needs to know of a call, beside what its contract says. */
interface Row {
  readonly body?: Readonly<Record<string, unknown>>;
  /** What a caller finds who may call it and whose group has none of it: 404 where the call is about one identity. */
  readonly elsewhere: 'found' | 'not found';
  /** Whether only a token finds something here, and not a session. */
  readonly tokenOnly?: boolean;
}

/** One row for every call: a new one that is missing here fails the first test. */
const rows: Readonly<Record<string, Row>> = {
  normalize: { body: { field: 'Q', expression: '[2]' }, elsewhere: 'found' },
  compare: { body: { field: 'Q', statement: '[2] = [2]' }, elsewhere: 'found' },
  compareMany: { body: { compares: [{ field: 'Q', statement: '[2] = [2]' }] }, elsewhere: 'found' },
  residues: { body: { field: 'Q', expression: '[7]' }, elsewhere: 'found' },
  listIdentities: { elsewhere: 'found' },
  keepIdentity: { body: sample, elsewhere: 'found' },
  readIdentity: { elsewhere: 'not found' },
  reviseIdentity: { body: { ...sample, base: 1 }, elsewhere: 'not found' },
  withdrawIdentity: { body: { base: 1, reason: 'The sign is wrong.' }, elsewhere: 'not found' },
  checkIdentity: { body: {}, elsewhere: 'not found' },
  showIdentity: { body: { visibility: 'public' }, elsewhere: 'not found' },
  exportIdentities: { elsewhere: 'found' },
  token: { elsewhere: 'found', tokenOnly: true },
  health: { elsewhere: 'found' },
  describe: { elsewhere: 'found' },
};

test('every call of the API has its row, and no row is left over', () => {
  expect(Object.keys(rows).sort()).toEqual(contracts.map(({ operation }) => operation).sort());
});

interface Asking {
  readonly name: string;
  /** The caller as the permissions see it. */
  readonly caller: (room: Room) => Caller;
  readonly headers: (room: Room) => Promise<Readonly<Record<string, string>>>;
  readonly elsewhere?: boolean;
}

const seated = (room: Room, role: MemberRole, held?: readonly Scope[]): Caller => ({
  kind: 'member',
  person: room.author.person,
  group: { ...room.group, role },
  ...(held === undefined ? {} : { token: { id: '', name: '', scopes: held, expiresAt: new Date() } }),
});

const withToken = (role: MemberRole, held: readonly Scope[]): Asking => ({
  name: `${role} with a token to ${held.join(', ')}`,
  caller: (room) => seated(room, role, held),
  headers: async ({ group }) => tokenOf(await newMember(group, role), held),
});

const withSession = (role: MemberRole): Asking => ({
  name: `${role}, signed in`,
  caller: (room) => seated(room, role),
  headers: async ({ group }) => {
    const { person } = await newAccount(group, role);
    await forgetAttempts('sign-in-address');
    return { cookie: await sessionOf(person.email), 'sec-fetch-site': 'same-origin' };
  },
});

const askings: readonly Asking[] = [
  { name: 'visitor', caller: () => visitor, headers: () => Promise.resolve({}) },
  {
    name: 'steward of another group',
    caller: (room) => seated(room, 'steward', scopes),
    headers: async () => tokenOf(await newMember(await newGroup(), 'steward')),
    elsewhere: true,
  },
  ...memberRoles.map((role) => withToken(role, scopes)),
  ...memberRoles.map(withSession),
  ...scopes.map((scope) => withToken('steward', [scope])),
];

/** The status that the one table of permissions and the row of the call promise. */
function promised(contract: AnyContract, row: Row, { caller, elsewhere = false }: Asking, room: Room): number {
  const who = caller(room);
  if (!may(who, contract.permission)) return who.kind === 'visitor' ? 401 : 403;
  const foreign = elsewhere || who.kind === 'visitor';
  if (foreign && row.elsewhere === 'not found') return 404;
  if (row.tokenOnly === true && (who.kind === 'visitor' || who.token === undefined)) return 404;
  return contract.success ?? 200;
}

describe.each(askings)('$name', (asking) => {
  let room: Room;
  let headers: Readonly<Record<string, string>>;
  let untouched: string;

  beforeAll(async () => {
    room = await newRoom();
    headers = await asking.headers(room);
    untouched = (await kept(room)).key;
  });

  test.each(contracts)('$operation', async (contract) => {
    const row = rows[contract.operation];
    if (row === undefined) throw new Error(`${contract.operation} has no row.`);
    const status = promised(contract, row, asking, room);
    const changes = contract.path.includes('{key}') && contract.method === 'POST' && status < 300;
    const address = contract.path.replace('{key}', changes ? (await kept(room)).key : untouched);
    const answer: Answer =
      contract.method === 'GET' ? await get(address, headers) : await post(address, row.body, headers);
    expect(answer.status, answer.text.slice(0, 500)).toBe(status);
  });
});
