import { type Knex } from 'knex';
import { scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { type Reach } from '#server/sections/rules.ts';

/** What decisions about a cut sheet need to know of it. */
interface SheetState {
  readonly id: string;
  readonly name: string;
  readonly latestNumber: number;
  readonly releasedNumber: number | null;
  readonly archived: boolean;
}

interface Row {
  id: string;
  name: string;
  latest_number: number;
  released_number: number | null;
  released_count: number;
  archived: 0 | 1;
}

/**
 * The state of a cut sheet; with `lock` it stays so until the transaction ends, and other writers wait.
 * @throws Refusal `not-found` when the workshop has no such sheet, or none within reach
 */
export async function sheetState(
  db: Knex,
  workshopId: string,
  sheetId: string,
  options: { reach?: Reach; lock?: boolean } = {},
): Promise<SheetState> {
  const query = scoped(db, workshopId).table('cut_sheets').where({ id: sheetId });
  if (options.lock) query.forUpdate();
  const columns = ['id', 'name', 'latest_number', 'released_number', 'released_count', 'archived'];
  const row: Row | undefined = await query.first(...columns);
  if (!row || (options.reach === 'released' && row.released_count === 0)) throw new Refusal('not-found');
  return {
    id: row.id,
    name: row.name,
    latestNumber: row.latest_number,
    releasedNumber: row.released_number,
    archived: row.archived === 1,
  };
}
