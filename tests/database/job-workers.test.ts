import net from 'node:net';
import { once } from 'node:events';
import { afterAll, beforeAll, expect, onTestFinished, test } from 'vitest';
import { closeDatabase, database } from '@/lib/database/connection';
import { enqueue } from '@/lib/jobs/enqueue';
import { runSql } from '../harness/database';
import { startMailbox } from '../harness/mailbox';
import { ownDatabase } from '../harness/own-database';
import { startJobWorker } from '../harness/worker';
import { insertMailRows } from './mail-rows';

const url = ownDatabase();

beforeAll(() => {
  process.env.DATABASE_URL = url();
});
afterAll(closeDatabase);

const startWorker = async (SMTP_URL: string) => {
  const worker = await startJobWorker({ DATABASE_URL: url(), SMTP_URL, PUBLIC_URL: 'https://quadrel.example' });
  onTestFinished(async () => void (await worker.stop()));
  return worker;
};
const invite = async () => {
  const rows = await insertMailRows(url());
  await database().transaction((transaction) =>
    enqueue('mail-invitation', { invitationId: rows.invitationId }, transaction),
  );
  return rows;
};
const locked = () => runSql(url(), 'SELECT locked_by FROM graphile_worker.jobs WHERE locked_by IS NOT NULL');

/** A mail service that takes the call and never says a word, so that whoever calls it is kept waiting. */
async function silentService(): Promise<string> {
  const sockets = new Set<net.Socket>();
  const server = net.createServer((socket) => {
    sockets.add(socket);
    socket.on('error', () => undefined);
  });
  server.listen(0, '127.0.0.1');
  await once(server, 'listening');
  onTestFinished(async () => {
    for (const socket of sockets) socket.destroy();
    server.close();
    await once(server, 'close');
  });
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The service has no port.');
  return `smtp://127.0.0.1:${address.port}`;
}

test('the job of a worker that was killed is done by another one', async () => {
  const mailbox = await startMailbox();
  onTestFinished(mailbox.stop);
  const { email } = await invite();
  const killed = await startWorker(await silentService());
  await expect.poll(locked, { timeout: 10_000 }).toHaveLength(1);
  await killed.kill();
  expect(await locked()).toHaveLength(1);
  await startWorker(mailbox.url);
  await mailbox.waitForMail(email);
  await expect.poll(() => runSql(url(), 'SELECT id FROM graphile_worker.jobs')).toEqual([]);
  expect(mailbox.all()).toHaveLength(1);
});

test('the job of a worker that lives is left to it', async () => {
  const { email } = await invite();
  const busy = await startWorker(await silentService());
  await expect.poll(locked, { timeout: 10_000 }).toHaveLength(1);
  const [holder] = await locked();
  const mailbox = await startMailbox();
  onTestFinished(mailbox.stop);
  await startWorker(mailbox.url);
  // Two looks of the second worker are over when it has had time for three.
  await new Promise((resolve) => setTimeout(resolve, 8000));
  expect(await locked()).toEqual([holder]);
  expect(mailbox.all()).toEqual([]);
  await busy.stop();
  await mailbox.waitForMail(email);
});

test('a worker that is asked to end does so, holds nothing, and is no failure', async () => {
  const mailbox = await startMailbox();
  onTestFinished(mailbox.stop);
  const { email } = await invite();
  const worker = await startWorker(mailbox.url);
  await mailbox.waitForMail(email);
  expect(await worker.stop()).toBe(0);
  expect(await locked()).toEqual([]);
});

test('a worker without a mail service does not start, and says what to set', async () => {
  await expect(startWorker('')).rejects.toThrow('SMTP_URL is not set, and a job worker sends mail.');
});
