// npm run worker: one more job worker over the database that DATABASE_URL names, on this machine or another.
import { bundleWorkers } from './build.mjs';
import { openDatabase } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { startJobWorker } from './job-worker.mjs';
import { launch } from './launch.mjs';
import { secrets } from './secrets.mjs';
import { Trouble, say } from './trouble.mjs';

const needed = {
  DATABASE_URL: 'the database whose jobs it is to do',
  SMTP_URL: 'the mail service it hands messages to',
  PUBLIC_URL: 'the address links in mail begin with',
};

await launch('worker', 'npm run worker', 0, async (run) => {
  requireNode();
  const missing = Object.keys(needed).filter((name) => !process.env[name]);
  if (missing.length > 0) {
    throw new Trouble(
      `A worker of its own needs ${missing.map((name) => `${name}, ${needed[name]}`).join('; ')}.`,
      'Give it the settings the server has. Beside the server of this clone no other worker is needed: npm start runs one.',
    );
  }
  await ensureDependencies(run);
  const { url } = await openDatabase(run);
  await bundleWorkers();
  const secret = process.env.NEXTAUTH_SECRET || secrets().sessionSecret;
  const worker = startJobWorker(run, { DATABASE_URL: url, NEXTAUTH_SECRET: secret });
  say('A job worker has started. Ctrl-C stops it, after the jobs it is doing.');
  const { code } = await worker.ended;
  return run.leaving ? 0 : (code ?? 1);
});
