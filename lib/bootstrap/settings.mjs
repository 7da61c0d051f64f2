import { openMailbox } from './mailbox.mjs';
import { inState } from './paths.mjs';
import { secrets } from './secrets.mjs';

/**
 * What the server and the job workers find in their environment: what the person gave, and for the rest what this clone
 * makes for itself. Without a mail service a mailbox of its own is opened; it closes with this process.
 */
export async function servingSettings({ port, databaseUrl }) {
  const publicUrl = process.env.PUBLIC_URL || `http://127.0.0.1:${port}`;
  return {
    PORT: String(port),
    DATABASE_URL: databaseUrl,
    PUBLIC_URL: publicUrl,
    NEXTAUTH_URL: publicUrl,
    NEXTAUTH_SECRET: process.env.NEXTAUTH_SECRET || secrets().sessionSecret,
    SMTP_URL: process.env.SMTP_URL || (await openMailbox(inState('mailbox'))).url,
  };
}
