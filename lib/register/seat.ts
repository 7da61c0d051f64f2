import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';
import { problemOf, type Problem } from '@/lib/contracts/problem';
import type { Member } from '@/lib/people/caller';
import { roleMay } from '@/lib/permissions';
import type { MemberRole } from '@/models/role';

const lost = problemOf('forbidden', 'Your role in this group was changed meanwhile, and no longer allows this.');

/**
 * Makes sure, inside a transaction, that a member may still change the register: a check can take seconds, and a role may be
 * taken away in them. The group is locked before the membership, as whoever changes roles does it.
 */
export async function seatProblem(member: Member, transaction: Transaction): Promise<Problem | undefined> {
  const bind = [member.group.id];
  await database().query('SELECT id FROM groups WHERE id = $1 FOR KEY SHARE', { bind, transaction });
  const [seat] = await database().query<{ role: MemberRole }>(
    'SELECT role FROM memberships WHERE group_id = $1 AND user_id = $2 FOR SHARE',
    { bind: [member.group.id, member.person.id], type: QueryTypes.SELECT, transaction },
  );
  return seat !== undefined && roleMay(seat.role, 'identity-write') ? undefined : lost;
}
