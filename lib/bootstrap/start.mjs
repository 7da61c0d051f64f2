// npm start: from whatever state this clone is in to a running server. Uses nothing that would have to be installed first.
import fs from 'node:fs';
import { ensureBuild, nextEnvironment, nextProgram } from './build.mjs';
import { openDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { keepJobWorker } from './job-worker.mjs';
import { launch } from './launch.mjs';
import { inState } from './paths.mjs';
import { requirePort } from './ports.mjs';
import { untilHealthy } from './server.mjs';
import { servingSettings } from './settings.mjs';
import { Trouble, say } from './trouble.mjs';

await launch('server', 'npm start', 0, async (run) => {
  requireNode();
  const port = await requirePort();
  await ensureDependencies(run);
  const database = await openDatabase(run);
  await ensureBuild(run);
  const address = `http://127.0.0.1:${port}`;
  const settings = await servingSettings({ port, databaseUrl: database.url });
  const log = fs.openSync(inState('server.log'), 'w', 0o600);
  const server = run.start(process.execPath, [nextProgram, 'start', '-H', '127.0.0.1', '-p', String(port)], {
    stdio: ['ignore', log, 'inherit'],
    env: { ...process.env, ...nextEnvironment, NODE_ENV: 'production', ...settings },
  });
  fs.closeSync(log);
  await untilHealthy(address, server.ended);
  const jobs = keepJobWorker(run, settings, ['ignore', fs.openSync(inState('jobs.log'), 'w', 0o600), 'inherit']);
  run.serves(address);
  say(`\nQuadrel is ready: ${address}\nCtrl-C stops it.`);
  if (!process.env.SMTP_URL) say('Mail is kept in .quadrel/mailbox; npm run mailbox shows it.');
  const names = ['server', 'database'];
  const first = await Promise.race([
    ...[server, database.server].filter(Boolean).map((one, index) => one.ended.then(() => index)),
    jobs,
  ]);
  if (run.leaving) return 0;
  throw new Trouble(
    `The ${names[first]} ended by itself.`,
    `Its last messages are in .quadrel/${first === 0 ? 'server' : 'postgres'}.log. Start again; the data are kept.`,
  );
});
