// npm run dev: the same database as npm start, pages compiled as they are asked for, the worker bundled anew at every change.
import fs from 'node:fs';
import { nextEnvironment, nextProgram, workerBundle } from './build.mjs';
import { openDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { launch } from './launch.mjs';
import { inState } from './paths.mjs';
import { requirePort } from './ports.mjs';
import { say } from './trouble.mjs';

const quietMilliseconds = 4000;

/**
 * Bundles the worker now and at every change. `settled()` resolves when a new bundle has lain there for a moment; threads
 * that run keep the old one, so the server is then started again.
 */
async function watchWorker() {
  const { context } = await import('esbuild');
  let held = fs.existsSync(workerBundle.outfile) ? fs.readFileSync(workerBundle.outfile, 'utf8') : '';
  let waiting;
  let timer;
  let first;
  const firstEnd = new Promise((resolve) => (first = resolve));
  const onEnd = ({ errors }) => {
    first();
    const made = errors.length === 0 ? fs.readFileSync(workerBundle.outfile, 'utf8') : held;
    if (made === held) return;
    held = made;
    clearTimeout(timer);
    timer = setTimeout(() => waiting?.(), quietMilliseconds);
  };
  const plugins = [{ name: 'notice', setup: (build) => build.onEnd(onEnd) }];
  const bundler = await context({ ...workerBundle, plugins });
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
  const worker = await watchWorker();
  run.serves(`http://127.0.0.1:${port}`);
  fs.writeFileSync(inState('database-url'), `${database.url}\n`, { mode: 0o600 });
  say('The address of the database, for tools such as psql, is in .quadrel/database-url.');
  while (!run.leaving) {
    const server = run.start(process.execPath, [nextProgram, 'dev', '-H', '127.0.0.1', '-p', String(port)], {
      env: {
        ...process.env,
        ...nextEnvironment,
        NODE_ENV: 'development',
        PORT: String(port),
        DATABASE_URL: database.url,
      },
    });
    const result = await Promise.race([server.ended, worker.settled()]);
    if (result !== undefined) {
      await worker.stop();
      return run.leaving ? 0 : (result.code ?? 1);
    }
    say('The worker bundle has changed; the server starts again.');
    await server.stop();
  }
  return 0;
});
