import type { TestProject } from 'vitest/node';
import type {} from './provided';
import { startServer } from './server';

/** Starts one server for all tests of a project, or takes the running one that QUADREL_TEST_URL names. */
export default async function setup(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  const running = process.env.QUADREL_TEST_URL;
  if (running !== undefined) {
    project.provide('serverUrl', running);
    return undefined;
  }
  const server = await startServer();
  project.provide('serverUrl', server.url);
  return server.stop;
}
