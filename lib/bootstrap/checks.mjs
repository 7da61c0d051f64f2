import path from 'node:path';
import { root } from './paths.mjs';
import { say } from './trouble.mjs';

const program = (file) => path.join(root, 'node_modules', file);

/** What is checked without running the program. Each one passes or fails as a whole. */
const checks = [
  { name: 'types of routes', file: 'next/dist/bin/next', args: ['typegen'], quiet: true },
  { name: 'types', file: 'typescript/bin/tsc', args: ['--noEmit'] },
  { name: 'lint', file: 'eslint/bin/eslint.js', args: ['.', '--max-warnings=0'] },
  { name: 'format', file: 'prettier/bin/prettier.cjs', args: ['--check', '.', '--log-level=warn'] },
  { name: 'unused code and packages', file: 'knip/bin/knip.js', args: ['--no-progress'] },
];

/** Runs every check, also after one has failed, and counts. */
export async function runChecks(run) {
  const count = { passed: 0, failed: 0 };
  for (const { name, file, args, quiet } of checks) {
    if (run.leaving) break;
    const code = await run.finish(process.execPath, [program(file), ...args], {
      stdio: ['ignore', quiet ? 'ignore' : 'inherit', 'inherit'],
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1' },
    });
    say(`${code === 0 ? 'passed' : 'FAILED'}: ${name}`);
    count[code === 0 ? 'passed' : 'failed'] += 1;
  }
  return count;
}
