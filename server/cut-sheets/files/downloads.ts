import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { z } from 'zod';
import { idSchema, timeSchema } from '#server/contracts/common.ts';
import { type sheetDownloadPageSchema } from '#server/contracts/cut-sheets.ts';
import { continueBehind, decodeCursor, encodeCursor, pageOfRows } from '#server/database/cursor.ts';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { type Author } from '#server/sections/rules.ts';

type DownloadPage = z.infer<typeof sheetDownloadPageSchema>;

interface DownloadInput {
  readonly sheetId: string;
  readonly number: number;
  /** The file's name within its version, and the one that it was saved under. */
  readonly name: string;
  readonly fileName: string;
  /** SHA-256 of the file's bytes, in hexadecimal. */
  readonly checksum: string;
}

/** Records who took which file. */
export async function recordSheetDownload(db: Knex, author: Author, download: DownloadInput): Promise<void> {
  await scoped(db, author.workshopId).insert('cut_downloads', {
    id: uuid(),
    sheet_id: download.sheetId,
    version_number: download.number,
    person_id: author.personId,
    name: download.name,
    file_name: download.fileName,
    checksum: download.checksum,
    downloaded_at: author.at,
  });
}

interface Row {
  id: string;
  person_id: string;
  person_name: string;
  file_name: string;
  checksum: string;
  downloaded_at: Date;
}

function downloadOf(row: Row): DownloadPage['items'][number] {
  return {
    id: row.id,
    person: { id: row.person_id, name: row.person_name },
    fileName: row.file_name,
    checksum: row.checksum,
    at: row.downloaded_at.toISOString(),
  };
}

const cursorSchema = z.tuple([timeSchema, idSchema]);

/**
 * Downloads of a version, newest first.
 * @throws Refusal naming `cursor` when it is not one of this list
 */
export async function listSheetDownloads(
  db: Knex,
  workshopId: string,
  version: { readonly sheetId: string; readonly number: number },
  options: { cursor?: string | undefined; limit: number },
): Promise<DownloadPage> {
  const downloads = scoped(db, workshopId)
    .table('cut_downloads', { as: 'd' })
    .where({ 'd.sheet_id': version.sheetId, 'd.version_number': version.number });
  if (options.cursor !== undefined) {
    const [text, id] = decodeCursor(options.cursor, cursorSchema);
    continueBehind(downloads, ['d.downloaded_at', 'd.id'], 'descending', { value: new Date(text), id });
  }
  const rows: Row[] = await joinScoped(downloads, 'inner', ['people', 'p'], 'd', [['p.id', 'd.person_id']])
    .select('d.*', 'p.name as person_name')
    .orderBy('d.downloaded_at', 'desc')
    .orderBy('d.id', 'desc')
    .limit(options.limit + 1);
  const { page, last } = pageOfRows(rows.map(downloadOf), options.limit);
  return { items: [...page], nextCursor: last ? encodeCursor([last.at, last.id]) : null };
}
