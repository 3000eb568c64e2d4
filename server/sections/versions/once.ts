import { type Knex } from 'knex';
import { isDuplicate } from '#server/database/errors.ts';
import { scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author } from '../rules.ts';

/** The version that a request has made. */
interface Made {
  readonly sectionId: string;
  readonly number: number;
}

/**
 * What an earlier request under the same key has made; null when there was none.
 * @throws Refusal `key-reused` when that request asked for something else
 */
export async function madeBefore(
  db: Knex,
  author: Author,
  { key, request }: { key: string | undefined; request: string },
): Promise<Made | null> {
  if (key === undefined) return null;
  const row: { section_id: string; number: number; request_checksum: string } | undefined = await scoped(
    db,
    author.workshopId,
  )
    .table('section_versions')
    .where({ idempotency_key: key })
    .first('section_id', 'number', 'request_checksum');
  if (!row) return null;
  if (row.request_checksum !== request) {
    throw new Refusal('key-reused', { detail: 'Make a new key for each version that you mean to save.' });
  }
  return { sectionId: row.section_id, number: row.number };
}

/**
 * Does `work` in a transaction, once for each key: a retry, even at the same moment, gets what the first has made.
 * @throws Refusal `key-reused`, and whatever `work` throws
 */
export async function once(
  db: Knex,
  author: Author,
  keyed: { key: string | undefined; request: string },
  work: (transaction: Knex.Transaction) => Promise<Made>,
): Promise<Made> {
  const before = await madeBefore(db, author, keyed);
  if (before) return before;
  try {
    return await inTransaction(db, work);
  } catch (error) {
    if (!isDuplicate(error, 'versions_idempotency')) throw error;
    const made = await madeBefore(db, author, keyed);
    if (!made) throw error;
    return made;
  }
}
