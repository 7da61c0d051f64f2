import { afterAll, beforeAll, expect, test } from 'vitest';
import { sendMail } from '@/lib/mail/send';
import { type Mailbox, startMailbox } from '../../harness/mailbox';

const props = { name: 'Maren Iwuji', link: 'https://quadrel.example/reset/k3y', expires: new Date() };
const never = new AbortController().signal;
let mailbox: Mailbox;

beforeAll(async () => {
  mailbox = await startMailbox();
  // The configuration is read at the first message, after this.
  Object.assign(process.env, {
    DATABASE_URL: 'postgres://nobody@127.0.0.1/none',
    NEXTAUTH_SECRET: 'a'.repeat(32),
    SMTP_URL: mailbox.url,
    MAIL_FROM: 'The seminar <seminar@skerry.example>',
  });
});
afterAll(() => mailbox.stop());

test('a message goes to its one address, from the address of the settings', async () => {
  await sendMail('maren@skerry.example', 'password-reset', props, never);
  expect(await mailbox.waitForMail('maren@skerry.example')).toMatchObject({
    from: 'The seminar <seminar@skerry.example>',
    subject: 'Choose a new password for Quadrel',
    links: [props.link],
  });
});

test.each([
  'maren@skerry.example, odile@skerry.example',
  'maren@skerry.example\r\nBcc: odile@skerry.example',
  'Maren <maren@skerry.example>',
  'maren@skerry.example>',
  'maren',
  '',
])('nothing is sent to %j, which is not one address', async (to) => {
  const before = mailbox.all().length;
  await expect(sendMail(to, 'password-reset', props, never)).rejects.toThrow('is not one address');
  expect(mailbox.all()).toHaveLength(before);
});

test('a worker that has to end does not wait for the mail service', async () => {
  await expect(sendMail('maren@skerry.example', 'password-reset', props, AbortSignal.abort())).rejects.toThrow(
    'The worker had to end',
  );
});
