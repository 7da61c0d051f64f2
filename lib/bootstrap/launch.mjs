import { Run } from './run.mjs';
import { explain } from './trouble.mjs';

/**
 * Carries out `work(run)` so that nothing it started outlives it: whether it returns an exit code, fails, or is interrupted.
 * `interrupted` is the exit code after Ctrl-C or SIGTERM.
 */
export async function launch(name, command, interrupted, work) {
  // A reader that went away (`npm start | head`) must not take the launcher down before it has tidied up.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);
  let run;
  let leaving;
  const leave = (code) => {
    leaving ??= Promise.resolve(run?.leave()).then(() => process.exit(code));
    return leaving;
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void leave(interrupted));
  try {
    run = await Run.begin(name, command);
    if (leaving !== undefined) await run.leave();
    const code = await work(run);
    await leave(code);
  } catch (error) {
    if (leaving === undefined) process.stderr.write(explain(error));
    await leave(1);
  }
}
