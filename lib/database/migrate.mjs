// Plain JavaScript, so that the launcher can migrate before anything has been compiled.
import path from 'node:path';
import { Logger, runMigrations } from 'graphile-worker';
import pg from 'pg';
import { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug, memoryStorage } from 'umzug';

const root = path.resolve(import.meta.dirname, '..', '..');

/** Two servers over one database must not migrate at the same time; the number is arbitrary but fixed. */
const migrationLock = 7_318_220;

async function withDatabase(url, work) {
  const database = new Sequelize(url, { dialect: 'postgres', dialectModule: pg, logging: false, pool: { max: 3 } });
  try {
    return await database.transaction(async (transaction) => {
      await database.query('SELECT pg_advisory_xact_lock(:lock)', {
        replacements: { lock: migrationLock },
        transaction,
      });
      return await work(database);
    });
  } finally {
    await database.close();
  }
}

const runner = (context, folder, storage) =>
  new Umzug({
    migrations: { glob: [`${folder}/*.mjs`, { cwd: root }] },
    context,
    storage,
    logger: undefined,
  });

const migrations = (database) =>
  runner(
    database.getQueryInterface(),
    'migrations',
    new SequelizeStorage({ sequelize: database, tableName: 'migrations' }),
  );

const names = (steps) => steps.map((step) => step.name);

/** The queue's own tables lie in a schema of their own and are migrated by the package they belong to. */
const migrateQueue = (url) => runMigrations({ connectionString: url, logger: new Logger(() => () => undefined) });

/** Brings the schema and the queue up to date; returns the names of the migrations of ours that were run. */
export const migrate = (url) =>
  withDatabase(url, async (database) => {
    const done = names(await migrations(database).up());
    await migrateQueue(url);
    return done;
  });

/** Undoes every migration, the newest first, and removes the queue; returns their names. Every row is lost. */
export const rollBack = (url) =>
  withDatabase(url, async (database) => {
    await database.query('DROP SCHEMA IF EXISTS graphile_worker CASCADE');
    return names(await migrations(database).down({ to: 0 }));
  });

/**
 * Runs every seeder. Each one may be run any number of times. With `demo` a database in which nobody has an account gets the
 * invented groups, whose passwords everyone knows.
 */
export const seed = (url, { demo = false } = {}) =>
  withDatabase(url, async (database) => {
    const context = { queryInterface: database.getQueryInterface(), demo };
    return names(await runner(context, 'seeders', memoryStorage()).up());
  });
