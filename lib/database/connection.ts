import 'server-only';
import pg from 'pg';
import { Sequelize } from 'sequelize';
import { config } from '@/lib/config/config';
import { initApiToken } from '@/models/api-token';
import { initAuditEvent } from '@/models/audit-event';
import { initCheck } from '@/models/check';
import { initDraft } from '@/models/draft';
import { initGroup } from '@/models/group';
import { initIdempotencyKey } from '@/models/idempotency-key';
import { initIdentity } from '@/models/identity';
import { initInvitation } from '@/models/invitation';
import { initMembership } from '@/models/membership';
import { initPasswordReset } from '@/models/password-reset';
import { initPermalink } from '@/models/permalink';
import { initRevision } from '@/models/revision';
import { initUser } from '@/models/user';

/** Every model, in the order in which one may refer to another. */
const initialisers = [
  initPermalink,
  initUser,
  initGroup,
  initMembership,
  initInvitation,
  initPasswordReset,
  initApiToken,
  initAuditEvent,
  initDraft,
  initIdentity,
  initRevision,
  initCheck,
  initIdempotencyKey,
] as const;

/** Opens a database and binds the models to it. The caller closes it. */
export function connect(url: string, connections: number): Sequelize {
  const database = new Sequelize(url, {
    dialect: 'postgres',
    dialectModule: pg,
    logging: false,
    pool: { max: connections, min: 0, idle: 30_000, acquire: 10_000 },
  });
  for (const initialise of initialisers) initialise(database);
  return database;
}

// The server loads this module more than once (pages, routes, reloads in development); the process must still hold one pool.
const held = globalThis as typeof globalThis & { quadrelDatabase?: Sequelize };

// Each copy of this module has its own classes of models, and binds them to the one pool.
let bound: Sequelize | undefined;

/** The database of this process, opened at the first call. */
export function database(): Sequelize {
  held.quadrelDatabase ??= connect(config().DATABASE_URL, config().DATABASE_CONNECTIONS);
  if (bound !== held.quadrelDatabase) {
    bound = held.quadrelDatabase;
    for (const initialise of initialisers) initialise(bound);
  }
  return held.quadrelDatabase;
}

/** Whether the database answers; throws what the driver says when it does not. */
export async function pingDatabase(): Promise<void> {
  await database().query('SELECT 1');
}

/** Closes the pool of this process. A later call of `database` opens a new one. */
export async function closeDatabase(): Promise<void> {
  const open = held.quadrelDatabase;
  delete held.quadrelDatabase;
  await open?.close();
}
