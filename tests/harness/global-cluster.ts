import type { TestProject } from 'vitest/node';
import type {} from './provided';
import { clusterFromEnvironment } from './database';

/** Hands the throw-away cluster to the tests of a project. */
export default function setup(project: TestProject): void {
  const { adminUrl, template } = clusterFromEnvironment();
  project.provide('adminUrl', adminUrl);
  project.provide('template', template);
}
