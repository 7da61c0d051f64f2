import type { TestProject } from 'vitest/node';
import type {} from './provided';
import { inState } from '@/lib/bootstrap/paths.mjs';
import { startMailbox } from './mailbox';
import { startServer } from './server';
import { startJobWorker } from './worker';

/**
 * Starts one server for all tests of a project, with a job worker and a mailbox beside it, or takes the running one that
 * QUADREL_TEST_URL names; DATABASE_URL is then the database of that one.
 */
export default async function setup(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  const running = process.env.QUADREL_TEST_URL;
  if (running !== undefined) {
    project.provide('serverUrl', running);
    project.provide('databaseUrl', process.env.DATABASE_URL ?? '');
    project.provide('mailboxFolder', inState('mailbox'));
    return undefined;
  }
  const mailbox = await startMailbox();
  const server = await startServer({ SMTP_URL: mailbox.url });
  const worker = await startJobWorker({ ...server.settings, SMTP_URL: mailbox.url });
  project.provide('serverUrl', server.url);
  project.provide('databaseUrl', server.databaseUrl);
  project.provide('mailboxFolder', mailbox.folder);
  return async () => {
    await worker.stop();
    await server.stop();
    await mailbox.stop();
  };
}
