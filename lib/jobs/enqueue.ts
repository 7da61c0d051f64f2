import 'server-only';
import type { Transaction } from 'sequelize';
import { database } from '@/lib/database/connection';
// Types alone: what the server enqueues, it does not have to load.
import type { JobName, PayloadOf } from './jobs';

interface Enqueuing {
  /** How often the job is tried before it stays failed. The pauses grow from seconds to hours: 12 last most of a day. */
  readonly maxAttempts?: number;
  /** Of jobs with the same key one waits: a later one takes the place of an earlier one that has not begun. */
  readonly jobKey?: string;
  /** Not before this moment. */
  readonly runAt?: Date;
}

/** Puts a job into the queue, to be done once the transaction that made its rows is committed, and only then. */
export async function enqueue<Name extends JobName>(
  name: Name,
  payload: PayloadOf<Name>,
  transaction: Transaction,
  { maxAttempts = 12, jobKey, runAt }: Enqueuing = {},
): Promise<void> {
  await database().query(
    `SELECT graphile_worker.add_job($name::text, payload => $payload::json, max_attempts => $maxAttempts::int,
                                    job_key => $jobKey::text, run_at => $runAt::timestamptz)`,
    {
      bind: { name, payload: JSON.stringify(payload), maxAttempts, jobKey: jobKey ?? null, runAt: runAt ?? null },
      transaction,
    },
  );
}
