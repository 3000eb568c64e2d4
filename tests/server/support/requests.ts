import { v4 as uuid } from 'uuid';
import { type EndpointName } from '#server/contracts/endpoints.ts';
import { keepDraft } from '#server/sections/drafts/store.ts';
import { createSection } from '#server/sections/store.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { saveVersion } from '#server/sections/versions/store.ts';
import { type TestApi, type TestWorkshop } from './api.ts';
import { type Input } from './client.ts';
import { cst, naca4 } from './shapes.ts';

/** A section with version 1 released and version 2 a draft, and unsaved work of owner and designer on it. */
export async function makeSection(
  api: TestApi,
  workshop: TestWorkshop,
  name = 'Marsh 2412',
): Promise<string> {
  const author = workshop.author('designer', new Date('2026-02-01T09:00:00.000Z'));
  const { id } = await createSection(api.knex, author, { name, purpose: 'tip', shape: naca4(), note: '' });
  await releaseVersion(api.knex, author, id, 1);
  await saveVersion(api.knex, author, id, { basedOn: 1, shape: naca4({ maxCamber: 0.03 }), note: '' });
  for (const role of ['owner', 'designer'] as const) {
    await keepDraft(api.knex, workshop.author(role), id, { basedOn: 2, shape: cst(), chordMm: 220 });
  }
  return id;
}

const of = (sectionId: string, number?: number) => ({
  params: number === undefined ? { sectionId } : { sectionId, number },
});

/** A request that is right in itself for every endpoint, on a section as {@link makeSection} makes it. */
export const requests: Readonly<Record<EndpointName, (sectionId: string) => Input>> = {
  health: () => ({}),
  me: () => ({}),
  changePreferences: () => ({ body: { units: 'inch' } }),
  changePassword: () => ({ body: { current: 'not the present one', next: 'another long password' } }),
  listSections: () => ({ query: { search: 'marsh' } }),
  createSection: () => ({
    body: { name: 'Fen 0012', shape: naca4({ maxCamber: 0, maxCamberPosition: 0 }), key: uuid() },
  }),
  getSection: (id) => of(id),
  changeSection: (id) => ({ ...of(id), body: { name: 'Renamed' } }),
  archiveSection: (id) => of(id),
  getDraft: (id) => of(id),
  keepDraft: (id) => ({ ...of(id), body: { basedOn: 2, shape: naca4(), chordMm: 180 } }),
  dropDraft: (id) => of(id),
  listVersions: (id) => of(id),
  saveVersion: (id) => ({ ...of(id), body: { basedOn: 2, shape: cst(), note: 'free-form', key: uuid() } }),
  getVersion: (id) => of(id, 1),
  releaseVersion: (id) => ({ ...of(id, 2), body: { reason: 'flown' } }),
  withdrawVersion: (id) => ({ ...of(id, 1), body: { reason: 'tip too thin' } }),
  listDownloads: (id) => of(id, 1),
  datFile: (id) => ({ ...of(id, 1), query: { points: 40 } }),
  dxfFile: (id) => ({ ...of(id, 1), query: { chordMm: 220 } }),
  svgFile: (id) => ({ ...of(id, 1), query: { chordMm: 220 } }),
};
