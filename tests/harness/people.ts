import { randomBytes, randomUUID } from 'node:crypto';
import { inject } from 'vitest';
import pg from 'pg';
import type {} from './provided';
import type { GroupSeat, Member } from '@/lib/people/caller';
import { hashSecret, newSecret } from '@/lib/people/secret-text';
import type { MemberRole } from '@/models/role';
import type { Scope } from '@/models/scope';
import { requireLoopback } from './database';

export type TestGroup = Omit<GroupSeat, 'role'>;

/** Runs one statement with its values and returns its rows. */
export async function query<Row extends pg.QueryResultRow>(
  url: string,
  sql: string,
  values: readonly unknown[] = [],
): Promise<Row[]> {
  const client = new pg.Client({ connectionString: requireLoopback(url) });
  await client.connect();
  try {
    return (await client.query<Row>(sql, [...values])).rows;
  } finally {
    await client.end();
  }
}

/** The database of the server under test. */
export const serverDatabase = (): string => inject('databaseUrl');

/** A new group, without anyone in it, under a short name of its own. */
export async function newGroup(url = serverDatabase(), name = 'Skerry seminar'): Promise<TestGroup> {
  const group = { id: randomUUID(), name, slug: `skerry-x${randomBytes(5).toString('hex')}` };
  await query(url, 'INSERT INTO groups (id, name, slug) VALUES ($1, $2, $3)', [group.id, group.name, group.slug]);
  return group;
}

/** Somebody new in a group. The password, if one is needed, is hashed by the caller. */
export async function newMember(
  group: TestGroup,
  role: MemberRole,
  { url = serverDatabase(), name = 'Tobias Renk', passwordHash = 'none' } = {},
): Promise<Member> {
  const id = randomUUID();
  const email = `${id}@skerry.example`;
  await query(url, 'INSERT INTO users (id, email, name, password_hash) VALUES ($1, $2, $3, $4)', [
    id,
    email,
    name,
    passwordHash,
  ]);
  await query(url, 'INSERT INTO memberships (group_id, user_id, role) VALUES ($1, $2, $3)', [group.id, id, role]);
  return { kind: 'member', person: { id, name, email }, group: { ...group, role } };
}

/** The header of a request with a new token of a member. */
export async function tokenOf(
  { person, group }: Member,
  scopes: readonly Scope[] = ['read', 'compute', 'write'],
  { url = serverDatabase(), expired = false, revoked = false } = {},
): Promise<{ readonly authorization: string }> {
  const secret = `qdl_${newSecret()}`;
  await query(
    url,
    `INSERT INTO api_tokens (group_id, user_id, name, token_hash, ending, scopes, expires_at, revoked_at)
     VALUES ($1, $2, 'night run', $3, $4, $5, now() + $6::interval, CASE WHEN $7 THEN now() END)`,
    [group.id, person.id, hashSecret(secret), secret.slice(-4), scopes, expired ? '-1 second' : '1 hour', revoked],
  );
  return { authorization: `Bearer ${secret}` };
}
