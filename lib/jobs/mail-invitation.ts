import 'server-only';
import { QueryTypes } from 'sequelize';
import { config } from '@/lib/config/config';
import { database } from '@/lib/database/connection';
import { sendMail } from '@/lib/mail/send';
import { hashSecret, newSecret } from '@/lib/people/secret-text';

interface Open {
  readonly email: string;
  readonly role: string;
  readonly expires: Date;
  readonly group: string;
  readonly inviter: string | null;
}

const arm = `
  UPDATE invitations SET token_hash = $hash
    FROM groups
   WHERE invitations.id = $id::uuid AND groups.id = invitations.group_id
     AND accepted_at IS NULL AND revoked_at IS NULL AND expires_at > now()
  RETURNING email, role, expires_at AS expires, groups.name AS "group",
            (SELECT name FROM users WHERE users.id = invitations.invited_by) AS inviter`;

/**
 * Mails an invitation that is still open. The clear token exists in that mail alone: it is made here, and a mail that has to
 * be sent again carries a new one, in whose favour the earlier is forgotten.
 */
export async function mailInvitation({ invitationId }: { invitationId: string }, signal: AbortSignal): Promise<void> {
  const token = newSecret();
  const [open] = await database().query<Open>(arm, {
    type: QueryTypes.SELECT,
    bind: { id: invitationId, hash: hashSecret(token) },
  });
  if (open === undefined) return;
  await sendMail(
    open.email,
    'invitation',
    {
      groupName: open.group,
      inviterName: open.inviter ?? 'A steward',
      role: open.role,
      link: `${config().PUBLIC_URL}/invitation/${token}`,
      expires: open.expires,
    },
    signal,
  );
}
