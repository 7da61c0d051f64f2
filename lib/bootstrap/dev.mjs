// npm run dev: the same database as npm start, pages compiled as they are asked for, the workers bundled anew at every change.
import fs from 'node:fs';
import { nextEnvironment, nextProgram, workerBundles, workerFiles } from './build.mjs';
import { openDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { startJobWorker } from './job-worker.mjs';
import { launch } from './launch.mjs';
import { inState } from './paths.mjs';
import { requirePort } from './ports.mjs';
import { servingSettings } from './settings.mjs';
import { say } from './trouble.mjs';

const quietMilliseconds = 4000;

const bundled = () => workerFiles.map((file) => (fs.existsSync(file) ? fs.readFileSync(file, 'utf8') : '')).join('\0');

/**
 * Bundles the workers now and at every change. `settled()` resolves when new bundles have lain there for a moment; what runs
 * keeps the old ones, so the server and the job worker are then started again.
 */
async function watchWorkers() {
  const { context } = await import('esbuild');
  let held = bundled();
  let waiting;
  let timer;
  let first;
  const firstEnd = new Promise((resolve) => (first = resolve));
  const onEnd = ({ errors }) => {
    first();
    const made = errors.length === 0 ? bundled() : held;
    if (made === held) return;
    held = made;
    clearTimeout(timer);
    timer = setTimeout(() => waiting?.(), quietMilliseconds);
  };
  const plugins = [{ name: 'notice', setup: (build) => build.onEnd(onEnd) }];
  const bundler = await context({ ...workerBundles, plugins });
  await bundler.watch();
  await firstEnd;
  clearTimeout(timer);
  return { settled: () => new Promise((resolve) => (waiting = resolve)), stop: () => bundler.dispose() };
}

await launch('server', 'npm run dev', 0, async (run) => {
  requireNode();
  const port = await requirePort();
  await ensureDependencies(run);
  const database = await openDatabase(run);
  const bundles = await watchWorkers();
  const settings = await servingSettings({ port, databaseUrl: database.url });
  run.serves(`http://127.0.0.1:${port}`);
  fs.writeFileSync(inState('database-url'), `${database.url}\n`, { mode: 0o600 });
  say('The address of the database, for tools such as psql, is in .quadrel/database-url.');
  while (!run.leaving) {
    const server = run.start(process.execPath, [nextProgram, 'dev', '-H', '127.0.0.1', '-p', String(port)], {
      env: { ...process.env, ...nextEnvironment, NODE_ENV: 'development', ...settings },
    });
    const jobs = startJobWorker(run, settings);
    const result = await Promise.race([server.ended, bundles.settled()]);
    if (result !== undefined) {
      await bundles.stop();
      return run.leaving ? 0 : (result.code ?? 1);
    }
    say('A worker bundle has changed; the server and the job worker start again.');
    await jobs.stop();
    await server.stop();
  }
  return 0;
});
