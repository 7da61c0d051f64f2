import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { filesOf, openMailbox } from '@/lib/bootstrap/mailbox.mjs';
import { readMessage } from '@/lib/bootstrap/message.mjs';

export interface Mail {
  readonly from: string;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  /** The addresses in the text, in order. */
  readonly links: string[];
}

export interface MailReader {
  /** The next message to this address that was not handed out before; waits for it. */
  waitForMail(to: string, seconds?: number): Promise<Mail>;
  /** Every message so far, the oldest first. */
  all(): Mail[];
}

export interface Mailbox extends MailReader {
  /** What a server or a worker is given as SMTP_URL. */
  readonly url: string;
  readonly folder: string;
  stop(): Promise<void>;
}

function read(file: string): Mail {
  const { from, to, subject, text, html } = readMessage(readFileSync(file));
  return { from, to, subject, text, html, links: text.match(/https?:\/\/\S+/g) ?? [] };
}

/** Reads the messages that come into a folder. */
export function readerOf(folder: string): MailReader {
  const handedOut = new Set<string>();
  return {
    all: () => filesOf(folder).map(read),
    async waitForMail(to, seconds = 60) {
      for (const limit = Date.now() + 1000 * seconds; Date.now() < limit; await pause(50)) {
        for (const file of filesOf(folder)) {
          if (handedOut.has(file)) continue;
          const mail = read(file);
          if (mail.to !== to) continue;
          handedOut.add(file);
          return mail;
        }
      }
      throw new Error(`No mail to ${to} came within ${seconds} seconds.`);
    },
  };
}

/** Opens a mailbox in a temporary folder, on a port of its own or a given one. */
export async function startMailbox(port?: number): Promise<Mailbox> {
  const folder = mkdtempSync(path.join(tmpdir(), 'quadrel-mailbox-'));
  const { url, close } = await openMailbox(folder, port);
  const stop = async () => {
    await close();
    rmSync(folder, { recursive: true });
  };
  return { ...readerOf(folder), url, folder, stop };
}
