import { type Knex } from 'knex';
import { migrations } from '#migrations/index.ts';

/** How long one start waits for another that is migrating the same database, in seconds. */
const WAIT_SECONDS = 120;

/** The migrations as imported modules: one source for the program, the tests and the command line. */
const migrationSource: Knex.MigrationSource<string> = {
  getMigrations: async () => Object.keys(migrations).sort(),
  getMigrationName: (name) => name,
  getMigration: async (name) => {
    const migration = migrations[name];
    if (!migration) throw new Error(`There is no migration ${name}.`);
    return migration;
  },
};

/** MariaDB commits at every schema statement, so a transaction around a migration would only pretend. */
const settings: Knex.MigratorConfig = {
  migrationSource,
  tableName: 'schema_migrations',
  disableTransactions: true,
};

/**
 * Runs `work` while this process alone may migrate the database. The lock belongs to the connection, so a killed
 * process gives it up; a lock row that Knex left behind is then stale by definition and is freed.
 */
async function alone<Result>(knex: Knex, work: () => Promise<Result>): Promise<Result> {
  return knex.transaction(async (holder) => {
    const name = "concat('ribwright-migrate-', md5(database()))";
    const [[row]] = await holder.raw(`SELECT GET_LOCK(${name}, ?) AS held`, [WAIT_SECONDS]);
    if (row.held !== 1) throw new Error('Another start has been migrating this database for two minutes.');
    try {
      await knex.migrate.forceFreeMigrationsLock(settings);
      return await work();
    } finally {
      await holder.raw(`DO RELEASE_LOCK(${name})`);
    }
  });
}

/**
 * Brings the database to the newest state. Two starts at once migrate once: the second waits and finds nothing to do.
 *
 * @returns the names of the migrations that ran, in order; empty when there was nothing to do
 * @throws when the database is out of reach or a migration fails; each migration can be run again after a failure
 */
export async function migrateToLatest(knex: Knex): Promise<string[]> {
  return alone(knex, async () => {
    const [, names] = (await knex.migrate.latest(settings)) as [number, string[]];
    return names;
  });
}

/**
 * Takes back every migration, newest first; all data is lost.
 *
 * @returns the names of the migrations taken back
 */
export async function migrateToNothing(knex: Knex): Promise<string[]> {
  return alone(knex, async () => {
    const [, names] = (await knex.migrate.rollback(settings, true)) as [number, string[]];
    return names;
  });
}
