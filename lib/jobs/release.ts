import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/database/connection';
import { presenceClass } from './presence';

/** Those who hold jobs but no longer hold the lock that shows they live. */
const absentHolders = `
  WITH holders AS MATERIALIZED (SELECT DISTINCT locked_by FROM graphile_worker.jobs WHERE locked_by IS NOT NULL)
  SELECT locked_by AS worker FROM holders WHERE pg_try_advisory_xact_lock($class::int, hashtext(locked_by))`;

/**
 * Gives the jobs of dead workers back to the queue, where they would otherwise stay locked for hours. A worker counts as dead
 * when it was absent at two looks: one that lost its connection has time to come back between them.
 */
export function releaser(): () => Promise<void> {
  let suspects: ReadonlySet<string> = new Set();
  return async () => {
    await database().transaction(async (transaction) => {
      const rows = await database().query<{ worker: string }>(absentHolders, {
        type: QueryTypes.SELECT,
        bind: { class: presenceClass },
        transaction,
      });
      const absent = rows.map(({ worker }) => worker);
      const dead = absent.filter((worker) => suspects.has(worker));
      if (dead.length > 0) {
        await database().query('SELECT graphile_worker.force_unlock_workers($dead::text[])', {
          bind: { dead },
          transaction,
        });
      }
      suspects = new Set(absent);
    });
  };
}
