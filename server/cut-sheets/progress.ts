import { type Knex } from 'knex';
import { type CutSheet, type SheetPart } from '#server/contracts/cut-sheets.ts';
import { scoped } from '#server/database/scoped.ts';
import { partsOfColumn } from './source-rows.ts';

/** How many of a part a sheet wants: a set of templates serves for all panels. */
export function wantedOf(part: SheetPart, quantity: number): number {
  return part === 'templates' ? 1 : quantity;
}

interface VersionRow {
  sheet_id: string;
  number: number;
  parts: string;
  quantity: number;
}
interface CountRow {
  sheet_id: string;
  version_number: number;
  part: SheetPart;
  done: number;
  scrapped: number;
}

/** How many parts of the released versions are done, sheet by sheet; sheets without a released version are left out. */
export async function progressOf(
  db: Knex,
  workshopId: string,
  sheetIds: readonly string[],
): Promise<ReadonlyMap<string, CutSheet['progress']>> {
  if (sheetIds.length === 0) return new Map();
  const scope = scoped(db, workshopId);
  const versions: VersionRow[] = await scope
    .table('cut_sheet_versions')
    .whereIn('released_sheet', sheetIds)
    .select('sheet_id', 'number', 'parts', 'quantity');
  const counts: CountRow[] = await scope
    .table('cut_progress')
    .whereIn('sheet_id', sheetIds)
    .select('sheet_id', 'version_number', 'part', 'done', 'scrapped');
  return new Map(
    versions.map(({ sheet_id, number, parts, quantity }) => {
      const own = counts.filter((row) => row.sheet_id === sheet_id && row.version_number === number);
      const progress = partsOfColumn(parts).map((part) => {
        const { done = 0, scrapped = 0 } = own.find((row) => row.part === part) ?? {};
        return { part, wanted: wantedOf(part, quantity), done, scrapped };
      });
      return [sheet_id, progress];
    }),
  );
}
