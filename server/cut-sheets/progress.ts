import { type Knex } from 'knex';
import { type CutSheet, type SheetPart } from '#server/contracts/cut-sheets.ts';
import { scoped } from '#server/database/scoped.ts';
import { partsOfColumn } from './source-rows.ts';

/** How many of a part a sheet wants: a set of templates serves for all panels. */
export function wantedOf(part: SheetPart, quantity: number): number {
  return part === 'templates' ? 1 : quantity;
}

interface Row {
  sheet_id: string;
  parts: string;
  quantity: number;
}

/** How many parts of the released versions are done, sheet by sheet; sheets without a released version are left out. */
export async function progressOf(
  db: Knex,
  workshopId: string,
  sheetIds: readonly string[],
): Promise<ReadonlyMap<string, CutSheet['progress']>> {
  if (sheetIds.length === 0) return new Map();
  const rows: Row[] = await scoped(db, workshopId)
    .table('cut_sheet_versions')
    .whereIn('released_sheet', sheetIds)
    .select('sheet_id', 'parts', 'quantity');
  return new Map(
    rows.map(({ sheet_id, parts, quantity }) => [
      sheet_id,
      partsOfColumn(parts).map((part) => ({ part, wanted: wantedOf(part, quantity), done: 0, scrapped: 0 })),
    ]),
  );
}
