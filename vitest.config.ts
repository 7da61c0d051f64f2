import { randomBytes } from 'node:crypto';
import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = import.meta.dirname;

export default defineConfig({
  resolve: { alias: { '@': root, 'server-only': path.resolve(root, 'tests/empty.ts') } },
  test: {
    root,
    projects: [
      {
        extends: true,
        test: { name: 'mathematics', include: ['tests/{unit,property,reference}/**/*.test.ts'], testTimeout: 120_000 },
      },
      {
        extends: true,
        test: {
          name: 'database',
          include: ['tests/{database,bootstrap}/**/*.test.ts'],
          globalSetup: ['tests/harness/global-cluster.ts'],
          env: { NEXTAUTH_SECRET: randomBytes(32).toString('base64url') },
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          globalSetup: ['tests/harness/global-server.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/browser/**/*.test.ts'],
          globalSetup: ['tests/harness/global-server.ts'],
          testTimeout: 240_000,
          hookTimeout: 240_000,
          maxWorkers: 2,
          // A page on a busy machine needs longer than the second that is usual for a poll.
          expect: { poll: { timeout: 30_000 } },
        },
      },
    ],
  },
});
