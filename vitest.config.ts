import path from 'node:path';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  resolve: { alias: { '@': path.resolve(import.meta.dirname), 'server-only': path.resolve(import.meta.dirname, 'tests/empty.ts') } },
  test: {
    projects: [
      {
        extends: true,
        test: { name: 'mathematics', include: ['tests/{unit,property,reference}/**/*.test.ts'], testTimeout: 120_000 },
      },
    ],
  },
});
