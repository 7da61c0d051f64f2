import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { closeDatabase } from '@/lib/database/connection';
import { memberOfToken } from '@/lib/people/bearer';
import type { Member } from '@/lib/people/caller';
import { isRefused } from '@/lib/people/refused';
import { hashSecret } from '@/lib/people/secret-text';
import { may } from '@/lib/permissions';
import { mostTokens } from '@/lib/tokens/limits';
import { listTokens } from '@/lib/tokens/list';
import { makeToken, type TokenMade, type TokenWish } from '@/lib/tokens/make';
import { revokeToken } from '@/lib/tokens/revoke';
import { runSql } from '../harness/database';
import { ownDatabase } from '../harness/own-database';
import { newGroup, newMember } from '../harness/people';

const url = ownDatabase();
let author: Member;
let reader: Member;
let steward: Member;

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

beforeEach(async () => {
  const group = await newGroup(url());
  author = await newMember(group, 'author', { url: url(), name: 'Tobias Renk' });
  reader = await newMember(group, 'reader', { url: url(), name: 'Ines Calloway' });
  steward = await newMember(group, 'steward', { url: url(), name: 'Odile Farrant' });
});

const wish: TokenWish = { name: 'night run', scopes: ['read', 'compute'], days: 30 };

async function made(member: Member, change: Partial<TokenWish> = {}): Promise<TokenMade> {
  const answer = await makeToken(member, { ...wish, ...change });
  if (isRefused(answer)) throw new Error(answer.refused);
  return answer;
}

const eventsOf = (member: Member) =>
  runSql(
    url(),
    `SELECT actor_name, action, subject, detail FROM audit_events WHERE group_id = '${member.group.id}' ORDER BY id`,
  );

test('a new token acts for its owner in the group, and only its hash is kept', async () => {
  const { id, secret, expiresAt } = await made(author);
  expect(secret).toMatch(/^qdl_[\w-]{43}$/);
  expect(await memberOfToken(secret)).toEqual({
    ...author,
    token: { id, name: 'night run', scopes: ['read', 'compute'], expiresAt },
  });
  const [row] = await runSql(url(), `SELECT * FROM api_tokens WHERE id = '${id}'`);
  expect(row).toMatchObject({
    token_hash: hashSecret(secret),
    ending: secret.slice(-4),
    last_used_at: expect.any(Date),
  });
  expect(JSON.stringify(row)).not.toContain(secret.slice(4, -4));
});

test('it holds for the days that were asked for', async () => {
  const { id } = await made(author, { days: 366 });
  const [row] = await runSql(
    url(),
    `SELECT expires_at BETWEEN created_at + interval '366 days' - interval '1 minute'
        AND created_at + interval '366 days' + interval '1 minute' AS right FROM api_tokens WHERE id = '${id}'`,
  );
  expect(row).toEqual({ right: true });
});

test('making one is written down, without the secret', async () => {
  const { secret } = await made(author, { scopes: ['write', 'read', 'read'] });
  expect(await eventsOf(author)).toEqual([
    {
      actor_name: 'Tobias Renk',
      action: 'token-made',
      subject: 'night run',
      detail: { scopes: 'read, write', days: 30 },
    },
  ]);
  expect(JSON.stringify(await eventsOf(author))).not.toContain(secret.slice(4, 20));
});

test.each<[string, Partial<TokenWish>, string]>([
  ['without a name', { name: ' \t ' }, 'name'],
  ['with too long a name', { name: 'n'.repeat(81) }, 'name'],
  ['with a name of two lines', { name: 'night\nrun' }, 'name'],
  ['with a name the database cannot hold', { name: 'night\0run' }, 'name'],
  ['with half a character', { name: 'night \ud800' }, 'name'],
  ['that may do nothing', { scopes: [] }, 'scopes'],
  ['for no day', { days: 0 }, 'days'],
  ['for more than a year', { days: 367 }, 'days'],
  ['for half a day', { days: 1.5 }, 'days'],
  ['for no number of days', { days: Number.NaN }, 'days'],
])('a token %s is not made, and what to change is said', async (_, change, field) => {
  expect(await makeToken(author, { ...wish, ...change })).toEqual({ refused: expect.any(String), field });
  expect((await listTokens(author, 'own')).tokens).toEqual([]);
  expect(await eventsOf(author)).toEqual([]);
});

test('a name of eighty characters of any script is kept as it is', async () => {
  const name = '𝔽η’"<b>;--'.repeat(8);
  await made(author, { name: ` ${name} ` });
  expect((await listTokens(author, 'own')).tokens[0]?.name).toBe(name);
});

test('a reader’s token cannot write, also when the role was lowered meanwhile', async () => {
  expect(await makeToken(reader, { ...wish, scopes: ['write'] })).toMatchObject({ field: 'scopes' });
  await runSql(url(), `UPDATE memberships SET role = 'reader' WHERE user_id = '${author.person.id}'`);
  expect(await makeToken(author, { ...wish, scopes: ['write'] })).toMatchObject({ field: 'scopes' });
});

test('a token does what its owner may do now, and its scopes allow', async () => {
  const { secret } = await made(author, { scopes: ['write'] });
  const before = await memberOfToken(secret);
  expect([may(before!, 'identity-write'), may(before!, 'register-read'), may(before!, 'token-state')]).toEqual([
    true,
    false,
    true,
  ]);
  await runSql(url(), `UPDATE memberships SET role = 'reader' WHERE user_id = '${author.person.id}'`);
  const after = await memberOfToken(secret);
  expect(after?.group.role).toBe('reader');
  expect(may(after!, 'identity-write')).toBe(false);
});

test('whoever has left the group makes no token for it, and a token of theirs opens nothing', async () => {
  const { secret } = await made(author);
  await runSql(url(), `DELETE FROM memberships WHERE user_id = '${author.person.id}'`);
  expect(await makeToken(author, wish)).toEqual({ refused: expect.stringContaining('no longer'), field: undefined });
  expect(await memberOfToken(secret)).toBeUndefined();
  expect((await listTokens(steward, 'group')).tokens).toMatchObject([{ owner: 'Tobias Renk', state: 'unseated' }]);
});

test('fifty tokens work at once and not one more, whoever is quick', async () => {
  await runSql(
    url(),
    `INSERT INTO api_tokens (group_id, user_id, name, token_hash, ending, scopes, expires_at, revoked_at)
     SELECT '${author.group.id}', '${author.person.id}', 'old ' || n, gen_random_uuid()::text, 'aaaa', '{read}',
            now() + CASE WHEN n <= ${mostTokens - 2} THEN 1 ELSE -1 END * interval '1 day',
            CASE WHEN n > 60 THEN now() END
       FROM generate_series(1, 70) n`,
  );
  const answers = await Promise.all(Array.from({ length: 8 }, () => makeToken(author, wish)));
  expect(answers.filter((answer) => !isRefused(answer))).toHaveLength(2);
  expect(answers.find(isRefused)?.refused).toContain('Revoke one first');
  // The limit is the person's own.
  await made(steward);
  const live = (await listTokens(author, 'own')).tokens.find(({ state }) => state === 'live');
  await revokeToken(author, live?.id ?? '');
  await made(author);
});

test('revoking ends a token at once, is written down once, and the list says so', async () => {
  const { id, secret } = await made(author);
  expect(await revokeToken(author, id)).toEqual({ outcome: 'revoked', name: 'night run' });
  expect(await memberOfToken(secret)).toBeUndefined();
  expect(await revokeToken(author, id)).toEqual({ outcome: 'already' });
  expect((await listTokens(author, 'own')).tokens).toMatchObject([{ id, state: 'revoked', own: true }]);
  expect((await eventsOf(author)).slice(1)).toEqual([
    {
      actor_name: 'Tobias Renk',
      action: 'token-revoked',
      subject: 'night run',
      detail: { ending: secret.slice(-4) },
    },
  ]);
});

test('two who revoke the same token at the same moment do it once', async () => {
  const { id } = await made(author);
  const outcomes = await Promise.all([revokeToken(author, id), revokeToken(steward, id)]);
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(['already', 'revoked']);
  expect(await eventsOf(author)).toHaveLength(2);
});

test('a steward revokes any token of the group, and it is written down whose it was', async () => {
  const { id, secret } = await made(reader);
  expect(await revokeToken(steward, id)).toMatchObject({ outcome: 'revoked' });
  expect(await memberOfToken(secret)).toBeUndefined();
  expect((await eventsOf(author)).at(-1)).toMatchObject({
    actor_name: 'Odile Farrant',
    action: 'token-revoked',
    detail: { of: 'Ines Calloway' },
  });
});

test('to anyone else a token does not exist', async () => {
  const { id, secret } = await made(steward);
  const elsewhere = await newMember(await newGroup(url()), 'steward', { url: url(), name: 'Maren Iwuji' });
  for (const stranger of [author, reader, elsewhere])
    expect(await revokeToken(stranger, id)).toEqual({ outcome: 'not-there' });
  for (const wrong of ['', 'x', "' OR true --", '00000000-0000-0000-0000-000000000000'])
    expect(await revokeToken(steward, wrong)).toEqual({ outcome: 'not-there' });
  expect(await memberOfToken(secret)).toBeDefined();
  expect((await listTokens(elsewhere, 'group')).tokens).toEqual([]);
  expect((await listTokens(author, 'own')).tokens).toEqual([]);
});

test('an expired token opens nothing and is listed as expired', async () => {
  const { id, secret } = await made(author);
  await runSql(url(), `UPDATE api_tokens SET expires_at = now() WHERE id = '${id}'`);
  expect(await memberOfToken(secret)).toBeUndefined();
  expect((await listTokens(author, 'own')).tokens).toMatchObject([{ state: 'expired', lastUsedAt: null }]);
});

test('the list is read page by page, each token once', async () => {
  await runSql(
    url(),
    `INSERT INTO api_tokens (group_id, user_id, name, token_hash, ending, scopes, created_at, expires_at)
     SELECT '${author.group.id}', '${reader.person.id}', 'n' || n, gen_random_uuid()::text, 'aaaa', '{read}',
            '2026-10-12'::timestamptz + (n / 3) * interval '1 microsecond', now() - interval '1 day'
       FROM generate_series(1, 120) n`,
  );
  const seen: string[] = [];
  for (let after: string | undefined; ;) {
    const page = await listTokens(steward, 'group', after);
    seen.push(...page.tokens.map(({ id }) => id));
    if (page.older === undefined) break;
    after = page.older;
  }
  expect(seen).toHaveLength(120);
  expect(new Set(seen).size).toBe(120);
  // A place of another group, or none at all, begins at the top and shows nothing of that group.
  const other = await newMember(await newGroup(url()), 'steward', { url: url() });
  expect((await listTokens(other, 'group', seen[3])).tokens).toEqual([]);
  expect((await listTokens(steward, 'group', "'; DROP TABLE users --")).tokens).toHaveLength(50);
});
