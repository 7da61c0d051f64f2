import { randomUUID } from 'node:crypto';
import type { GroupSeat, Member } from '@/lib/people/caller';
import type { MemberRole } from '@/models/role';
import { runSql } from '../harness/database';

/** A new group, without anyone in it. */
export async function insertGroup(url: string, name = 'Skerry seminar'): Promise<Omit<GroupSeat, 'role'>> {
  const id = randomUUID();
  const slug = `group-x${id.replaceAll('-', '')}`;
  await runSql(url, `INSERT INTO groups (id, name, slug) VALUES ('${id}', '${name}', '${slug}')`);
  return { id, name, slug };
}

/** Somebody new in a group, as signed in. */
export async function insertMember(
  url: string,
  group: Omit<GroupSeat, 'role'>,
  role: MemberRole,
  name = 'Tobias Renk',
): Promise<Member> {
  const id = randomUUID();
  const email = `${id}@skerry.example`;
  await runSql(
    url,
    `INSERT INTO users (id, email, name, password_hash) VALUES ('${id}', '${email}', '${name}', 'unused')`,
    `INSERT INTO memberships (group_id, user_id, role) VALUES ('${group.id}', '${id}', '${role}')`,
  );
  return { kind: 'member', person: { id, name, email }, group: { ...group, role } };
}
