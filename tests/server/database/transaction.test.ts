import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { isDuplicate, isLockConflict, isUnavailable } from '#server/database/errors.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { connect } from '#server/database/connect.ts';
import { createTestDatabase, type TestDatabase } from '#tests/database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase({ migrated: false });
  await database.knex.raw(
    'CREATE TABLE counters (id int PRIMARY KEY, n int NOT NULL, UNIQUE KEY counters_n (n)) ENGINE = InnoDB',
  );
  await database.knex('counters').insert([
    { id: 1, n: 100 },
    { id: 2, n: 200 },
  ]);
});
afterAll(() => database.drop());

const raise = (db: TestDatabase['knex'], id: number) => db('counters').where({ id }).increment('n', 1);
const values = async () => (await database.knex('counters').orderBy('id')).map(({ n }) => n as number);

describe('inTransaction', () => {
  it('does both when two take the same locks crosswise', async () => {
    const before = await values();
    let runs = 0;
    const crosswise = (first: number, second: number) =>
      inTransaction(database.knex, async (transaction) => {
        runs += 1;
        await raise(transaction, first);
        await sleep(150);
        await raise(transaction, second);
      });
    await Promise.all([crosswise(1, 2), crosswise(2, 1)]);
    expect(await values()).toEqual(before.map((n) => n + 2));
    expect(runs).toBeGreaterThan(2);
  });

  it('rolls back and throws what the work throws, without another try', async () => {
    const before = await values();
    let runs = 0;
    const work = inTransaction(database.knex, async (transaction) => {
      runs += 1;
      await raise(transaction, 1);
      throw new Error('no');
    });
    await expect(work).rejects.toThrow('no');
    expect(runs).toBe(1);
    expect(await values()).toEqual(before);
  });

  it('gives up after some tries', async () => {
    let runs = 0;
    const conflict = Object.assign(new Error('Deadlock found'), { code: 'ER_LOCK_DEADLOCK' });
    const work = inTransaction(database.knex, () => {
      runs += 1;
      return Promise.reject(conflict);
    });
    await expect(work).rejects.toBe(conflict);
    expect(runs).toBe(5);
  });
});

describe('errors of the database', () => {
  it('tell a unique key by its name', async () => {
    const error: unknown = await database
      .knex('counters')
      .insert({ id: 3, n: (await values())[0]! })
      .catch((e: unknown) => e);
    expect(isDuplicate(error, 'counters_n')).toBe(true);
    expect(isDuplicate(error, 'PRIMARY')).toBe(false);
    expect([isUnavailable(error), isLockConflict(error)]).toEqual([false, false]);
  });

  it('tell a server that is not there, and a pool that is closed', async () => {
    const absent = connect('mysql://nobody:x@127.0.0.1:9/none');
    const refused: unknown = await absent.raw('SELECT 1').catch((e: unknown) => e);
    await absent.destroy();
    const closed: unknown = await absent.raw('SELECT 1').catch((e: unknown) => e);
    expect([isUnavailable(refused), isUnavailable(closed)]).toEqual([true, true]);
  });

  it('do not take any error for one of theirs', () => {
    for (const error of [new Error('x'), null, 'ECONNREFUSED', { code: 'ER_DUP_ENTRY' }]) {
      expect([isUnavailable(error), isLockConflict(error), isDuplicate(error, 'x')]).toEqual([
        false,
        false,
        false,
      ]);
    }
  });
});

describe('connect', () => {
  it('reads and writes times in UTC, text of every script, and long numbers to the last digit', async () => {
    const { knex } = database;
    await knex.raw(
      'CREATE TABLE kept (at datetime(3), text varchar(20), number double) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4',
    );
    const row = { at: new Date('2026-07-01T12:34:56.789Z'), text: '翼 🪁 ß', number: 0.1 + 0.2 };
    await knex('kept').insert(row);
    expect(await knex('kept').first()).toEqual(row);
    const [[stored]] = await knex.raw('SELECT cast(at AS char) AS at FROM kept');
    expect(stored.at).toBe('2026-07-01 12:34:56.789');
  });

  it('refuses values that do not fit instead of cutting them', async () => {
    await expect(database.knex('kept').insert({ text: 'x'.repeat(21) })).rejects.toThrow(/Data too long/);
  });

  it.each(['http://127.0.0.1/x', 'mysql://127.0.0.1', 'nonsense'])('refuses the address %s', (url) => {
    expect(() => connect(url)).toThrow(TypeError);
  });
});
