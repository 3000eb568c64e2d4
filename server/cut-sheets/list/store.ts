import { type Knex } from 'knex';
import { type CutSheet, type CutSheetListQuery } from '#server/contracts/cut-sheets.ts';
import { continueBehind, pageOfRows } from '#server/database/cursor.ts';
import { containing, joinScoped, scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { type Reach } from '#server/sections/rules.ts';
import { progressOf } from '../progress.ts';
import { cursorOf, placeOf } from './cursor.ts';
import { columnsOf, type Row, sheetOf, withVersions } from './rows.ts';
import { views } from './views.ts';

/** How many section versions behind the shown version of `s` are not released: as a number, which leaves the order of the list alone. */
function staleEnds(db: Knex, workshopId: string, reach: Reach): Knex.QueryBuilder {
  const versions = scoped(db, workshopId)
    .table('cut_sheet_versions', { as: 'v' })
    .count()
    .whereRaw('?? = ??', ['v.sheet_id', 's.id'])
    .whereRaw('?? = ??', ['v.number', `s.${views[reach].number}`]);
  for (const end of ['root', 'tip']) {
    joinScoped(versions, 'inner', ['section_versions', end], 'v', [
      [`${end}.section_id`, `v.${end}_section_id`],
      [`${end}.number`, `v.${end}_number`],
    ]);
  }
  return versions.where((either) => {
    either.where('root.status', '<>', 'released').orWhere('tip.status', '<>', 'released');
  });
}

function narrow(
  db: Knex,
  workshopId: string,
  query: Knex.QueryBuilder,
  reach: Reach,
  { status, search }: Pick<CutSheetListQuery, 'search' | 'status'>,
): void {
  query.where('s.archived', status === 'archived' ? 1 : 0);
  if (reach === 'released' || status === 'released') query.where('s.released', 1);
  // What a reader of released versions sees is released, never a draft and never withdrawn.
  if (status === 'draft' || status === 'withdrawn') {
    query.where('s.latest_status', status);
    if (reach === 'released') query.whereRaw('1 = 0');
  }
  if (status === 'stale') query.whereRaw('0 < ?', [staleEnds(db, workshopId, reach)]);
  if (search) {
    const pattern = containing(search);
    query.where((either) => either.where('s.name', 'like', pattern).orWhere('s.purpose', 'like', pattern));
  }
}

/** The query behind a page of the list, for one row more than the page; apart, so that it can be explained. */
export function sheetListQuery(
  db: Knex,
  workshopId: string,
  reach: Reach,
  asked: CutSheetListQuery,
): Knex.QueryBuilder {
  const { column, index } = views[reach].sorts[asked.sort];
  const order = asked.sort === 'updated' ? 'desc' : 'asc';
  const chosen = scoped(db, workshopId).table('cut_sheets', { as: 's', index });
  narrow(db, workshopId, chosen, reach, asked);
  if (asked.cursor !== undefined) {
    const direction = order === 'desc' ? 'descending' : 'ascending';
    continueBehind(chosen, [`s.${column}`, 's.id'], direction, placeOf(asked.cursor, asked.sort));
  }
  chosen
    .select(columnsOf(reach, asked.sort))
    .orderBy(`s.${column}`, order)
    .orderBy('s.id', order)
    .limit(asked.limit + 1);
  return withVersions(db, chosen).orderBy('s.sort_value', order).orderBy('s.id', order);
}

/**
 * A page of the cut sheets within reach: newest first, or by name.
 * @throws Refusal naming `cursor` when it is not one of this list in this order
 */
export async function listCutSheets(
  db: Knex,
  workshopId: string,
  reach: Reach,
  asked: CutSheetListQuery,
): Promise<{ items: CutSheet[]; nextCursor: string | null }> {
  const rows: Row[] = await sheetListQuery(db, workshopId, reach, asked);
  const { page, last } = pageOfRows(rows, asked.limit);
  return {
    items: await withProgress(db, workshopId, page),
    nextCursor: last ? cursorOf(asked.sort, { value: last.sort_value, id: last.id }) : null,
  };
}

async function withProgress(db: Knex, workshopId: string, rows: readonly Row[]): Promise<CutSheet[]> {
  const released = rows.filter((row) => row.released_number !== null).map(({ id }) => id);
  const progress = await progressOf(db, workshopId, released);
  return rows.map((row) => sheetOf(row, progress.get(row.id) ?? []));
}

/**
 * One cut sheet as the list shows it.
 * @throws Refusal `not-found` when there is none within reach
 */
export async function findCutSheet(
  db: Knex,
  workshopId: string,
  sheetId: string,
  reach: Reach,
): Promise<CutSheet> {
  const chosen = scoped(db, workshopId)
    .table('cut_sheets', { as: 's' })
    .where('s.id', sheetId)
    .select(columnsOf(reach, 'name'));
  if (reach === 'released') chosen.where('s.released', 1);
  const rows: Row[] = await withVersions(db, chosen);
  const [sheet] = await withProgress(db, workshopId, rows);
  if (!sheet) throw new Refusal('not-found');
  return sheet;
}
