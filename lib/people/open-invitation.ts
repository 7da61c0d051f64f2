import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';
import type { MemberRole } from '@/models/role';
import { given } from './given';
import { hashSecret } from './secret-text';
import { attempt, giveBack } from './throttle';

export interface OpenInvitation {
  readonly state: 'open';
  readonly id: string;
  readonly groupId: string;
  readonly groupName: string;
  readonly slug: string;
  readonly email: string;
  readonly role: MemberRole;
  readonly invitedBy: string | null;
  readonly expiresAt: Date;
  /** Whether the address already has an account; only who holds the link is told. */
  readonly hasAccount: boolean;
}

/** Why a link invites nobody, with the group where it is known. */
export interface DeadInvitation {
  readonly state: 'expired' | 'used' | 'revoked' | 'unknown';
  readonly groupName?: string;
}

export interface TooOften {
  readonly state: 'too-often';
  readonly seconds: number;
}

interface Row extends Omit<OpenInvitation, 'state'> {
  readonly acceptedAt: Date | null;
  readonly revokedAt: Date | null;
  readonly expired: boolean;
}

const withHash = `
  SELECT i.id, i.group_id AS "groupId", g.name AS "groupName", g.slug, i.email, i.role, i.expires_at AS "expiresAt",
         i.accepted_at AS "acceptedAt", i.revoked_at AS "revokedAt", i.expires_at <= now() AS expired,
         (SELECT name FROM users WHERE users.id = i.invited_by) AS "invitedBy",
         EXISTS (SELECT 1 FROM users WHERE users.email = i.email) AS "hasAccount"
    FROM invitations i JOIN groups g ON g.id = i.group_id
   WHERE i.token_hash = $1`;

/** The invitation of a link as it is now; its row is locked on request, until the transaction ends. */
export async function findInvitation(
  token: string,
  transaction?: Transaction,
  lock = false,
): Promise<OpenInvitation | DeadInvitation> {
  if (!given.linkToken.safeParse(token).success) return { state: 'unknown' };
  const [row] = await database().query<Row>(lock ? `${withHash} FOR UPDATE OF i` : withHash, {
    bind: [hashSecret(token)],
    type: QueryTypes.SELECT,
    transaction,
  });
  if (row === undefined) return { state: 'unknown' };
  const { acceptedAt, revokedAt, expired, ...invitation } = row;
  if (acceptedAt !== null) return { state: 'used', groupName: row.groupName };
  if (revokedAt !== null) return { state: 'revoked', groupName: row.groupName };
  if (expired) return { state: 'expired', groupName: row.groupName };
  return { state: 'open', ...invitation };
}

/** Opens the link of an invitation. Links that are none are counted by the address they are tried from. */
export async function openInvitation(
  token: string,
  address: string,
): Promise<OpenInvitation | DeadInvitation | TooOften> {
  const seconds = await attempt('link-address', address);
  if (seconds !== undefined) return { state: 'too-often', seconds };
  const invitation = await findInvitation(token);
  if (invitation.state !== 'unknown') await giveBack('link-address', address);
  return invitation;
}
