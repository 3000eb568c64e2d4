import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { migrations } from '#migrations/index.ts';
import { connect } from '#server/database/connect.ts';
import { migrateToLatest, migrateToNothing } from '#server/database/migrate.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

const names = Object.keys(migrations).sort();

describe('migrations', () => {
  let database: TestDatabase;
  beforeEach(async () => {
    database = await createTestDatabase({ migrated: false });
  });
  afterEach(() => database.drop());

  /** Everything the schema consists of, as the server prints it. */
  async function schema(): Promise<string[]> {
    const { knex } = database;
    const [tables] = await knex.raw("SHOW FULL TABLES WHERE Table_type = 'BASE TABLE'");
    const own = (tables as Record<string, string>[]).map((row) => Object.values(row)[0]!);
    const printed: string[] = [];
    for (const table of own.filter((name) => !name.startsWith('schema_migrations')).sort()) {
      const [[row]] = await knex.raw('SHOW CREATE TABLE ??', [table]);
      printed.push(row['Create Table']);
    }
    const [triggers] = await knex.raw('SHOW TRIGGERS');
    for (const { Trigger, Statement } of triggers) printed.push(`${Trigger}: ${Statement}`);
    return printed;
  }

  it('go forward, back to nothing, and forward to the same again', async () => {
    expect(await migrateToLatest(database.knex)).toEqual(names);
    const first = await schema();
    expect(first.length).toBeGreaterThanOrEqual(6 + 5);
    expect(await migrateToNothing(database.knex)).toEqual([...names].reverse());
    expect(await schema()).toEqual([]);
    expect(await migrateToLatest(database.knex)).toEqual(names);
    expect(await schema()).toEqual(first);
  });

  it('have nothing to do the second time', async () => {
    await migrateToLatest(database.knex);
    expect(await migrateToLatest(database.knex)).toEqual([]);
  });

  it('run once when three starts come at the same time', async () => {
    const others = [connect(database.url), connect(database.url)];
    try {
      const ran = await Promise.all([database.knex, ...others].map((knex) => migrateToLatest(knex)));
      expect(ran.map((list) => list.length).sort()).toEqual([0, 0, names.length]);
    } finally {
      for (const knex of others) await knex.destroy();
    }
  });

  it('go on after a start that was killed in the middle and left its lock', async () => {
    await migrateToLatest(database.knex);
    const whole = await schema();
    await database.knex('schema_migrations').where('name', '>=', '0002').delete();
    await database.knex.raw('ALTER TABLE sections DROP FOREIGN KEY sections_released');
    await database.knex.raw('DROP TRIGGER section_versions_kept');
    await database.knex('schema_migrations_lock').update({ is_locked: 1 });
    expect(await migrateToLatest(database.knex)).toEqual(names.slice(1));
    expect((await schema()).sort()).toEqual(whole.sort());
  });

  it('can be taken back one by one', async () => {
    await migrateToLatest(database.knex);
    for (const name of [...names].reverse()) await migrations[name]!.down!(database.knex);
    expect(await schema()).toEqual([]);
  });
});
