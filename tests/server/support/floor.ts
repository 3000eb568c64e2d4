import sharp from 'sharp';
import { v4 as uuid } from 'uuid';
import { type SheetWorks } from '#server/cut-sheets/files/works.ts';
import { addPhoto } from '#server/inspections/photos/store.ts';
import { addInspection } from '#server/inspections/store.ts';
import { type TestApi, type TestWorkshop } from './api.ts';
import { cheapWorks } from './sheets.ts';

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

/** A template for two people with a bow. */
export const handTemplate = {
  wireDiameterMm: 0.4,
  ticks: 20,
  rampFraction: 0.15,
  pinDiameterMm: 3,
  pinStations: [0.3, 0.6] as [number, number],
};

/** Makes a drawing, templates and the printed sheet, each of a few bytes. */
export const byHand: SheetWorks = {
  ...cheapWorks,
  make: async (order) => {
    const { findings, files } = await cheapWorks.make(order);
    const printed = (['templates', 'sheet'] as const).map((part) => {
      const name = part === 'sheet' ? 'cut-sheet.pdf' : 'templates.pdf';
      return { name, part, downloadName: name, mediaType: 'application/pdf', bytes: Buffer.from(name) };
    });
    return { findings, files: [...files, ...printed] };
  },
};
