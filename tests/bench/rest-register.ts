import { randomBytes, randomUUID } from 'node:crypto';
import pg from 'pg';
import { isAnswer } from '@/lib/compute/request';
import { type IdentityQuery, identityQuery } from '@/lib/contracts/identity-query';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import { readCursor } from '@/lib/register/cursor';
import { conditionsOf } from '@/lib/register/filter';
import { pageSql } from '@/lib/register/list';

// The register over REST with 10 000 identities, against one with 100, and how its queries are planned.
const many = 10_000;
const few = 100;
const rounds = Number(process.env.BENCH_ROUNDS ?? 200);
const base = process.env.QUADREL_URL ?? 'http://127.0.0.1:3000';
const client = new pg.Client({ connectionString: process.env.DATABASE_URL });
await client.connect();

/** Identities whose names are made of fifty words, with five tags, over three fields, in three states. */
const fill = `
  WITH word AS (SELECT ARRAY(SELECT 'word' || chr(97 + n / 26) || chr(97 + n % 26) FROM generate_series(0, 49) n) AS list),
  made AS (
    INSERT INTO identities (group_id, number, revision, state, visibility, keeper_name, name, kind, field, degrees, tags,
                            verdict, words, withdrawn_reason, created_at, changed_at)
    SELECT $1, n, 1, s.state, 'group', (ARRAY['Tobias Renk', 'Maren Iwuji', 'Odile Farrant'])[1 + n % 3], name, 'equality',
           (ARRAY['Q', 'F_7', 'any'])[1 + n % 3], ARRAY[n % 4], ARRAY['tag-' || n % 5, 'all'],
           CASE WHEN s.state = 'draft' THEN 'undecided' ELSE 'equal' END,
           setweight(to_tsvector('simple', name), 'A') || to_tsvector('simple', 'a a 1 a renk ' || s.state),
           CASE WHEN s.state = 'withdrawn' THEN 'Said better elsewhere.' END, at, at
      FROM generate_series(1, $2::int) n, word,
           LATERAL (SELECT list[1 + n % 50] || ' ' || list[1 + (n * 7) % 50] || ' lemma ' || n AS name,
                           now() - (($2::int - n) || ' minutes')::interval AS at) x,
           LATERAL (SELECT CASE WHEN n % 20 = 0 THEN 'draft' WHEN n % 50 = 1 THEN 'withdrawn' ELSE 'checked' END AS state) s
    RETURNING id, name, field, tags, verdict),
  said AS (
    INSERT INTO revisions (identity_id, number, name, kind, field, statement, hypotheses, tags, author_name, typeset)
    SELECT id, 1, name, 'equality', field, '[5][6] = [-1][6]', '{}', tags, 'Tobias Renk',
           '{"field":"F","statement":"[5][6] = [-1][6]","hypotheses":[]}' FROM made
    RETURNING id, name)
  INSERT INTO checks (revision_id, verdict, evidence, engine, duration_ms)
  SELECT said.id, made.verdict, '{"sentence":"The sides are equal, in degree 2."}', '1.0.0', 20
    FROM said JOIN made USING (name)`;

interface Register {
  readonly groupId: string;
  readonly headers: { readonly authorization: string };
}

async function register(size: number): Promise<Register> {
  const [groupId, userId, secret] = [randomUUID(), randomUUID(), `qdl_${newSecret()}`];
  const slug = `bench-x${randomBytes(4).toString('hex')}`;
  await client.query('INSERT INTO groups (id, name, slug, next_number) VALUES ($1, $2, $2, $3)', [
    groupId,
    slug,
    size + 1,
  ]);
  await client.query(`INSERT INTO users (id, email, name, password_hash) VALUES ($1, $2, 'Tobias Renk', 'none')`, [
    userId,
    `${userId}@skerry.example`,
  ]);
  await client.query(`INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, 'reader')`, [groupId, userId]);
  await client.query(
    `INSERT INTO api_tokens (group_id, user_id, name, token_hash, ending, scopes, expires_at)
     VALUES ($1, $2, 'bench', $3, 'xxxx', '{read}', now() + interval '1 hour')`,
    [groupId, userId, hashSecret(secret)],
  );
  await client.query(fill, [groupId, size]);
  return { groupId, headers: { authorization: `Bearer ${secret}` } };
}

interface Spread {
  readonly p50: number;
  readonly p99: number;
}

/** Times of one request after the other, after a few that are not counted. */
async function times({ headers }: Register, query: string): Promise<Spread> {
  const spent: number[] = [];
  for (let round = -10; round < rounds; round += 1) {
    const begun = performance.now();
    const answer = await fetch(`${base}/api/v1/identities?${query}`, { headers });
    await answer.arrayBuffer();
    if (answer.status !== 200) throw new Error(`${query}: ${answer.status}`);
    if (round >= 0) spent.push(performance.now() - begun);
  }
  spent.sort((a, b) => a - b);
  const at = (share: number) => spent[Math.min(spent.length - 1, Math.floor(share * spent.length))] ?? 0;
  return { p50: at(0.5), p99: at(0.99) };
}

/** The cursor before the last page, found by walking there. */
async function lastCursor({ headers }: Register): Promise<string> {
  let cursor: string | undefined;
  for (;;) {
    const query = new URLSearchParams({ limit: '100', ...(cursor === undefined ? {} : { cursor }) });
    const answer = await fetch(`${base}/api/v1/identities?${query.toString()}`, { headers });
    const { next } = (await answer.json()) as { next?: string };
    if (next === undefined) return cursor ?? '';
    cursor = next;
  }
}

/** How PostgreSQL reads the identities of a page. */
async function planOf({ groupId }: Register, query: IdentityQuery): Promise<string[]> {
  const read = conditionsOf(groupId, query);
  if (!isAnswer(read)) throw new Error(read.problem.detail);
  const conditions = read.answer;
  if (query.state !== undefined) conditions.add(`i.state = ${conditions.bind(query.state)}`);
  const place = query.cursor === undefined ? undefined : readCursor(query.cursor, query.sort);
  const { sql, binds } = pageSql(conditions, { sort: query.sort, place, limit: query.limit + 1 });
  const { rows } = await client.query<{ 'QUERY PLAN': string }>(`EXPLAIN ${sql}`, binds);
  return rows.map((row) => row['QUERY PLAN'].trim()).filter((line) => /\b(identities|Sort)\b/.test(line));
}

const large = await register(many);
const small = await register(few);
// As autovacuum would: what waits to go into the index of words is put there.
await client.query('VACUUM (ANALYZE)');

const cases: readonly (readonly [string, Readonly<Record<string, string>>])[] = [
  ['default', {}],
  ['by state', { state: 'draft' }],
  ['by tag', { tag: 'tag-3' }],
  ['by name', { sort: 'name' }],
  ['one word', { words: 'wordab' }],
  ['two beginnings', { words: 'wordb lem' }],
  ['a rare word', { words: '4711' }],
  ['last page', { limit: '100', cursor: await lastCursor(large) }],
];

console.log(`Identities ${many}, against ${few}; ${rounds} requests each, one after the other, in milliseconds.`);
let failed = false;
for (const [name, texts] of cases) {
  const query = new URLSearchParams(texts).toString();
  const slow = await times(large, query);
  const quick = await times(small, name === 'last page' ? 'limit=100' : query);
  const ratio = slow.p50 / quick.p50;
  console.log(
    `${name.padEnd(15)} p50 ${slow.p50.toFixed(1)}  p99 ${slow.p99.toFixed(1)}  ` +
      `p50 against ${few}: ×${ratio.toFixed(1)}  p99/p50 ${(slow.p99 / slow.p50).toFixed(1)}`,
  );
  const plan = await planOf(large, identityQuery.parse(texts));
  for (const line of plan) console.log(`    ${line}`);
  failed ||= plan.some((line) => line.includes('Seq Scan on identities'));
}
await client.end();
if (failed) console.log('A page is read without an index.');
process.exitCode = failed ? 1 : 0;
