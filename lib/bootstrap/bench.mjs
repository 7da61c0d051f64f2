// npm run bench [name …]: runs tests/bench/<name>.ts, all of them when none is named, each in a process of its own. Those
// whose name begins with "rest" find a built and running server's address in QUADREL_URL, and its database in DATABASE_URL.
import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';
import { ensureBuild, nextEnvironment, nextProgram } from './build.mjs';
import { openTestCluster } from './database.mjs';
import { ensureDependencies, requireNode } from './dependencies.mjs';
import { launch } from './launch.mjs';
import { ensurePackages } from './packages.mjs';
import { root } from './paths.mjs';
import { freePort } from './ports.mjs';
import { untilHealthy } from './server.mjs';
import { Trouble, say } from './trouble.mjs';

async function serve(run) {
  const { adminUrl, template } = await openTestCluster(run);
  await ensureBuild(run);
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const databaseUrl = adminUrl.replace(/\/postgres$/, `/${template}`);
  const settings = {
    PORT: String(port),
    DATABASE_URL: databaseUrl,
    NEXTAUTH_SECRET: randomBytes(32).toString('base64url'),
    NEXTAUTH_URL: url,
    PUBLIC_URL: url,
    COMPUTE_QUOTA_PER_MINUTE: '0',
    TOKEN_QUOTA_PER_MINUTE: '0',
  };
  const server = run.start(process.execPath, [nextProgram, 'start', '-H', '127.0.0.1', '-p', String(port)], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, ...nextEnvironment, NODE_ENV: 'production', ...settings },
  });
  await untilHealthy(url, server.ended);
  return { QUADREL_URL: url, DATABASE_URL: databaseUrl };
}

function chosen(given) {
  const folder = path.join(root, 'tests', 'bench');
  const there = fs.existsSync(folder) ? fs.readdirSync(folder).filter((file) => /^[a-z0-9-]+\.ts$/.test(file)) : [];
  const names = there.map((file) => path.basename(file, '.ts')).sort();
  const unknown = given.filter((name) => !names.includes(name));
  if (unknown.length > 0) throw new Trouble(`There is no bench "${unknown[0]}".`, `There are: ${names.join(', ')}.`);
  return given.length > 0 ? given : names;
}

await launch('bench', 'npm run bench', 130, async (run) => {
  requireNode();
  const names = chosen(process.argv.slice(2));
  await ensureDependencies(run);
  await ensurePackages(run, ['pari-gp']);
  const served = names.some((name) => name.startsWith('rest')) ? await serve(run) : {};
  let failed = 0;
  for (const name of names) {
    if (run.leaving) return 130;
    say(`\n── ${name} ──`);
    const file = path.join(root, 'tests', 'bench', `${name}.ts`);
    const code = await run.finish(process.execPath, ['--conditions=react-server', '--import', 'tsx', file], {
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, ...served },
    });
    if (code !== 0) failed += 1;
  }
  return failed === 0 ? 0 : 1;
});
