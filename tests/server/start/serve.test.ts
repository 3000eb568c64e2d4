import { afterAll, beforeAll, expect, it } from 'vitest';
import { openDatabase } from '#server/start/serve.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase({ migrated: false });
});
afterAll(() => database.drop());

it('says in the database’s own words why the tables cannot be brought up to date, without the statement', async () => {
  await database.knex.raw('CREATE TABLE people (nothing_of_ours INT)');
  await expect(openDatabase(database.url)).rejects.toMatchObject({
    name: 'StartError',
    message: expect.stringMatching(
      /^The tables could not be brought up to date: Can't create table [^\n]+Foreign key[^\n]+[^.]\.$/,
    ) as string,
  });
});

it('names the server that does not let us in', async () => {
  const url = new URL(database.url);
  url.password = 'wrong';
  await expect(openDatabase(url.href)).rejects.toThrow(
    new RegExp(`^The database at ${url.host} does not let us in: `),
  );
});
