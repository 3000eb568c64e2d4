import { type Knex } from 'knex';
import { type FileCheck } from '#server/contracts/cutting-list.ts';
import { type SheetSource } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { parseShortCode } from '#server/contracts/sheet-plan.ts';
import { joinSources, sourceOf, type SourceRow } from '#server/cut-sheets/source-rows.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { refuseField } from '#server/refusal.ts';
import { type Reach } from '#server/sections/rules.ts';
import { type Origin, verdictOf } from './rules.ts';

interface Row {
  owner_id: string;
  name: string;
  number: number;
  status: VersionStatus;
  status_reason: string;
  status_at: Date | null;
  released_number: number | null;
  archived: 0 | 1;
  file_name: string | null;
  taken_at: Date | null;
}

const columns = [
  'o.id as owner_id',
  'o.name',
  'o.released_number',
  'o.archived',
  'v.number',
  'v.status',
  'v.status_reason',
  'v.status_at',
];

function originOf(row: Row, kind: Origin['kind'], sources: readonly SheetSource[]): Origin {
  return {
    kind,
    id: row.owner_id,
    name: row.name,
    versionNumber: row.number,
    status: row.status,
    statusReason: row.status_reason,
    statusAt: row.status_at,
    inForce: row.released_number,
    archived: row.archived === 1,
    sources,
    fileName: row.file_name,
    takenAt: row.taken_at,
  };
}

type Tables = { readonly kept: 'cut_files' | 'cut_downloads'; readonly name: string; readonly at: string };
const stored: Tables = { kept: 'cut_files', name: 'f.download_name', at: 'NULL' };
/** Archives and files of drafts are not stored, but whoever has one has taken it here. */
const taken: Tables = { kept: 'cut_downloads', name: 'f.file_name', at: 'f.downloaded_at' };

async function sheetFiles(
  db: Knex,
  workshopId: string,
  checksum: string,
  { kept, name, at }: Tables,
): Promise<Origin[]> {
  const files = scoped(db, workshopId).table(kept, { as: 'f' }).where('f.checksum', checksum);
  joinScoped(files, 'inner', ['cut_sheet_versions', 'v'], 'f', [
    ['v.sheet_id', 'f.sheet_id'],
    ['v.number', 'f.version_number'],
  ]);
  joinScoped(files, 'inner', ['cut_sheets', 'o'], 'f', [['o.id', 'f.sheet_id']]);
  joinSources(files, 'v').select(...columns, `${name} as file_name`, db.raw(`${at} as taken_at`));
  // The first who took it: a file that was a draft then is one still.
  if (kept === 'cut_downloads') files.orderBy(['f.downloaded_at', 'f.id']).limit(1);
  const rows: (Row & SourceRow)[] = await files;
  return rows.map((row) => originOf(row, 'cut-sheet', [sourceOf(row, 'root'), sourceOf(row, 'tip')]));
}

async function sectionFiles(db: Knex, workshopId: string, checksum: string): Promise<Origin[]> {
  const files = scoped(db, workshopId).table('downloads', { as: 'f' }).where('f.checksum', checksum);
  joinScoped(files, 'inner', ['section_versions', 'v'], 'f', [
    ['v.section_id', 'f.section_id'],
    ['v.number', 'f.version_number'],
  ]);
  joinScoped(files, 'inner', ['sections', 'o'], 'f', [['o.id', 'f.section_id']]);
  const rows: Row[] = await files
    .select(...columns, 'f.file_name', 'f.downloaded_at as taken_at')
    .orderBy(['f.downloaded_at', 'f.id'])
    .limit(1);
  return rows.map((row) => originOf(row, 'section', []));
}

async function sheetsOfCode(db: Knex, workshopId: string, code: string): Promise<Origin[]> {
  const versions = scoped(db, workshopId)
    .table('cut_sheet_versions', { as: 'v' })
    .where('v.short_code', code);
  joinScoped(versions, 'inner', ['cut_sheets', 'o'], 'v', [['o.id', 'v.sheet_id']]);
  joinSources(versions, 'v').select(...columns, db.raw('NULL as file_name'), db.raw('NULL as taken_at'));
  const rows: (Row & SourceRow)[] = await versions;
  return rows.map((row) => originOf(row, 'cut-sheet', [sourceOf(row, 'root'), sourceOf(row, 'tip')]));
}

/** @throws Refusal naming `code` when it can be none */
async function originsOfCode(db: Knex, workshopId: string, text: string): Promise<Origin[]> {
  const code = parseShortCode(text);
  if (code === null) throw refuseField('code', 'A code has eight signs, such as 7K3M-Q9XD.');
  return sheetsOfCode(db, workshopId, code);
}

async function originsOfFile(db: Knex, workshopId: string, checksum: string): Promise<Origin[]> {
  const kept = await sheetFiles(db, workshopId, checksum, stored);
  if (kept.length > 0) return kept;
  const sheets = await sheetFiles(db, workshopId, checksum, taken);
  return [...sheets, ...(await sectionFiles(db, workshopId, checksum))];
}

/**
 * Whether a file is current, by the SHA-256 of its bytes or by the code printed on a sheet or template.
 * @throws Refusal naming `code` when it can be none
 */
export async function checkFile(
  db: Knex,
  workshopId: string,
  reach: Reach,
  { checksum, code }: { readonly checksum?: string | undefined; readonly code?: string | undefined },
): Promise<FileCheck> {
  if (checksum !== undefined) {
    return verdictOf(await originsOfFile(db, workshopId, checksum), 'file', reach);
  }
  return verdictOf(await originsOfCode(db, workshopId, code ?? ''), 'code', reach);
}
