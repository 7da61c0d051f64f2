// npm run dev: the same database as npm start, pages compiled as they are asked for, the worker bundled anew at every change.
import fs from 'node:fs';
import { nextEnvironment, nextProgram, workerBundle } from './build.mjs';
import { openDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { launch } from './launch.mjs';
import { inState } from './paths.mjs';
import { requirePort } from './ports.mjs';
import { say } from './trouble.mjs';

await launch('server', 'npm run dev', 0, async (run) => {
  requireNode();
  const port = await requirePort();
  await ensureDependencies(run);
  const database = await openDatabase(run);
  const { context } = await import('esbuild');
  const bundler = await context(workerBundle);
  await bundler.watch();
  const address = `http://127.0.0.1:${port}`;
  run.serves(address);
  fs.writeFileSync(inState('database-url'), `${database.url}\n`, { mode: 0o600 });
  say('The address of the database, for tools such as psql, is in .quadrel/database-url.');
  const server = run.start(process.execPath, [nextProgram, 'dev', '-H', '127.0.0.1', '-p', String(port)], {
    env: {
      ...process.env,
      ...nextEnvironment,
      NODE_ENV: 'development',
      PORT: String(port),
      DATABASE_URL: database.url,
    },
  });
  const { code } = await server.ended;
  await bundler.dispose();
  return run.leaving ? 0 : (code ?? 1);
});
