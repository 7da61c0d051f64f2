import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import type { MemberRole } from '@/models/role';

export interface MemberRow {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly role: MemberRole;
  readonly since: Date;
}

/** The members of a group: stewards first, then by name. */
export async function membersOf(groupId: string): Promise<readonly MemberRow[]> {
  return database().query<MemberRow>(
    `SELECT u.id, u.name, u.email, m.role, m.created_at AS since
       FROM memberships m JOIN users u ON u.id = m.user_id
      WHERE m.group_id = $1
      ORDER BY array_position(ARRAY['steward', 'reviewer', 'author', 'reader'], m.role), lower(u.name), u.email`,
    { bind: [groupId], type: QueryTypes.SELECT },
  );
}
