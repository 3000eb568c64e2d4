import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { z } from 'zod';
import { type ExportFormat } from '#geometry/formats/export.ts';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import { type Download } from '#server/contracts/sections.ts';
import { continueBehind, decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { type Author } from '#server/sections/rules.ts';

interface DownloadInput {
  readonly sectionId: string;
  readonly versionNumber: number;
  readonly fileName: string;
  readonly format: ExportFormat;
  readonly options: object;
  /** SHA-256 of the file's bytes, in hexadecimal. */
  readonly checksum: string;
}

/** Records who took which file. */
export async function recordDownload(db: Knex, author: Author, download: DownloadInput): Promise<void> {
  await scoped(db, author.workshopId).insert('downloads', {
    id: uuid(),
    section_id: download.sectionId,
    version_number: download.versionNumber,
    person_id: author.personId,
    file_name: download.fileName,
    format: download.format,
    options: JSON.stringify(download.options),
    checksum: download.checksum,
    downloaded_at: author.at,
  });
}

interface Row {
  id: string;
  person_id: string;
  person_name: string;
  file_name: string;
  format: ExportFormat;
  checksum: string;
  downloaded_at: Date;
}

function downloadOf(row: Row): Download {
  return {
    id: row.id,
    person: { id: row.person_id, name: row.person_name },
    fileName: row.file_name,
    format: row.format,
    checksum: row.checksum,
    at: row.downloaded_at.toISOString(),
  };
}

const cursorSchema = z.tuple([timeSchema, idSchema]);

/**
 * Downloads of a version, newest first.
 * @throws Refusal naming `cursor` when it is not one of this list
 */
export async function listDownloads(
  db: Knex,
  workshopId: string,
  version: { readonly sectionId: string; readonly number: number },
  options: { cursor?: string | undefined; limit: number },
): Promise<{ items: Download[]; nextCursor: string | null }> {
  const downloads = scoped(db, workshopId)
    .table('downloads', { as: 'd' })
    .where({ 'd.section_id': version.sectionId, 'd.version_number': version.number });
  if (options.cursor !== undefined) {
    const [text, id] = decodeCursor(options.cursor, cursorSchema);
    const place = { value: new Date(text), id };
    continueBehind(downloads, ['d.downloaded_at', 'd.id'], 'descending', place);
  }
  const rows: Row[] = await joinScoped(downloads, 'inner', ['people', 'p'], 'd', [['p.id', 'd.person_id']])
    .select('d.*', 'p.name as person_name')
    .orderBy('d.downloaded_at', 'desc')
    .orderBy('d.id', 'desc')
    .limit(options.limit + 1);
  const { page, last } = pageOfRows(rows.map(downloadOf), options.limit);
  return { items: [...page], nextCursor: last ? encodeCursor([last.at, last.id]) : null };
}
