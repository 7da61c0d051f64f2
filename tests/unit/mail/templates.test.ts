import { createTransport } from 'nodemailer';
import { describe, expect, test } from 'vitest';
import { readMessage } from '@/lib/bootstrap/message.mjs';
import type { Message } from '@/lib/mail/letter';
import { compose } from '@/lib/mail/templates/registry';

const expires = new Date('2027-03-01T14:05:00Z');
const plain = {
  groupName: 'Skerry seminar',
  inviterName: 'Tobias Renk',
  role: 'author',
  link: 'https://quadrel.example/invitation/k3y',
  expires,
};
const reset = { name: 'Maren Iwuji', link: 'https://quadrel.example/reset/k3y', expires };

const messages: { name: string; message: Message; link: string; label: string; nothing: string }[] = [
  {
    name: 'invitation',
    message: compose('invitation', plain),
    link: plain.link,
    label: 'Join the group',
    nothing: 'If you do nothing, no account is made and the invitation lapses.',
  },
  {
    name: 'password-reset',
    message: compose('password-reset', reset),
    link: reset.link,
    label: 'Choose a new password',
    nothing: 'If you did not ask, do nothing: your password stays as it is.',
  },
];

const unwrapped = (text: string) => text.replace(/\n(?!\n)/g, ' ');

describe.each(messages)('$name', ({ message, link, label, nothing }) => {
  test('has one button, and it is the link', () => {
    expect(message.html.match(/<a /g)).toHaveLength(1);
    expect(message.html.match(/<td style="background:#97371c"><a /g)).toHaveLength(1);
    expect(message.html).toContain(`href="${link}"`);
    expect(message.html).toContain(`>${label}</a>`);
  });

  test('fetches nothing and tells nobody that it was read', () => {
    expect(message.html).not.toMatch(/<(img|link|script|style|iframe|object)|url\(|@import|src=/i);
    expect(message.html.match(/https?:\/\/[^"<\s]+/g)).toEqual([link]);
  });

  test('says in both forms until when, and what happens if one does nothing', () => {
    for (const body of [unwrapped(message.text), message.html]) {
      expect(body).toContain('1 March 2027 at 14:05 UTC');
      expect(body).toContain(nothing);
    }
  });

  test('in plain text the link stands alone on its line, and no other line is long', () => {
    const lines = message.text.split('\n');
    expect(lines).toContain(link);
    expect(lines.filter((line) => line !== link && line.length > 72)).toEqual([]);
  });

  test('keeps to the words of the program', () => {
    expect(`${message.subject}\n${message.text}`).not.toMatch(/!|oops|success|simply/i);
  });
});

test('a text says who asks, for what and as what', () => {
  expect(messages[0]?.message.subject).toBe('Tobias Renk invites you to the group Skerry seminar');
  expect(messages[0]?.message.text).toContain(
    'Tobias Renk invites you to join the group Skerry seminar on Quadrel, as\nan author.',
  );
  expect(compose('invitation', { ...plain, role: 'reviewer' }).text).toContain('as\na reviewer.');
});

describe('names people chose', () => {
  const hostile = `"Odile" <b>O'Farrant</b> & <img src=x onerror=alert(1)>`;

  test('stand in HTML as letters, never as marks', () => {
    for (const { html } of [
      compose('invitation', { ...plain, groupName: hostile, inviterName: hostile, role: hostile }),
      compose('password-reset', { ...reset, name: hostile }),
    ]) {
      expect(html).not.toMatch(/<b>|<img/);
      expect(html).toContain(
        '&quot;Odile&quot; &lt;b&gt;O&#39;Farrant&lt;/b&gt; &amp; &lt;img src=x onerror=alert(1)&gt;',
      );
    }
  });

  test('stand in plain text as they are', () => {
    const { text } = compose('password-reset', { ...reset, name: hostile });
    expect(unwrapped(text)).toContain(`${hostile}, a new password was asked for`);
  });

  test('stay on one line, without marks that turn the direction of reading, and not too long', () => {
    const { subject } = compose('invitation', {
      ...plain,
      inviterName: 'Tobias\r\nBcc: odile@skerry.example\u2028\u202eRenk',
      groupName: 'η'.repeat(500),
    });
    expect(subject).toBe(`Tobias Bcc: odile@skerry.example Renk invites you to the group ${'η'.repeat(119)}…`);
  });

  test('are no encoded words', () => {
    const { subject, text } = compose('invitation', { ...plain, inviterName: '=?utf-8?Q?Odile_Farrant?=' });
    expect(subject).not.toContain('=?');
    expect(text).toContain('=?utf-8?Q?Odile_Farrant?=');
  });

  test('are never headers of the message, and letters of every script arrive', async () => {
    const inviterName = 'Ödile "F." Farrant\r\nBcc: maren@skerry.example\r\n\r\n<p>早瀬';
    const sent = await createTransport({ streamTransport: true, buffer: true }).sendMail({
      from: 'Quadrel <quadrel@localhost>',
      to: { name: '', address: 'maren@skerry.example' },
      ...compose('invitation', { ...plain, inviterName }),
    });
    expect(sent.envelope.to).toEqual(['maren@skerry.example']);
    const bytes = sent.message as Buffer;
    expect(bytes.toString('latin1').split('\r\n\r\n')[0]).not.toMatch(/^bcc:/im);
    const read = readMessage(bytes);
    const oneLine = 'Ödile "F." Farrant Bcc: maren@skerry.example <p>早瀬';
    expect(read.subject).toBe(`${oneLine} invites you to the group Skerry seminar`);
    expect(unwrapped(read.text)).toContain(`${oneLine} invites you to join`);
  });
});
