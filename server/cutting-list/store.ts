import { type Knex } from 'knex';
import { type CuttingListItem } from '#server/contracts/cutting-list.ts';
import { type SheetPart } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { wantedOf } from '#server/cut-sheets/progress.ts';
import {
  joinSources,
  joinThings,
  machineOf,
  materialOf,
  partsOfColumn,
  sourceOf,
  type SourceRow,
  type ThingRow,
} from '#server/cut-sheets/source-rows.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { isInList } from './rules.ts';

interface VersionColumns {
  sheet_id: string;
  sheet_name: string;
  number: number;
  status: VersionStatus;
  archived: 0 | 1;
  short_code: string;
  parts: string;
  quantity: number;
  root_chord_mm: number;
  tip_chord_mm: number;
  span_mm: number;
  status_at: Date | null;
}
type VersionRow = VersionColumns & SourceRow & ThingRow;

interface ProgressRow {
  sheet_id: string;
  version_number: number;
  part: SheetPart;
  done: number;
  scrapped: number;
  open: number;
  started_at: Date | null;
  started_by: string | null;
  started_by_name: string | null;
  started_machine_id: string | null;
  started_machine_name: string | null;
  started_machine_kind: string | null;
}

interface FileRow {
  sheet_id: string;
  name: string;
  part: string;
}

/** Versions that may have something to cut: the released ones, and those of which a part is begun. */
function versionsAtWork(db: Knex, workshopId: string): Knex.QueryBuilder {
  const begun = scoped(db, workshopId)
    .table('cut_progress', { as: 'b' })
    .select(db.raw('1'))
    .where('b.begun', 1)
    .whereRaw('?? = ?? AND ?? = ??', ['b.sheet_id', 'v.sheet_id', 'b.version_number', 'v.number']);
  const rows = scoped(db, workshopId).table('cut_sheet_versions', { as: 'v' });
  joinScoped(rows, 'inner', ['cut_sheets', 's'], 'v', [['s.id', 'v.sheet_id']]);
  rows
    .whereNot('v.status', 'draft')
    .where((either) => either.whereNotNull('v.released_sheet').orWhereExists(begun))
    .select(
      'v.sheet_id',
      'v.number',
      'v.status',
      'v.status_at',
      'v.short_code',
      'v.parts',
      'v.quantity',
      'v.root_chord_mm',
      'v.tip_chord_mm',
      'v.span_mm',
      's.name as sheet_name',
      's.archived',
    )
    .orderBy(['v.status_at', 'v.id']);
  joinSources(rows, 'v');
  return joinThings(rows, 'v', ['machine', 'material', 'rib_machine', 'rib_material']);
}

/** How far the parts of sheets are, with who began what is open. */
function progressRows(db: Knex, workshopId: string, sheetIds: readonly string[]): Knex.QueryBuilder {
  const rows = scoped(db, workshopId).table('cut_progress', { as: 'c' }).whereIn('c.sheet_id', sheetIds);
  joinScoped(rows, 'left', ['cut_logs', 'l'], 'c', [['l.id', 'c.open_log_id']]);
  joinScoped(rows, 'left', ['people', 'p'], 'l', [['p.id', 'l.person_id']]);
  joinScoped(rows, 'left', ['machines', 'm'], 'l', [['m.id', 'l.machine_id']]);
  return rows.select(
    'c.*',
    'l.happened_at as started_at',
    'p.id as started_by',
    'p.name as started_by_name',
    'm.id as started_machine_id',
    'm.name as started_machine_name',
    'm.kind as started_machine_kind',
  );
}

/** Names of the files of released versions: others are not to be cut from. */
function fileRows(db: Knex, workshopId: string, sheetIds: readonly string[]): Knex.QueryBuilder {
  const rows = scoped(db, workshopId).table('cut_files', { as: 'f' });
  joinScoped(rows, 'inner', ['cut_sheets', 's'], 'f', [
    ['s.id', 'f.sheet_id'],
    ['s.released_number', 'f.version_number'],
  ]);
  return rows
    .whereIn('f.sheet_id', sheetIds)
    .orderBy(['f.sheet_id', 'f.place'])
    .select('f.sheet_id', 'f.name', 'f.part');
}

function startedOf(row: ProgressRow | undefined): CuttingListItem['started'] {
  if (!row?.started_at || row.started_by === null) return null;
  return {
    by: { id: row.started_by, name: row.started_by_name ?? '' },
    at: row.started_at.toISOString(),
    machine: machineOf(row.started_machine_id, row.started_machine_name, row.started_machine_kind),
  };
}

/** What cuts a part, and from what; templates are printed. */
function thingsOf(row: VersionRow, part: SheetPart): Pick<CuttingListItem, 'machine' | 'material'> {
  if (part === 'templates') return { machine: null, material: null };
  if (part === 'core') {
    return {
      machine: machineOf(row.machine_id, row.machine_name, row.machine_kind),
      material: materialOf(row.material_id, row.material_name),
    };
  }
  return {
    machine: machineOf(row.rib_machine_id, row.rib_machine_name, row.rib_machine_kind),
    material: materialOf(row.rib_material_id, row.rib_material_name),
  };
}

/** Whether a file is needed to make a part: who cuts a core by hand follows the templates. */
function isNeeded(file: FileRow, row: VersionRow, part: SheetPart): boolean {
  if (file.part === part || file.part === 'sheet') return true;
  return part === 'core' && file.part === 'templates' && row.machine_kind !== 'wire';
}

function itemOf(
  row: VersionRow,
  part: SheetPart,
  progress: ProgressRow | undefined,
  files: readonly FileRow[],
): CuttingListItem {
  const isReleased = row.status === 'released';
  const own = files.filter((file) => isNeeded(file, row, part));
  return {
    sheetId: row.sheet_id,
    sheetName: row.sheet_name,
    versionNumber: row.number,
    standing: row.status,
    shortCode: row.short_code,
    part,
    ...thingsOf(row, part),
    root: sourceOf(row, 'root'),
    tip: sourceOf(row, 'tip'),
    rootChordMm: row.root_chord_mm,
    tipChordMm: row.tip_chord_mm,
    spanMm: row.span_mm,
    wanted: wantedOf(part, row.quantity),
    done: progress?.done ?? 0,
    scrapped: progress?.scrapped ?? 0,
    started: startedOf(progress),
    files: isReleased ? own.map(({ name }) => name) : [],
    releasedAt: isReleased ? (row.status_at?.toISOString() ?? null) : null,
  };
}

/** What waits at the machines, what was released first coming first, and what is begun. */
export async function cuttingList(db: Knex, workshopId: string): Promise<{ items: CuttingListItem[] }> {
  const versions: VersionRow[] = await versionsAtWork(db, workshopId);
  const sheetIds = [...new Set(versions.map(({ sheet_id }) => sheet_id))];
  if (sheetIds.length === 0) return { items: [] };
  const progress: ProgressRow[] = await progressRows(db, workshopId, sheetIds);
  const files: FileRow[] = await fileRows(db, workshopId, sheetIds);
  const keyOf = (sheetId: string, number: number, part: string) => `${sheetId} ${number} ${part}`;
  const counts = new Map(progress.map((row) => [keyOf(row.sheet_id, row.version_number, row.part), row]));
  const filesOf = new Map<string, FileRow[]>();
  for (const file of files) filesOf.set(file.sheet_id, [...(filesOf.get(file.sheet_id) ?? []), file]);
  const items = versions.flatMap((row) =>
    partsOfColumn(row.parts).flatMap((part) => {
      const count = counts.get(keyOf(row.sheet_id, row.number, part));
      const item = itemOf(row, part, count, filesOf.get(row.sheet_id) ?? []);
      const open = count?.open ?? 0;
      const isShown = isInList({ ...item, status: row.status, archived: row.archived === 1, open });
      return isShown ? [item] : [];
    }),
  );
  return { items };
}
