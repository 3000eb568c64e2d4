import { type Knex } from 'knex';
import { Refusal } from '#server/refusal.ts';
import { isDuplicate } from './errors.ts';
import { scoped, type WorkshopTable } from './scoped.ts';
import { inTransaction } from './transaction.ts';

/** A request that is done once: the key that its client made for it, and a sum of what it asks for. */
export interface Keyed {
  readonly key: string | undefined;
  readonly request: string;
}

/** Where a table keeps the keys of the requests that made its rows, in `idempotency_key` and `request_checksum`. */
export interface KeyKeeping<Row> {
  readonly table: WorkshopTable;
  /** The unique key over workshop and idempotency key. */
  readonly uniqueKey: string;
  /** What tells the row that was made. */
  readonly columns: readonly (keyof Row & string)[];
}

/**
 * The row that an earlier request under the same key has made; null when there was none.
 * @throws Refusal `key-reused` when that request asked for something else
 */
export async function madeBefore<Row>(
  db: Knex,
  workshopId: string,
  { table, columns }: KeyKeeping<Row>,
  { key, request }: Keyed,
): Promise<Row | null> {
  if (key === undefined) return null;
  const row = (await scoped(db, workshopId)
    .table(table)
    .where({ idempotency_key: key })
    .first(...columns, 'request_checksum')) as (Row & { request_checksum: string }) | undefined;
  if (!row) return null;
  if (row.request_checksum !== request) {
    throw new Refusal('key-reused', { detail: 'Make a new key for each thing that you mean to save.' });
  }
  return row;
}

/**
 * Does `work` in a transaction, once for each key: a retry, even at the same moment, gets what the first has made.
 * @throws Refusal `key-reused`, and whatever `work` throws
 */
export async function once<Row>(
  db: Knex,
  workshopId: string,
  keeping: KeyKeeping<Row>,
  keyed: Keyed,
  work: (transaction: Knex.Transaction) => Promise<Row>,
): Promise<Row> {
  const before = await madeBefore(db, workshopId, keeping, keyed);
  if (before) return before;
  try {
    return await inTransaction(db, work);
  } catch (error) {
    if (!isDuplicate(error, keeping.uniqueKey)) throw error;
    const made = await madeBefore(db, workshopId, keeping, keyed);
    if (!made) throw error;
    return made;
  }
}

/** The columns in which a row keeps its request. */
export function keyColumns({ key, request }: Keyed) {
  return { idempotency_key: key ?? null, request_checksum: key === undefined ? null : request };
}
