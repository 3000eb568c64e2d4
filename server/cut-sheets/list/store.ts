import { type Knex } from 'knex';
import { z } from 'zod';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import { type CutSheet, type CutSheetListQuery } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { continueBehind, decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { containing, joinScoped, scoped } from '#server/database/scoped.ts';
import { Refusal } from '#server/refusal.ts';
import { type Reach } from '#server/sections/rules.ts';
import { progressOf } from '../progress.ts';
import {
  joinSources,
  joinThings,
  machineOf,
  materialOf,
  partsOfColumn,
  sourceOf,
  type SourceRow,
  type ThingRow,
} from '../source-rows.ts';
import { type Sort, views } from './views.ts';

interface SheetColumns {
  id: string;
  name: string;
  purpose: string;
  created_at: Date;
  shown_at: Date;
  shown_by: string;
  shown_by_name: string;
  shown_count: number;
  archived: 0 | 1;
  released_number: number | null;
  sort_value: string | Date;
  number: number;
  status: VersionStatus;
  root_chord_mm: number;
  tip_chord_mm: number;
  span_mm: number;
  quantity: number;
  parts: string;
  errors: number;
  warnings: number;
}
type Row = SheetColumns & SourceRow & ThingRow<'machine' | 'material'>;

function sheetOf(row: Row, progress: CutSheet['progress']): CutSheet {
  return {
    id: row.id,
    name: row.name,
    purpose: row.purpose,
    archived: row.archived === 1,
    createdAt: row.created_at.toISOString(),
    updatedAt: row.shown_at.toISOString(),
    updatedBy: { id: row.shown_by, name: row.shown_by_name },
    versionCount: row.shown_count,
    releasedNumber: row.released_number,
    latest: {
      number: row.number,
      status: row.status,
      root: sourceOf(row, 'root'),
      tip: sourceOf(row, 'tip'),
      rootChordMm: row.root_chord_mm,
      tipChordMm: row.tip_chord_mm,
      spanMm: row.span_mm,
      quantity: row.quantity,
      parts: partsOfColumn(row.parts),
      machine: machineOf(row.machine_id, row.machine_name, row.machine_kind),
      material: materialOf(row.material_id, row.material_name),
      errors: row.errors,
      warnings: row.warnings,
    },
    progress,
  };
}

const versionColumns = [
  'number',
  'status',
  'root_chord_mm',
  'tip_chord_mm',
  'span_mm',
  'quantity',
  'parts',
  'errors',
  'warnings',
];

/** Adds version, sections, machine and person to sheets that are already chosen: a page is cut before anything is joined to it. */
function withVersions(db: Knex, chosen: Knex.QueryBuilder): Knex.QueryBuilder {
  const rows = db
    .from(chosen.as('s'))
    .select('s.*', 'p.name as shown_by_name', ...versionColumns.map((column) => `v.${column}`));
  joinScoped(rows, 'inner', ['cut_sheet_versions', 'v'], 's', [
    ['v.sheet_id', 's.id'],
    ['v.number', 's.shown_number'],
  ]);
  joinScoped(rows, 'inner', ['people', 'p'], 's', [['p.id', 's.shown_by']]);
  joinSources(rows, 'v');
  return joinThings(rows, 'v', ['machine', 'material']);
}

function columnsOf(reach: Reach, sort: Sort): string[] {
  const view = views[reach];
  return [
    's.workshop_id',
    's.id',
    's.name',
    's.purpose',
    's.created_at',
    's.archived',
    's.released_number',
    `s.${view.at} as shown_at`,
    `s.${view.by} as shown_by`,
    `s.${view.count} as shown_count`,
    `s.${view.number} as shown_number`,
    `s.${view.sorts[sort].column} as sort_value`,
  ];
}

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

const cursorSchemas = {
  updated: z.tuple([z.literal('updated'), timeSchema.transform((text) => new Date(text)), idSchema]),
  name: z.tuple([z.literal('name'), z.string().max(60), idSchema]),
} as const satisfies Record<Sort, z.ZodType>;

function cursorOf(sort: Sort, { sort_value: value, id }: Row): string {
  return encodeCursor([sort, value instanceof Date ? value.toISOString() : value, id]);
}

function placeOf(cursor: string, sort: Sort): { value: string | Date; id: string } {
  const [, value, id] = decodeCursor<readonly [Sort, string | Date, string]>(cursor, cursorSchemas[sort]);
  return { value, id };
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
    nextCursor: last ? cursorOf(asked.sort, last) : null,
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
