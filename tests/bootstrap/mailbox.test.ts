import { execFileSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createTransport } from 'nodemailer';
import { describe, expect, onTestFinished, test } from 'vitest';
import { openMailbox } from '@/lib/bootstrap/mailbox.mjs';
import { startMailbox } from '../harness/mailbox';

const program = path.resolve(import.meta.dirname, '../../lib/bootstrap/read-mailbox.mjs');

function temporaryFolder(): string {
  const folder = mkdtempSync(path.join(tmpdir(), 'quadrel-state-'));
  onTestFinished(() => rmSync(folder, { recursive: true }));
  return folder;
}

async function send(url: string, subject: string, text: string): Promise<void> {
  const service = createTransport(url);
  await service.sendMail({
    from: 'Quadrel <quadrel@localhost>',
    to: 'maren@skerry.example',
    subject,
    text,
    html: `<p>${text}</p>`,
  });
  service.close();
}

describe('the mailbox that stands in for a mail service', () => {
  test('keeps every message in a file only its owner can read, in a folder only its owner can enter', async () => {
    const folder = path.join(temporaryFolder(), 'mailbox');
    mkdirSync(folder, { mode: 0o755 });
    const { url, close } = await openMailbox(folder);
    await send(url, 'One', 'first');
    await send(url, 'Two', 'second');
    await close();
    const files = readdirSync(folder);
    expect(files).toHaveLength(2);
    expect(files.every((file) => /^\d{4}-\d\d-\d\dT\d\d-\d\d-\d\d-\d{3}Z-[0-9a-f]{8}\.eml$/.test(file))).toBe(true);
    expect(statSync(folder).mode & 0o777).toBe(0o700);
    expect(files.map((file) => statSync(path.join(folder, file)).mode & 0o777)).toEqual([0o600, 0o600]);
  });

  test('keeps the newest five hundred', async () => {
    const folder = temporaryFolder();
    for (let number = 0; number < 500; number += 1) {
      writeFileSync(path.join(folder, `2026-01-01T00-00-00-${String(number).padStart(3, '0')}Z-00000000.eml`), '');
    }
    const { url, close } = await openMailbox(folder);
    await send(url, 'One more', 'the newest');
    await close();
    const files = readdirSync(folder).sort();
    expect(files).toHaveLength(500);
    expect(files[0]).toBe('2026-01-01T00-00-00-001Z-00000000.eml');
  });

  test('is reached from this machine only', async () => {
    const { url, close } = await openMailbox(temporaryFolder());
    expect(new URL(url).hostname).toBe('127.0.0.1');
    await close();
  });

  test('is printed readably, and only its newest message when that is asked for', async () => {
    const state = temporaryFolder();
    const { url, close } = await openMailbox(path.join(state, 'mailbox'));
    await send(url, 'First', 'The first message.');
    await send(
      url,
      'Zweite: ⟨2⟩ = ⟨3⟩',
      `A line that is so long that it has to be broken for the way, ${'η'.repeat(90)}.`,
    );
    await close();
    const print = (...options: string[]) =>
      execFileSync(process.execPath, [program, ...options], {
        encoding: 'utf8',
        env: { ...process.env, QUADREL_STATE_FOLDER: state },
      });
    const all = print();
    expect(all).toContain('From: Quadrel <quadrel@localhost>\nTo: maren@skerry.example\nSubject: First\nDate: ');
    expect(all).toContain('\n\nThe first message.\n');
    const last = print('--last');
    expect(last).not.toContain('The first message.');
    expect(last).toContain('Subject: Zweite: ⟨2⟩ = ⟨3⟩\n');
    expect(last).toContain(`\n\nA line that is so long that it has to be broken for the way, ${'η'.repeat(90)}.\n`);
  });

  test('hands the tests a message as it was sent', async () => {
    const mailbox = await startMailbox();
    onTestFinished(mailbox.stop);
    await send(mailbox.url, 'One', 'See https://quadrel.example/a and https://quadrel.example/b now');
    await send(mailbox.url, 'Two', 'nothing');
    const mail = await mailbox.waitForMail('maren@skerry.example');
    expect(mail).toMatchObject({ subject: 'One', links: ['https://quadrel.example/a', 'https://quadrel.example/b'] });
    expect(mail.html).toContain('<p>See https://quadrel.example/a');
    expect((await mailbox.waitForMail('maren@skerry.example')).subject).toBe('Two');
    await expect(mailbox.waitForMail('maren@skerry.example', 0.2)).rejects.toThrow('No mail to maren@skerry.example');
  });
});
