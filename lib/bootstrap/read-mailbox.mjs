// npm run mailbox [-- --last]: prints the newest messages of the mailbox that stands in for a mail service.
import fs from 'node:fs';
import { filesOf } from './mailbox.mjs';
import { readMessage } from './message.mjs';
import { inState } from './paths.mjs';
import { say } from './trouble.mjs';

const shown = process.argv.includes('--last') ? 1 : 10;
const files = filesOf(inState('mailbox'));

for (const file of files.slice(-shown)) {
  const { date, from, to, subject, text } = readMessage(fs.readFileSync(file));
  say(`From: ${from}\nTo: ${to}\nSubject: ${subject}\nDate: ${date}\n\n${text}\n\n${'─'.repeat(72)}`);
}
if (files.length === 0) {
  say('The mailbox is empty. It takes messages while the program runs without SMTP_URL.');
} else if (files.length > shown) {
  say(`${files.length - shown} older messages are in ${inState('mailbox')}.`);
}
