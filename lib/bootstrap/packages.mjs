import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { Trouble, say } from './trouble.mjs';

/** Whether a program is on the search path. */
export const onPath = (program) =>
  (process.env.PATH ?? '')
    .split(path.delimiter)
    .some((folder) => folder !== '' && fs.existsSync(path.join(folder, program)));

/** The folders that hold all of the named programs of PostgreSQL, the newest version first. */
export function postgresFolders(programs) {
  const folders = [];
  const debian = '/usr/lib/postgresql';
  if (fs.existsSync(debian)) {
    const versions = fs.readdirSync(debian).filter((name) => /^\d+$/.test(name));
    for (const version of versions.sort((a, b) => Number(b) - Number(a)))
      folders.push(path.join(debian, version, 'bin'));
  }
  try {
    folders.push(
      execFileSync('pg_config', ['--bindir'], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }).trim(),
    );
  } catch {
    // No pg_config: programs elsewhere are not known to this machine.
  }
  return folders.filter((folder) => programs.every((name) => fs.existsSync(path.join(folder, name))));
}

/** The folders with the programs of an installed PostgreSQL server, the newest version first. */
export const serverFolders = () => postgresFolders(['postgres', 'initdb']);

/** The programs that copy a database out and in. */
export const clientPrograms = ['pg_dump', 'pg_restore', 'psql'];

/** Debian packages this program can use, and how to tell that they are there. */
const known = {
  postgresql: { what: 'The PostgreSQL server', present: () => serverFolders().length > 0 },
  'postgresql-client': {
    what: 'The PostgreSQL client',
    present: () => postgresFolders(clientPrograms).length > 0,
  },
  chromium: { what: 'Chromium, for the browser tests,', present: () => fs.existsSync('/usr/bin/chromium') },
  'pari-gp': { what: 'PARI/GP, for the outside checks,', present: () => onPath('gp') },
};

/** Without this, installing the server would also make and start a cluster on the usual port. */
function declineMainCluster() {
  const file = '/etc/postgresql-common/createcluster.conf';
  if (fs.existsSync(file)) return;
  fs.mkdirSync(path.dirname(file), { recursive: true });
  fs.writeFileSync(
    file,
    '# Written before PostgreSQL was installed: no cluster is made by itself.\ncreate_main_cluster = false\n',
  );
}

const installCommand = (names) => `apt-get update && apt-get install -y ${names.join(' ')}`;

/** Installs those of the named packages that are missing: as root by apt; anyone else is told the command. */
export async function ensurePackages(run, names) {
  const missing = names.filter((name) => !known[name].present());
  if (missing.length === 0) return;
  const what = missing.map((name) => known[name].what).join(' ');
  const command = `sudo sh -c '${installCommand(missing)}'`;
  if (process.getuid?.() !== 0) {
    throw new Trouble(`${what} is not installed.`, `Install what is missing, then start again:\n  ${command}`);
  }
  if (!onPath('apt-get')) {
    throw new Trouble(
      `${what} is not installed, and this machine has no apt-get.`,
      'Install it by other means, then start again.',
    );
  }
  say(`Installing ${missing.join(', ')} (Debian packages) …`);
  if (missing.includes('postgresql')) declineMainCluster();
  const options = {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive', UCF_FORCE_CONFFOLD: '1' },
  };
  const apt = [
    '-q',
    '-o',
    'Dpkg::Options::=--force-confold',
    '-o',
    'DPkg::Lock::Timeout=120',
    '-o',
    'Acquire::Retries=3',
  ];
  await run.finish('apt-get', [...apt, 'update'], options);
  await run.finish('apt-get', [...apt, 'install', '-y', '--no-install-recommends', ...missing], options);
  const still = missing.filter((name) => !known[name].present());
  if (still.length > 0 && !run.leaving) {
    throw new Trouble(
      `apt-get did not install ${still.join(', ')}.`,
      `Its messages stand above. See that the machine reaches its package server, then try:\n  ${installCommand(still)}`,
    );
  }
}
