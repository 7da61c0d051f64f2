import { describe, expect, test } from 'vitest';
import { isRunning, makeStateFolder, startLauncher } from './launcher';

describe('a run and what it started', () => {
  test.each(['SIGTERM', 'SIGINT'] as const)('%s ends both and is no failure', async (signal) => {
    const launcher = startLauncher(makeStateFolder(), 'sleeper');
    const { pid } = await launcher.ready;
    expect(isRunning(pid)).toBe(true);
    launcher.child.kill(signal);
    expect(await launcher.over).toMatchObject({ code: 0 });
    expect(isRunning(pid)).toBe(false);
  });

  test('a second start says who runs and where, and disturbs nothing', async () => {
    const state = makeStateFolder();
    const first = startLauncher(state, 'sleeper');
    const { pid } = await first.ready;
    const second = await startLauncher(state, 'sleeper').over;
    expect(second.code).toBe(1);
    expect(second.output).toContain(
      `Stopped: "npm start" (process ${first.child.pid}) serves http://127.0.0.1:1 from this folder.\nUse that one, or stop it first`,
    );
    expect(isRunning(pid)).toBe(true);
  });

  test('of several starts at the same moment one runs', async () => {
    const state = makeStateFolder();
    const launchers = Array.from({ length: 4 }, () => startLauncher(state, 'sleeper'));
    const outcomes = await Promise.all(launchers.map(({ ready }) => ready.then(() => 'runs').catch(() => 'refused')));
    expect(outcomes.sort()).toEqual(['refused', 'refused', 'refused', 'runs']);
  });

  test('what a killed start left running is ended by the next one', async () => {
    const state = makeStateFolder();
    const killed = startLauncher(state, 'sleeper');
    const { pid } = await killed.ready;
    killed.child.kill('SIGKILL');
    await killed.over;
    expect(isRunning(pid)).toBe(true);
    const next = startLauncher(state, 'sleeper');
    expect((await next.ready).pid).not.toBe(pid);
    expect(isRunning(pid)).toBe(false);
  });
});
