import 'server-only';
import { setTimeout as pause } from 'node:timers/promises';
import pg from 'pg';

/** The first half of the advisory locks by which workers are known to live; arbitrary but fixed. */
export const presenceClass = 7_318_221;

async function hold(url: string, worker: string): Promise<pg.Client> {
  const client = new pg.Client({ connectionString: url, application_name: 'quadrel worker' });
  client.on('error', () => undefined); // the connection's end is what is acted upon
  try {
    await client.connect();
    // A machine that lost its power says no goodbye; the database is to notice within a minute, not within hours.
    await client.query('SET tcp_keepalives_idle = 20; SET tcp_keepalives_interval = 10; SET tcp_keepalives_count = 3');
    // Shared, so that a connection made again need not wait for the end of the lost one.
    await client.query('SELECT pg_advisory_lock_shared($1, hashtext($2))', [presenceClass, worker]);
    return client;
  } catch (error) {
    await client.end().catch(() => undefined);
    throw error;
  }
}

/**
 * Shows that a worker lives, by a lock the database keeps for as long as it is connected: it goes with the process, however
 * that ends. A connection that is lost, or cannot be had yet, is tried for again. Returns how to stop.
 */
export async function showPresence(url: string, worker: string): Promise<() => Promise<void>> {
  let held: pg.Client | undefined;
  let leaving = false;
  const keep = async (): Promise<void> => {
    while (!leaving) {
      const client = await hold(url, worker).catch(() => undefined);
      if (client === undefined) await pause(500);
      else {
        held = client;
        client.once('end', () => void keep());
        return;
      }
    }
  };
  await keep();
  return async () => {
    leaving = true;
    await held?.end();
  };
}
