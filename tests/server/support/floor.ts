import sharp from 'sharp';
import { v4 as uuid } from 'uuid';
import { addPhoto } from '#server/inspections/photos/store.ts';
import { addInspection } from '#server/inspections/store.ts';
import { type TestApi, type TestWorkshop } from './api.ts';

/** A small photograph as a camera sends it. */
export const photo = await sharp({
  create: { width: 8, height: 6, channels: 3, background: 'steelblue' },
})
  .jpeg()
  .toBuffer();

/** An inspection of version 1 that is far out of tolerance and not answered, with a photograph. */
export async function makeInspection(
  { knex }: TestApi,
  workshop: TestWorkshop,
  { sheetId, machineId }: { readonly sheetId: string; readonly machineId: string },
): Promise<{ readonly inspectionId: string; readonly photoId: string }> {
  const author = workshop.author('technician', new Date('2026-02-03T09:00:00.000Z'));
  const { id: inspectionId } = await addInspection(knex, author, 'released', {
    sheetId,
    versionNumber: 1,
    mark: 'Marsh left 1',
    machineId,
    measurements: [{ end: 'root', station: 0.3, measuredMm: 40 }],
    note: '',
    at: author.at.toISOString(),
    key: uuid(),
  });
  const { id: photoId } = await addPhoto(knex, author, 'released', inspectionId, photo);
  return { inspectionId, photoId };
}
