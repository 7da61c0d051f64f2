import 'server-only';
import { QueryTypes } from 'sequelize';
import { config } from '@/lib/config/config';
import { database } from '@/lib/database/connection';
import { sendMail } from '@/lib/mail/send';
import { hashSecret, newSecret } from '@/lib/people/secret-text';

interface Open {
  readonly email: string;
  readonly name: string;
  readonly expires: Date;
}

const arm = `
  UPDATE password_resets SET token_hash = $hash
    FROM users
   WHERE password_resets.id = $id::uuid AND users.id = password_resets.user_id
     AND used_at IS NULL AND expires_at > now()
  RETURNING email, name, expires_at AS expires`;

/** Mails the link of a password reset that is still open; its token is made here and kept nowhere in clear. */
export async function mailPasswordReset({ resetId }: { resetId: string }, signal: AbortSignal): Promise<void> {
  const token = newSecret();
  const [open] = await database().query<Open>(arm, {
    type: QueryTypes.SELECT,
    bind: { id: resetId, hash: hashSecret(token) },
  });
  if (open === undefined) return;
  await sendMail(
    open.email,
    'password-reset',
    {
      name: open.name,
      link: `${config().PUBLIC_URL}/reset/${token}`,
      expires: open.expires,
    },
    signal,
  );
}
