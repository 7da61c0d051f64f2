// npm test -- [part …] [arguments for vitest]: everything, or the named parts, on a throw-away cluster and a built server.
import fs from 'node:fs';
import path from 'node:path';
import { bundleWorkers, ensureBuild } from './build.mjs';
import { runChecks } from './checks.mjs';
import { openTestCluster } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { launch } from './launch.mjs';
import { ensurePackages } from './packages.mjs';
import { inState, root } from './paths.mjs';
import { Trouble, say } from './trouble.mjs';

/** The parts in the order in which they are run, and what each one needs beside the npm packages. */
const parts = {
  checks: { packages: [] },
  mathematics: { packages: ['pari-gp'] },
  database: { packages: [], cluster: true, workers: true },
  api: { packages: [], cluster: true, build: true },
  browser: { packages: ['chromium'], cluster: true, build: true },
};

function chosen(given) {
  const names = given.length === 0 ? Object.keys(parts) : given;
  const unknown = names.filter((name) => !Object.hasOwn(parts, name));
  if (unknown.length > 0) {
    throw new Trouble(
      `There is no part "${unknown[0]}" of the tests.`,
      `The parts are: ${Object.keys(parts).join(', ')}.`,
    );
  }
  return names;
}

/** One project of vitest, counted from the report it writes. A run without a report counts as one failure. */
async function runProject(run, project, extra, environment) {
  const report = inState(`report-${project}-${process.pid}.json`);
  const code = await run.finish(
    process.execPath,
    [
      path.join(root, 'node_modules/vitest/vitest.mjs'),
      ...['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
      ...extra,
    ],
    { stdio: ['ignore', 'inherit', 'inherit'], env: { ...process.env, ...environment } },
  );
  if (!fs.existsSync(report)) return { passed: 0, failed: 1 };
  const { numPassedTests, numFailedTests, numFailedTestSuites } = JSON.parse(fs.readFileSync(report, 'utf8'));
  fs.rmSync(report);
  // A file that could not be loaded, or an error outside of a test, has no failed test of its own but must not pass.
  const failed = numFailedTests > 0 ? numFailedTests : Math.max(numFailedTestSuites, code === 0 ? 0 : 1);
  return { passed: numPassedTests, failed };
}

// Parts come first; from the first option or path on everything is for vitest.
const words = process.argv.slice(2).filter((word) => word !== '--');
const firstExtra = words.findIndex((word) => /^-|[/.]/.test(word));
const named = firstExtra < 0 ? words : words.slice(0, firstExtra);
const extra = words.slice(named.length);

await launch('test', 'npm test', 130, async (run) => {
  requireNode();
  const names = chosen(named);
  const needs = names.map((name) => parts[name]);
  await ensureDependencies(run);
  await ensurePackages(run, [...new Set(needs.flatMap((need) => need.packages))]);
  const environment = {};
  if (needs.some((need) => need.cluster)) {
    const { adminUrl, template } = await openTestCluster(run);
    Object.assign(environment, { QUADREL_TEST_ADMIN_URL: adminUrl, QUADREL_TEST_TEMPLATE: template });
  }
  if (needs.some((need) => need.build)) await ensureBuild(run);
  else if (needs.some((need) => need.workers)) await bundleWorkers();
  const total = { passed: 0, failed: 0 };
  for (const name of names) {
    if (run.leaving) return 130;
    say(`\n── ${name} ──`);
    const { passed, failed } =
      name === 'checks' ? await runChecks(run) : await runProject(run, name, extra, environment);
    total.passed += passed;
    total.failed += failed;
  }
  say(`\n${total.passed} passed, ${total.failed} failed`);
  return total.failed === 0 && total.passed > 0 ? 0 : 1;
});
