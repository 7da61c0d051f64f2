import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import type { MemberRole } from '@/models/role';
import type { GroupSeat } from './caller';

/** The groups a person is in, by name. */
export async function seatsOf(userId: string): Promise<readonly GroupSeat[]> {
  const rows = await database().query<{ id: string; name: string; slug: string; role: MemberRole }>(
    `SELECT g.id, g.name, g.slug, m.role FROM memberships m JOIN groups g ON g.id = m.group_id
      WHERE m.user_id = $1 ORDER BY lower(g.name), g.slug`,
    { bind: [userId], type: QueryTypes.SELECT },
  );
  return rows;
}
