import { setTimeout as sleep } from 'node:timers/promises';
import { type Knex } from 'knex';
import { isLockConflict } from './errors.ts';

const ATTEMPTS = 5;
const FIRST_PAUSE_MS = 15;

/**
 * Runs `work` in one transaction, again from its beginning when two writers got in each other's way; `work` must
 * therefore do nothing but read and write the database.
 *
 * @throws whatever `work` throws, after the transaction is rolled back; the last conflict when none of the tries came through
 */
export async function inTransaction<Result>(
  db: Knex,
  work: (transaction: Knex.Transaction) => Promise<Result>,
): Promise<Result> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (attempt === ATTEMPTS || !isLockConflict(error)) throw error;
      await sleep(FIRST_PAUSE_MS * 2 ** (attempt - 1) * (1 + Math.random()));
    }
  }
}
