import { statSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { runSql } from '../harness/database';
import { isRunning, makeStateFolder, startLauncher } from './launcher';

const add = (url: unknown, code: string) =>
  runSql(String(url), `INSERT INTO permalinks (code, field, statement) VALUES ('${code}', 'Q', '[2] = [2]')`);
const kept = async (url: unknown) =>
  (await runSql(String(url), `SELECT code FROM permalinks WHERE statement = '[2] = [2]' ORDER BY 1`)).map(
    ({ code }) => code,
  );

describe('the cluster of a clone', () => {
  test('keeps its data over a stop, over a kill of the launcher, and over a kill of both', async () => {
    const state = makeStateFolder();
    const first = startLauncher(state, 'database');
    const { url } = await first.ready;
    await add(url, 'aaaaaaaaaa');
    first.child.kill('SIGTERM');
    expect((await first.over).code).toBe(0);

    const second = startLauncher(state, 'database');
    const { url: secondUrl, pid } = await second.ready;
    expect(await kept(secondUrl)).toEqual(['aaaaaaaaaa']);
    await add(secondUrl, 'bbbbbbbbbb');
    second.child.kill('SIGKILL');
    await second.over;
    expect(isRunning(pid)).toBe(true);

    const third = startLauncher(state, 'database');
    const { url: thirdUrl, pid: thirdPid } = await third.ready;
    expect(isRunning(pid)).toBe(false);
    expect(await kept(thirdUrl)).toEqual(['aaaaaaaaaa', 'bbbbbbbbbb']);
    third.child.kill('SIGKILL');
    process.kill(Number(thirdPid), 'SIGKILL');
    await third.over;

    const { url: fourthUrl } = await startLauncher(state, 'database').ready;
    expect(await kept(fourthUrl)).toEqual(['aaaaaaaaaa', 'bbbbbbbbbb']);
  });

  test('also beside a closed folder, its secret is readable by its owner alone, and is no fixed word', async () => {
    const passwords = await Promise.all(
      [makeStateFolder(), makeStateFolder({ closed: true })].map(async (state) => {
        const { url } = await startLauncher(state, 'database').ready;
        expect(await kept(url)).toEqual([]);
        expect(statSync(path.join(state, 'secrets.json')).mode & 0o777).toBe(0o600);
        await expect(runSql(String(url).replace(/:[^:@]+@/, ':wrong@'), 'SELECT 1')).rejects.toThrow(
          'password authentication failed',
        );
        return new URL(String(url)).password;
      }),
    );
    expect(passwords[0]).toMatch(/^[\w-]{32}$/);
    expect(passwords[0]).not.toBe(passwords[1]);
  });
});
