import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import type { MemberRole } from '@/models/role';

/** An invitation that nobody has accepted and nobody has taken back. */
export interface WaitingInvitation {
  readonly id: string;
  readonly email: string;
  readonly role: MemberRole;
  readonly invitedBy: string | null;
  readonly createdAt: Date;
  readonly expiresAt: Date;
  readonly expired: boolean;
}

/** The invitations of a group that wait to be accepted, the newest first; those that ran out are among them. */
export async function waitingInvitations(groupId: string): Promise<readonly WaitingInvitation[]> {
  return database().query<WaitingInvitation>(
    `SELECT i.id, i.email, i.role, u.name AS "invitedBy", i.created_at AS "createdAt", i.expires_at AS "expiresAt",
            i.expires_at <= now() AS expired
       FROM invitations i LEFT JOIN users u ON u.id = i.invited_by
      WHERE i.group_id = $1 AND i.accepted_at IS NULL AND i.revoked_at IS NULL
      ORDER BY i.created_at DESC, i.id`,
    { bind: [groupId], type: QueryTypes.SELECT },
  );
}
