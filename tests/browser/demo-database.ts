import { seedDemo } from '#server/start/demo/seed.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

export const demoPassword = 'marsh-reed-heron-7';

/** Fills in the demo workshop once; TEST_DEMO_DATABASE names it for the test files, which take copies of its rows. */
export async function seedDemoOnce(): Promise<TestDatabase> {
  const database = await createTestDatabase();
  await seedDemo(database.knex, demoPassword);
  process.env['TEST_DEMO_DATABASE'] = new URL(database.url).pathname.slice(1);
  return database;
}

/** A database of its own with the demo workshop: the tables by the migrations, the rows copied. */
export async function createDemoDatabase(): Promise<TestDatabase> {
  const from = process.env['TEST_DEMO_DATABASE'];
  if (from === undefined) throw new Error('TEST_DEMO_DATABASE is not set: only the browser project has it.');
  const database = await createTestDatabase();
  const { knex } = database;
  await knex.transaction(async (transaction) => {
    await transaction.raw('SET foreign_key_checks = 0');
    const tables = [...(await columnsOf(from))];
    // Files come before their versions: a released version takes none.
    tables.sort(([a], [b]) => Number(b === 'cut_files') - Number(a === 'cut_files'));
    for (const [table, columns] of tables) {
      const list = columns.map((column) => `\`${column}\``).join(', ');
      await transaction.raw(
        `INSERT INTO \`${table}\` (${list}) SELECT ${list} FROM \`${from}\`.\`${table}\``,
      );
    }
    await transaction.raw('SET foreign_key_checks = 1');
  });
  return database;

  /** What can be written of each table; the migrations have filled their own list already. */
  async function columnsOf(schema: string): Promise<Map<string, string[]>> {
    const rows: { table: string; column: string }[] = await knex('information_schema.columns')
      .where({ table_schema: schema })
      .whereNot('table_name', 'like', 'schema_migrations%')
      .whereNot('extra', 'like', '%GENERATED%')
      .select({ table: 'table_name', column: 'column_name' });
    const tables = new Map<string, string[]>();
    for (const { table, column } of rows) tables.set(table, [...(tables.get(table) ?? []), column]);
    return tables;
  }
}
