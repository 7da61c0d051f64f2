import { beforeAll, expect, test } from 'vitest';
import type { Member } from '@/lib/people/caller';
import type { Scope } from '@/models/scope';
import { type Answer, get, post } from '../../harness/http';
import { newGroup, newMember, query, serverDatabase, tokenOf } from '../../harness/people';
import { forgetAttempts, newAccount, sessionOf } from '../../harness/sign-in';
import { expectProblem } from './described';
import { kept, newRoom, type Room } from './room';

interface MemberCall {
  readonly method: 'get' | 'post';
  /** As the OpenAPI document has it. */
  readonly path: string;
  readonly scope: Scope;
  readonly body?: Readonly<Record<string, unknown>>;
  readonly success: 200 | 201;
  /** Whether anyone may ask, and finds what is public. */
  readonly open?: boolean;
}

type Headers = Readonly<Record<string, string>>;

/** The headers of a request that a page of the program sends for someone who is signed in. */
async function sameOrigin({ person }: Member): Promise<Headers> {
  await forgetAttempts('sign-in-address');
  return { cookie: await sessionOf(person.email), 'sec-fetch-site': 'same-origin' };
}

/** What any call of the register must withstand: callers who are nobody, somebody else, or less than they need to be. */
export function memberBattery({ method, path, scope, body, success, open = false }: MemberCall): void {
  let room: Room;
  let address: string;
  const keyed = path.includes('{key}');
  const ask = (headers: Headers, to = address): Promise<Answer> =>
    method === 'get' ? get(to, headers) : post(to, body ?? {}, headers);
  const problem = (answer: Answer, status: number, code: string) =>
    expectProblem(path, answer, status, code, {}, method);
  /** The address of an identity nobody has changed yet. */
  const fresh = async (in_: Room) => (keyed ? path.replace('{key}', (await kept(in_)).key) : path);

  beforeAll(async () => {
    room = await newRoom();
    address = await fresh(room);
  });

  test('a caller without a token is nobody', async () => {
    const answer = await ask({});
    if (open) return problem(answer, 404, 'not-found');
    await problem(answer, 401, 'unauthenticated');
    expect(answer.headers.get('www-authenticate')).toBe('Bearer');
  });

  test('a token that is expired, revoked, unknown or none is no token', async () => {
    const headers = [
      await tokenOf(room.author, ['read', 'compute', 'write'], { expired: true }),
      await tokenOf(room.author, ['read', 'compute', 'write'], { revoked: true }),
      { authorization: `Bearer qdl_${'A'.repeat(43)}` },
      { authorization: 'Bearer' },
      { authorization: `Bearer ${room.token.authorization}` },
      { authorization: room.token.authorization.replace('Bearer', 'Basic') },
      { authorization: `${room.token.authorization}' OR '1'='1` },
    ];
    for (const one of headers) await problem(await ask(one), 401, 'unauthenticated');
  });

  test('a token without the scope is refused', async () => {
    const others = (['read', 'compute', 'write'] as const).filter((other) => other !== scope);
    await problem(await ask(await tokenOf(room.author, others)), 403, 'forbidden');
    const alone = await ask(await tokenOf(room.author, [scope]), await fresh(room));
    expect(alone.status).toBe(success);
  });

  test('a token of someone who left the group is no token', async () => {
    const leaving = await newMember(room.group, 'author');
    const token = await tokenOf(leaving);
    await query(serverDatabase(), 'DELETE FROM memberships WHERE user_id = $1', [leaving.person.id]);
    await problem(await ask(token), 401, 'unauthenticated');
  });

  if (scope === 'write')
    test('a reader is refused, with a token and with a session', async () => {
      const reader = await newAccount(room.group, 'reader');
      await problem(await ask(await tokenOf(reader)), 403, 'forbidden');
      await problem(await ask(await sameOrigin(reader)), 403, 'forbidden');
    });

  if (keyed)
    test('for another group nothing is there, whatever the role', async () => {
      const stranger = await newMember(await newGroup(), 'steward');
      await problem(await ask(await tokenOf(stranger)), 404, 'not-found');
      const nowhere = path.replace('{key}', `${room.group.slug}-4711`);
      await problem(await ask(room.token, nowhere), 404, 'not-found');
      for (const key of ['nothing', '0', `${room.group.slug}-0`, `${room.group.slug}-1%27`, '%00', 'x'.repeat(2000)])
        await problem(await ask(room.token, path.replace('{key}', key)), 404, 'not-found');
    });

  test('a session counts on the pages of the program, and not on those of others', async () => {
    const author = await newAccount(room.group, 'author');
    const own = await ask(await sameOrigin(author), await fresh(room));
    expect(own.status).toBe(success);
    if (method === 'get') return;
    const cookie = await sessionOf(author.person.email);
    const foreign: readonly Headers[] = [
      { origin: 'https://elsewhere.example' },
      { origin: 'null' },
      { 'sec-fetch-site': 'cross-site' },
      { 'sec-fetch-site': 'same-site' },
      {},
    ];
    for (const headers of foreign) await problem(await ask({ cookie, ...headers }), 401, 'unauthenticated');
  });
}
