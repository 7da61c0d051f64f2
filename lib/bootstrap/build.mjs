import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { inState, root, tail } from './paths.mjs';
import { identify, runs } from './process-identity.mjs';
import { otherRuns } from './run.mjs';
import { Trouble, say } from './trouble.mjs';

const sources = ['app', 'engine', 'grammar', 'lib', 'models', 'public'];
const sourceFiles = [
  'package-lock.json',
  'tsconfig.json',
  'tailwind.config.ts',
  'next.config.mjs',
  'postcss.config.mjs',
  'proxy.ts',
  'instrumentation.ts',
];
const engineWorker = path.join(root, 'dist', 'engine.worker.mjs');
const stamp = path.join(root, '.next', 'built-from');

/** The program of a job worker, once it is bundled. */
export const jobWorker = path.join(root, 'dist', 'jobs.worker.mjs');

export const nextProgram = path.join(root, 'node_modules', 'next', 'dist', 'bin', 'next');
export const nextEnvironment = { NEXT_TELEMETRY_DISABLED: '1' };

/** A digest of everything the build is made from. */
function sourceDigest() {
  const digest = createHash('sha256').update(process.versions.node);
  const files = sourceFiles.filter((file) => fs.existsSync(path.join(root, file)));
  for (const folder of sources) {
    for (const entry of fs.readdirSync(path.join(root, folder), { recursive: true, withFileTypes: true })) {
      if (entry.isFile()) files.push(path.relative(root, path.join(entry.parentPath, entry.name)));
    }
  }
  for (const file of files.sort()) digest.update(`\0${file}\0`).update(fs.readFileSync(path.join(root, file)));
  return digest.digest('hex');
}

/** How the worker threads and the job worker are bundled: one file each of modern JavaScript that Node loads without a compiler. */
export const workerBundles = {
  absWorkingDir: root,
  entryPoints: [
    { in: 'lib/compute/engine.worker.ts', out: path.basename(engineWorker, '.mjs') },
    { in: 'lib/jobs/worker.ts', out: path.basename(jobWorker, '.mjs') },
  ],
  outdir: 'dist',
  outExtension: { '.js': '.mjs' },
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  conditions: ['react-server'],
  // Loaded from node_modules as they are: native code, or files that look for others beside them.
  external: ['@node-rs/argon2', 'graphile-worker', 'nodemailer', 'pg', 'piscina', 'sequelize'],
  // Bundled CommonJS packages ask for Node's own modules by require.
  banner: { js: "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);" },
  logLevel: 'warning',
};

/** The files the bundles are written to. */
export const workerFiles = [engineWorker, jobWorker];

/** Bundles the workers. Each file is put in place as a whole, for a process may be starting from it. */
export async function bundleWorkers() {
  const { build } = await import('esbuild');
  try {
    const { outputFiles } = await build({ ...workerBundles, write: false });
    fs.mkdirSync(path.join(root, 'dist'), { recursive: true });
    for (const { path: file, contents } of outputFiles) {
      const draft = `${file}.${process.pid}`;
      fs.writeFileSync(draft, contents);
      fs.renameSync(draft, file);
    }
  } catch (error) {
    throw new Trouble('The worker bundles could not be made.', `Mend what the messages above name.\n${error.message}`);
  }
}

const lock = () => inState('build.lock');

/** Takes the lock, when nobody that still runs holds it; returns who does. */
function tryLock() {
  const draft = `${lock()}.${process.pid}`;
  fs.writeFileSync(draft, JSON.stringify(identify(process.pid)));
  try {
    fs.linkSync(draft, lock());
    return undefined;
  } catch {
    const holder = JSON.parse(fs.readFileSync(lock(), 'utf8'));
    if (!runs(holder)) fs.rmSync(lock(), { force: true });
    return holder;
  } finally {
    fs.rmSync(draft);
  }
}

/** Does the work while no other run of this clone builds in the same folders. */
async function inTurn(run, work) {
  for (let said = false; ; said = true) {
    const holder = tryLock();
    if (holder === undefined) break;
    if (!said) say(`Waiting for the build of process ${holder.pid} …`);
    await new Promise((resolve) => setTimeout(resolve, 300));
    if (run.leaving) return;
  }
  try {
    await work();
  } finally {
    fs.rmSync(lock(), { force: true });
  }
}

async function buildPages(run) {
  const log = inState('build.log');
  const output = fs.openSync(log, 'w', 0o600);
  const code = await run.finish(process.execPath, [nextProgram, 'build'], {
    stdio: ['ignore', output, output],
    env: { ...process.env, ...nextEnvironment, NODE_ENV: 'production' },
  });
  fs.closeSync(output);
  if (code === 0 || run.leaving) return;
  throw new Trouble(
    `next build failed (${code === undefined ? 'it was killed' : `exit code ${code}`}). The end of ${log}:\n${tail(log, 40)}`,
    code === undefined
      ? 'See that the machine has about 1.5 GB of memory to spare, then start again.'
      : 'Mend what it names.',
  );
}

/** Builds the worker bundles and the pages when they are not those of the present sources. */
export async function ensureBuild(run) {
  const digest = sourceDigest();
  const current = () =>
    [...workerFiles, stamp].every((file) => fs.existsSync(file)) && fs.readFileSync(stamp, 'utf8') === digest;
  if (current()) return;
  await inTurn(run, async () => {
    if (current()) return;
    const serving = otherRuns().find((other) => other.command === 'npm start');
    if (serving !== undefined) {
      throw new Trouble(
        `The sources have changed, and a server (process ${serving.owner.pid}) still runs on the build they would replace.`,
        'Stop that server first, or work in a second clone.',
      );
    }
    say('Building (about a minute) …');
    fs.rmSync(stamp, { force: true });
    await bundleWorkers();
    await buildPages(run);
    if (!run.leaving) fs.writeFileSync(stamp, digest);
  });
}
