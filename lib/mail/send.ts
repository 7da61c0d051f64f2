import 'server-only';
import { createTransport } from 'nodemailer';
import { config } from '@/lib/config/config';
import { type PropsOf, type TemplateName, compose } from './templates/registry';

/** One address and nothing else: a list, a name or a second line would reach other people. */
const address = /^[^\s\p{Cc}<>(),;:"[\]\\@]+@[^\s\p{Cc}<>(),;:"[\]\\@]+$/u;

/** Settles never, but for an abort. */
const aborted = (signal: AbortSignal): Promise<never> =>
  new Promise((_, reject) => {
    const stop = () => reject(new Error('The worker had to end while the mail service was still listening.'));
    if (signal.aborted) stop();
    else signal.addEventListener('abort', stop, { once: true });
  });

/**
 * Writes a message from its template and hands it to the mail service. Throws when the service does not take it, and when the
 * signal is given before it has.
 */
export async function sendMail<Name extends TemplateName>(
  to: string,
  name: Name,
  props: PropsOf<Name>,
  signal: AbortSignal,
): Promise<void> {
  const { SMTP_URL, MAIL_FROM } = config();
  if (SMTP_URL === undefined) throw new Error('SMTP_URL is not set, so no mail can be sent.');
  if (!address.test(to)) throw new Error('The address a message was to go to is not one address.');
  const service = createTransport({
    url: SMTP_URL,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
  });
  const sent = service.sendMail({
    from: MAIL_FROM,
    to: { name: '', address: to },
    ...compose(name, props),
    headers: { 'Auto-Submitted': 'auto-generated' },
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  try {
    await Promise.race([sent, aborted(signal)]);
  } finally {
    service.close();
  }
}
