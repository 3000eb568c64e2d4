import { createHash } from 'node:crypto';
import { type Knex } from 'knex';
import { type SheetFile } from '#server/contracts/cut-sheets.ts';
import { scoped } from '#server/database/scoped.ts';
import { type MadeFile } from './make.ts';

interface VersionKey {
  readonly sheetId: string;
  readonly number: number;
}

interface Row {
  name: string;
  part: SheetFile['part'];
  download_name: string;
  media_type: string;
  bytes: Buffer;
}

function filesOf(db: Knex, workshopId: string, { sheetId, number }: VersionKey): Knex.QueryBuilder {
  return scoped(db, workshopId).table('cut_files').where({ sheet_id: sheetId, version_number: number });
}

/** Stores the files that a version is released with, in their order. */
export async function storeFiles(
  db: Knex,
  workshopId: string,
  { sheetId, number }: VersionKey,
  files: readonly MadeFile[],
): Promise<void> {
  for (const [place, { name, part, downloadName, mediaType, bytes }] of files.entries()) {
    await scoped(db, workshopId).insert('cut_files', {
      sheet_id: sheetId,
      version_number: number,
      name,
      place,
      part,
      download_name: downloadName,
      media_type: mediaType,
      bytes: Buffer.from(bytes),
      checksum: checksumOf(bytes),
    });
  }
}

/** The files that a version was released with, in their order; none of a draft. */
export async function storedFiles(db: Knex, workshopId: string, version: VersionKey): Promise<MadeFile[]> {
  const rows: Row[] = await filesOf(db, workshopId, version)
    .select('name', 'part', 'download_name', 'media_type', 'bytes')
    .orderBy('place');
  return rows.map(fileOf);
}

/** One file that a version was released with; null when it has none of that name. */
export async function storedFile(
  db: Knex,
  workshopId: string,
  version: VersionKey,
  name: string,
): Promise<MadeFile | null> {
  const row: Row | undefined = await filesOf(db, workshopId, version)
    .where({ name })
    .first('name', 'part', 'download_name', 'media_type', 'bytes');
  return row ? fileOf(row) : null;
}

function fileOf({ name, part, download_name, media_type, bytes }: Row): MadeFile {
  return { name, part, downloadName: download_name, mediaType: media_type, bytes };
}

export function checksumOf(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}
