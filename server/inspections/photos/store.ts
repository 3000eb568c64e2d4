import { type Knex } from 'knex';
import { v7 as uuid } from 'uuid';
import { joinScoped, scoped } from '#server/database/scoped.ts';
import { inTransaction } from '#server/database/transaction.ts';
import { Refusal } from '#server/refusal.ts';
import { type Author, type Reach, statusesFor } from '#server/sections/rules.ts';
import { checkPhotoRoom } from '../rules.ts';
import { findInspection } from '../store.ts';
import { encodePhoto } from './encode.ts';

interface Photo {
  readonly id: string;
  readonly width: number;
  readonly height: number;
  readonly bytes: number;
}

/** @throws Refusal `not-found`; `invalid` naming `file` when there is no room */
async function checkRoom(db: Knex, workshopId: string, reach: Reach, inspectionId: string): Promise<void> {
  const { photos } = await findInspection(db, workshopId, reach, inspectionId);
  checkPhotoRoom(photos.length);
}

/**
 * Adds a photograph to an inspection, encoded anew.
 * @throws Refusal `not-found`; `invalid` naming `file` for what is no photograph, is damaged or too large, or has no room; nothing
 *   is stored then
 */
export async function addPhoto(
  db: Knex,
  author: Author,
  reach: Reach,
  inspectionId: string,
  sent: Buffer,
): Promise<Photo> {
  const { workshopId } = author;
  await checkRoom(db, workshopId, reach, inspectionId);
  const { bytes, width, height, checksum } = await encodePhoto(sent);
  const id = uuid();
  await inTransaction(db, async (transaction) => {
    const scope = scoped(transaction, workshopId);
    await scope.table('inspections').where({ id: inspectionId }).forUpdate().first('id');
    await checkRoom(transaction, workshopId, reach, inspectionId);
    await scope.insert('photos', {
      id,
      inspection_id: inspectionId,
      bytes,
      checksum,
      width,
      height,
      person_id: author.personId,
      created_at: author.at,
    });
  });
  return { id, width, height, bytes: bytes.length };
}

/**
 * The bytes of a photograph, a JPEG.
 * @throws Refusal `not-found` when there is none of a version within reach
 */
export async function photoBytes(
  db: Knex,
  workshopId: string,
  reach: Reach,
  photoId: string,
): Promise<Buffer> {
  const photos = scoped(db, workshopId).table('photos', { as: 'f' }).where('f.id', photoId);
  joinScoped(photos, 'inner', ['inspections', 'i'], 'f', [['i.id', 'f.inspection_id']]);
  joinScoped(photos, 'inner', ['cut_sheet_versions', 'v'], 'i', [
    ['v.sheet_id', 'i.sheet_id'],
    ['v.number', 'i.version_number'],
  ]);
  const row: { bytes: Buffer } | undefined = await photos
    .whereIn('v.status', statusesFor(reach))
    .first('f.bytes');
  if (!row) throw new Refusal('not-found');
  return row.bytes;
}
