import { createHash } from 'node:crypto';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, onTestFinished, test } from 'vitest';
import { closeDatabase, database } from '@/lib/database/connection';
import { enqueue } from '@/lib/jobs/enqueue';
import { perform } from '@/lib/jobs/jobs';
import { runSql } from '../harness/database';
import { startMailbox } from '../harness/mailbox';
import { ownDatabase } from '../harness/own-database';
import { startJobWorker } from '../harness/worker';
import { insertMailRows } from './mail-rows';

const url = ownDatabase();
const signal = new AbortController().signal;

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

const PUBLIC_URL = 'https://quadrel.example';
const openMailbox = async (port?: number) => {
  const mailbox = await startMailbox(port);
  onTestFinished(mailbox.stop);
  return mailbox;
};
const startWorker = async (SMTP_URL: string) => {
  const worker = await startJobWorker({ DATABASE_URL: url(), SMTP_URL, PUBLIC_URL });
  onTestFinished(async () => void (await worker.stop()));
  return worker;
};
const invite = (invitationId: string) =>
  database().transaction((transaction) => enqueue('mail-invitation', { invitationId }, transaction));
const waiting = () =>
  runSql(url(), 'SELECT task_identifier, attempts, last_error FROM graphile_worker.jobs ORDER BY id');
const untilNoneWaits = async () => {
  while ((await waiting()).length > 0) await pause(50);
};
const hashOf = async (table: string, id: string) =>
  (await runSql(url(), `SELECT token_hash FROM ${table} WHERE id = '${id}'`))[0]?.token_hash;
const sha256 = (text: string | undefined) => createHash('sha256').update(String(text)).digest('hex');

describe('a job', () => {
  test('is put into the queue with its transaction, and not when that is rolled back', async () => {
    const mailbox = await openMailbox();
    const kept = await insertMailRows(url());
    const undone = await insertMailRows(url());
    await expect(
      database().transaction(async (transaction) => {
        await enqueue('mail-invitation', { invitationId: undone.invitationId }, transaction);
        throw new Error('thought better of it');
      }),
    ).rejects.toThrow('thought better of it');
    expect(await waiting()).toEqual([]);
    await invite(kept.invitationId);
    await startWorker(mailbox.url);
    await mailbox.waitForMail(kept.email);
    await untilNoneWaits();
    expect(mailbox.all().map(({ to }) => to)).toEqual([kept.email]);
  });

  test('that waits under a key gives way to a later one with the same key', async () => {
    const { invitationId } = await insertMailRows(url());
    const later = new Date(Date.now() + 3_600_000);
    for (const runAt of [later, later]) {
      await database().transaction((transaction) =>
        enqueue('mail-invitation', { invitationId }, transaction, { jobKey: 'one', runAt, maxAttempts: 3 }),
      );
    }
    expect(await runSql(url(), 'SELECT key, run_at, max_attempts FROM graphile_worker.jobs')).toEqual([
      { key: 'one', run_at: later, max_attempts: 3 },
    ]);
    await runSql(url(), `SELECT graphile_worker.remove_job('one')`);
  });

  test('with a payload that is not its own fails and says why', async () => {
    const mailbox = await openMailbox();
    await runSql(
      url(),
      `SELECT graphile_worker.add_job('mail-invitation', '{"invitationId": "7"}', max_attempts => 1)`,
    );
    await startWorker(mailbox.url);
    let jobs = await waiting();
    for (; jobs[0]?.attempts === 0; jobs = await waiting()) await pause(50);
    await expect
      .poll(async () => (await waiting())[0]?.last_error)
      .toContain('The payload of the job cannot be used: ✖ Invalid UUID\n  → at invitationId');
    await runSql(url(), 'DELETE FROM graphile_worker._private_jobs');
  });

  test.each([
    ['mail-invitation', {}, 'The payload of the job cannot be used'],
    ['mail-invitation', { invitationId: crypto.randomUUID(), to: 'x' }, 'Unrecognized key: "to"'],
    ['mail-password-reset', null, 'The payload of the job cannot be used'],
    ['mail-everybody', {}, 'There is no job "mail-everybody". There are: mail-invitation, mail-password-reset'],
    ['constructor', {}, 'There is no job "constructor".'],
  ])('%s with %j is refused', async (name, payload, message) => {
    await expect(perform(name, payload, signal)).rejects.toThrow(message);
  });
});

describe('a mail', () => {
  test('carries the token of which the table has only the hash', async () => {
    const mailbox = await openMailbox();
    const { invitationId, resetId, email } = await insertMailRows(url());
    await database().transaction(async (transaction) => {
      await enqueue('mail-invitation', { invitationId }, transaction);
      await enqueue('mail-password-reset', { resetId }, transaction);
    });
    await startWorker(mailbox.url);
    const invitation = await mailbox.waitForMail(email);
    const reset = await mailbox.waitForMail(email.replace('maren', 'tobias'));
    expect(invitation.subject).toBe('Tobias Renk invites you to the group Skerry seminar');
    expect(invitation.from).toBe('Quadrel <quadrel@localhost>');
    for (const { mail, path, table, id } of [
      { mail: invitation, path: 'invitation', table: 'invitations', id: invitationId },
      { mail: reset, path: 'reset', table: 'password_resets', id: resetId },
    ]) {
      expect(mail.links).toHaveLength(1);
      expect(mail.links[0]).toMatch(new RegExp(`^${PUBLIC_URL}/${path}/[\\w-]{43}$`));
      expect(mail.html).toContain(`href="${mail.links[0]}"`);
      expect(await hashOf(table, id)).toBe(sha256(mail.links[0]?.split('/').at(-1)));
    }
    await untilNoneWaits();
  });

  test.each(['accepted_at = now()', 'revoked_at = now()', `expires_at = now() - interval '1 second'`])(
    'is not sent for an invitation with %s',
    async (change) => {
      const { invitationId } = await insertMailRows(url());
      await runSql(url(), `UPDATE invitations SET ${change} WHERE id = '${invitationId}'`);
      // There is no mail service here: sending would fail.
      await perform('mail-invitation', { invitationId }, signal);
      expect(await hashOf('invitations', invitationId)).toBeNull();
    },
  );

  test.each(['used_at = now()', `expires_at = now() - interval '1 second'`])(
    'is not sent for a password reset with %s',
    async (change) => {
      const { resetId } = await insertMailRows(url());
      await runSql(url(), `UPDATE password_resets SET ${change} WHERE id = '${resetId}'`);
      await perform('mail-password-reset', { resetId }, signal);
      expect(await hashOf('password_resets', resetId)).toBeNull();
    },
  );

  test('is sent once the mail service is back, with a token of its own', async () => {
    const closed = await startMailbox();
    const port = Number(new URL(closed.url).port);
    await closed.stop();
    const { invitationId, email } = await insertMailRows(url());
    await invite(invitationId);
    await startWorker(closed.url);
    await expect.poll(async () => (await waiting())[0]?.last_error, { timeout: 20_000 }).toContain('ECONNREFUSED');
    const first = await hashOf('invitations', invitationId);
    const mailbox = await openMailbox(port);
    const mail = await mailbox.waitForMail(email);
    await untilNoneWaits();
    expect(mailbox.all()).toHaveLength(1);
    expect(sha256(mail.links[0]?.split('/').at(-1))).not.toBe(first);
    expect(await hashOf('invitations', invitationId)).toBe(sha256(mail.links[0]?.split('/').at(-1)));
  });
});
