import { spawnSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { Trouble } from './trouble.mjs';

const isRoot = () => process.getuid?.() === 0;

function debianAccount() {
  const line = fs
    .readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith('postgres:'));
  const [, , uid, gid] = line?.split(':') ?? [];
  if (uid === undefined || gid === undefined) {
    throw new Trouble(
      'PostgreSQL refuses to run as root, and this machine has no account named postgres.',
      'Install the server from Debian (apt-get install postgresql), or start as an ordinary user.',
    );
  }
  return { uid: Number(uid), gid: Number(gid) };
}

/**
 * As whom the server runs. PostgreSQL refuses root, so root hands it to whoever owns the cluster already or to Debian's
 * account for it; anyone else runs it as themselves, which needs no options at all.
 */
export function databaseAccount(clusterFolder) {
  if (!isRoot()) return {};
  if (clusterFolder !== undefined && fs.existsSync(clusterFolder)) {
    const { uid, gid } = fs.statSync(clusterFolder);
    if (uid !== 0) return { uid, gid };
  }
  return debianAccount();
}

/** Whether the account can reach a folder: every folder above it must let it pass. */
export function reaches(account, folder) {
  if (account.uid === undefined) return true;
  return spawnSync('/usr/bin/test', ['-x', folder], { ...account, cwd: '/' }).status === 0;
}

/** Makes a folder that belongs to the account alone. */
export function makeOwnFolder(account, folder) {
  fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  fs.chmodSync(folder, 0o700);
  if (account.uid !== undefined) fs.chownSync(folder, account.uid, account.gid);
}

/** A new folder with a name of its own that the account can reach. */
export function makeTemporaryFolder(account) {
  const parent = ['/tmp', '/var/tmp'].find((folder) => fs.existsSync(folder) && reaches(account, folder));
  if (parent === undefined)
    throw new Trouble(
      'Neither /tmp nor /var/tmp can be used.',
      'Make one of them writable for everybody (chmod 1777).',
    );
  const folder = fs.mkdtempSync(path.join(parent, 'quadrel-'));
  makeOwnFolder(account, folder);
  return folder;
}
