import 'server-only';
import { Logger, run, type TaskList } from 'graphile-worker';
import { config } from '@/lib/config/config';
import { closeDatabase } from '@/lib/database/connection';
import { jobs, perform } from './jobs';
import { showPresence } from './presence';
import { releaser } from './release';

const jobsAtOnce = 4;
const betweenLooks = 5000;

const tasks: TaskList = Object.fromEntries(
  Object.keys(jobs).map((name) => [name, (payload, { abortSignal }) => perform(name, payload, abortSignal)]),
);

const tell = (text: string): void => void process.stdout.write(`${text}\n`);

/** What went wrong is said where a person sees it, what was done stands in the log. */
const logger = new Logger(() => (level, message) => {
  if (level === 'error' || level === 'warning') process.stderr.write(`Jobs: ${message}\n`);
});

async function work(): Promise<void> {
  const { DATABASE_URL, SMTP_URL } = config();
  if (SMTP_URL === undefined) {
    throw new Error('SMTP_URL is not set, and a job worker sends mail. README.md lists the settings.');
  }
  const present = new Map<string, Promise<() => Promise<void>>>();
  const appear = async (worker: string): Promise<void> => {
    const shown = present.get(worker) ?? showPresence(DATABASE_URL, worker);
    present.set(worker, shown);
    await shown;
  };
  const runner = await run({
    connectionString: DATABASE_URL,
    concurrency: jobsAtOnce,
    taskList: tasks,
    parsedCronItems: [],
    noHandleSignals: true,
    logger,
    preset: {
      plugins: [
        {
          name: 'presence',
          version: '1',
          worker: { hooks: { startWorker: (_context, { worker }) => appear(worker.workerPool.id) } },
        },
      ],
    },
  });
  runner.events.on('job:success', ({ job }) => tell(`Done: ${job.task_identifier}, job ${job.id}.`));
  const release = releaser();
  const look = setInterval(() => void release().catch(() => undefined), betweenLooks);
  let ending = false;
  const end = () => {
    if (!ending) void runner.stop();
    ending = true;
  };
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, end);
  tell('Jobs are being done.');
  await runner.promise;
  clearInterval(look);
  for (const shown of present.values()) await (await shown)();
  await closeDatabase();
}

try {
  await work();
  process.exit(0);
} catch (error) {
  process.stderr.write(`The job worker has stopped: ${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
}
