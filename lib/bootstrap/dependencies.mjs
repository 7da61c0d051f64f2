import fs from 'node:fs';
import path from 'node:path';
import { root } from './paths.mjs';
import { Trouble, say } from './trouble.mjs';

/** The oldest Node the pinned packages run on. */
export function requireNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 9)) return;
  throw new Trouble(
    `Node ${version} is too old.`,
    'Install Node 20.9 or newer (20.20 is what this was made with), then start again.',
  );
}

function packagesOf(file) {
  try {
    return JSON.parse(fs.readFileSync(path.join(root, file), 'utf8')).packages ?? {};
  } catch {
    return undefined;
  }
}

/** Whether node_modules holds what the lock file asks for; npm notes there what it installed, once it has finished. */
export function dependenciesInstalled() {
  const wanted = packagesOf('package-lock.json');
  const installed = packagesOf('node_modules/.package-lock.json');
  if (wanted === undefined || installed === undefined) return false;
  return Object.entries(wanted).every(([name, entry]) => {
    if (name === '' || entry.link) return true;
    const there = installed[name];
    // A package for another kind of machine is left out by npm.
    return there === undefined
      ? entry.optional === true || entry.devOptional === true
      : there.version === entry.version;
  });
}

/** Installs the pinned packages, with those for development: the build and the tests need them. */
export async function ensureDependencies(run) {
  if (dependenciesInstalled()) return;
  say('Installing the npm packages of package-lock.json (a minute or two) …');
  const { NODE_ENV: _unused, ...environment } = process.env;
  const code = await run.finish('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: environment,
  });
  if (code === 0 || run.leaving) return;
  throw new Trouble(
    code === undefined ? 'npm could not be started.' : `npm ci failed (exit code ${code}).`,
    'Its messages stand above. See that npm is installed and reaches its registry and that the disk has 1 GB free, then start again; what was begun is installed afresh.',
  );
}
