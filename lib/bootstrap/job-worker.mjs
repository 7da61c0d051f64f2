import { jobWorker } from './build.mjs';
import { Trouble, say } from './trouble.mjs';

const shortLife = 10_000;
const mostShortLives = 5;
const pause = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));

/** Starts one job worker. */
export const startJobWorker = (run, settings, stdio = 'inherit') =>
  run.start(process.execPath, [jobWorker], {
    stdio,
    env: { ...process.env, NODE_ENV: 'production', ...settings },
  });

/**
 * Keeps a job worker beside the server: one that ended by itself is started again, for the server can do without it for a
 * while. Settles only when the run is over, or with a Trouble when worker after worker ends as soon as it was started.
 */
export async function keepJobWorker(run, settings, stdio) {
  for (let shortLives = 0; !run.leaving; await pause(1000 * shortLives)) {
    const began = Date.now();
    await startJobWorker(run, settings, stdio).ended;
    if (run.leaving) return;
    shortLives = Date.now() - began < shortLife ? shortLives + 1 : 1;
    if (shortLives >= mostShortLives) {
      throw new Trouble(
        `The job worker ended ${mostShortLives} times in a row, so no mail is sent.`,
        'Its messages stand above and in .quadrel/jobs.log; correct what they name, then start again.',
      );
    }
    say('The job worker ended; another one is started.');
  }
}
