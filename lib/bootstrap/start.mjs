// npm start: from whatever state this clone is in to a running server. Uses nothing that would have to be installed first.
import fs from 'node:fs';
import { ensureBuild, nextEnvironment, nextProgram } from './build.mjs';
import { openDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { launch } from './launch.mjs';
import { inState } from './paths.mjs';
import { requirePort } from './ports.mjs';
import { untilHealthy } from './server.mjs';
import { Trouble, say } from './trouble.mjs';

await launch('server', 'npm start', 0, async (run) => {
  requireNode();
  const port = await requirePort();
  await ensureDependencies(run);
  const database = await openDatabase(run);
  await ensureBuild(run);
  const address = `http://127.0.0.1:${port}`;
  const log = fs.openSync(inState('server.log'), 'w', 0o600);
  const server = run.start(process.execPath, [nextProgram, 'start', '-H', '127.0.0.1', '-p', String(port)], {
    stdio: ['ignore', log, 'inherit'],
    env: { ...process.env, ...nextEnvironment, NODE_ENV: 'production', PORT: String(port), DATABASE_URL: database.url },
  });
  fs.closeSync(log);
  await untilHealthy(address, server.ended);
  run.serves(address);
  say(`\nQuadrel is ready: ${address}\nCtrl-C stops it.`);
  const names = ['server', 'database'];
  const first = await Promise.race(
    [server, database.server].filter(Boolean).map((one, index) => one.ended.then(() => index)),
  );
  if (run.leaving) return 0;
  throw new Trouble(
    `The ${names[first]} ended by itself.`,
    `Its last messages are in .quadrel/${first === 0 ? 'server' : 'postgres'}.log. Start again; the data are kept.`,
  );
});
