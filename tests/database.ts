import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { createConnection } from 'mysql2/promise';
import { connect } from '#server/database/connect.ts';
import { migrateToLatest } from '#server/database/migrate.ts';

/** A database of one test file's own, with all tables and nothing in them. */
export interface TestDatabase {
  readonly knex: Knex;
  readonly url: string;
  /** Closes the connections and removes the database. */
  drop(): Promise<void>;
}

/** The address of the run's throw-away server; the server and browser projects and the bench set it. */
function serverUrl(): string {
  const url = process.env['TEST_DATABASE_URL'];
  if (url === undefined) {
    throw new Error('TEST_DATABASE_URL is not set: only the server and browser projects have a database.');
  }
  return url;
}

async function administer(statement: string): Promise<void> {
  const connection = await createConnection({ uri: serverUrl() });
  try {
    await connection.query(statement);
  } finally {
    await connection.end();
  }
}

/**
 * Makes an empty database under a name of its own, and brings its tables up to date unless told not to, so that test
 * files can run at the same time.
 */
export async function createTestDatabase(
  options: { readonly migrated?: boolean } = {},
): Promise<TestDatabase> {
  const name = `test_${randomBytes(8).toString('hex')}`;
  await administer(`CREATE DATABASE ${name} CHARACTER SET utf8mb4`);
  const url = new URL(serverUrl());
  url.pathname = `/${name}`;
  const knex = connect(url.href);
  const drop = async (): Promise<void> => {
    await knex.destroy();
    await administer(`DROP DATABASE IF EXISTS ${name}`);
  };
  try {
    if (options.migrated !== false) await migrateToLatest(knex);
  } catch (error) {
    await drop();
    throw error;
  }
  return { knex, url: url.href, drop };
}
