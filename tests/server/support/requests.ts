import { v4 as uuid } from 'uuid';
import { type EndpointName } from '#server/contracts/endpoints.ts';
import { keepDraft } from '#server/sections/drafts/store.ts';
import { createSection } from '#server/sections/store.ts';
import { releaseVersion } from '#server/sections/versions/status-store.ts';
import { saveVersion } from '#server/sections/versions/store.ts';
import { balsa, extrudedFoam, handBow, wireBench } from '#server/contracts/shop-samples.ts';
import { levelTrainer } from '#server/contracts/flight-condition-samples.ts';
import { createCondition } from '#server/flight-conditions/store.ts';
import { putKerf } from '#server/shop/kerfs/store.ts';
import { createItem, machines, materials } from '#server/shop/store.ts';
import { type TestApi, type TestWorkshop } from './api.ts';
import { type Input } from './client.ts';
import { makeInspection, photo } from './floor.ts';
import { cst, naca4 } from './shapes.ts';
import { makeSheet, type PlanParts, samplePlan } from './sheets.ts';

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

/** The things that requests name. */
export interface Samples extends PlanParts {
  readonly sheetId: string;
  readonly inspectionId: string;
  readonly photoId: string;
  readonly conditionId: string;
}

/** A four-axis machine and a foam with a kerf that nobody measured, each of a name that only it has. */
export async function makeShop(api: TestApi, workshop: TestWorkshop): Promise<Omit<PlanParts, 'sectionId'>> {
  const author = workshop.author('builder', new Date('2026-02-01T09:00:00.000Z'));
  const name = `Marsh ${uuid()}`;
  const machine = await createItem(api.knex, author, machines, { name, settings: wireBench });
  const material = await createItem(api.knex, author, materials, { name, settings: extrudedFoam });
  const place = { machineId: machine.id, materialId: material.id };
  const kerf = { kerfMm: 0.8, speedMmMin: 200, measuredOn: null, revision: null };
  await putKerf(api.knex, author, place, kerf);
  return place;
}

/** A flight condition of a name that only it has; the first of a workshop is its default. */
export async function makeCondition(api: TestApi, workshop: TestWorkshop): Promise<string> {
  const author = workshop.author('designer', new Date('2026-02-01T09:00:00.000Z'));
  const input = { name: `Marsh ${uuid()}`, settings: levelTrainer };
  return (await createCondition(api.knex, author, input)).id;
}

export async function makeSamples(api: TestApi, workshop: TestWorkshop): Promise<Samples> {
  const parts = { sectionId: await makeSection(api, workshop), ...(await makeShop(api, workshop)) };
  const made = { ...parts, sheetId: await makeSheet(api, workshop, parts) };
  const conditionId = await makeCondition(api, workshop);
  return { ...made, conditionId, ...(await makeInspection(api, workshop, made)) };
}

const of = ({ sectionId }: Samples, number?: number) => ({
  params: number === undefined ? { sectionId } : { sectionId, number },
});

const ofSheet = ({ sheetId }: Samples, number?: number) => ({
  params: number === undefined ? { sheetId } : { sheetId, number },
});

const past = '2026-02-03T10:00:00.000Z';

/** A request that is right in itself for every endpoint, on what {@link makeSamples} makes. */
export const requests: Readonly<Record<EndpointName, (samples: Samples) => Input>> = {
  health: () => ({}),
  me: () => ({}),
  changePreferences: () => ({ body: { units: 'inch' } }),
  changePassword: () => ({ body: { current: 'not the present one', next: 'another long password' } }),
  listSections: () => ({ query: { search: 'marsh' } }),
  createSection: () => ({
    body: { name: 'Fen 0012', shape: naca4({ maxCamber: 0, maxCamberPosition: 0 }), key: uuid() },
  }),
  getSection: (one) => of(one),
  changeSection: (one) => ({ ...of(one), body: { name: 'Renamed' } }),
  archiveSection: (one) => of(one),
  getDraft: (one) => of(one),
  keepDraft: (one) => ({ ...of(one), body: { basedOn: 2, shape: naca4(), chordMm: 180 } }),
  dropDraft: (one) => of(one),
  listVersions: (one) => of(one),
  saveVersion: (one) => ({ ...of(one), body: { basedOn: 2, shape: cst(), note: 'free-form', key: uuid() } }),
  getVersion: (one) => of(one, 1),
  releaseVersion: (one) => ({ ...of(one, 2), body: { reason: 'flown' } }),
  withdrawVersion: (one) => ({ ...of(one, 1), body: { reason: 'tip too thin' } }),
  listDownloads: (one) => of(one, 1),
  datFile: (one) => ({ ...of(one, 1), query: { points: 40 } }),
  dxfFile: (one) => ({ ...of(one, 1), query: { chordMm: 220 } }),
  svgFile: (one) => ({ ...of(one, 1), query: { chordMm: 220 } }),
  listMachines: () => ({}),
  createMachine: () => ({ body: { name: uuid(), settings: handBow } }),
  getMachine: ({ machineId }) => ({ params: { machineId } }),
  changeMachine: ({ machineId }) => ({ params: { machineId }, body: { revision: 1, archived: true } }),
  listMaterials: () => ({}),
  createMaterial: () => ({ body: { name: uuid(), settings: balsa } }),
  getMaterial: ({ materialId }) => ({ params: { materialId } }),
  changeMaterial: ({ materialId }) => ({ params: { materialId }, body: { revision: 1, name: uuid() } }),
  listKerfs: () => ({}),
  putKerf: ({ machineId, materialId }) => ({
    params: { machineId, materialId },
    body: { kerfMm: 0.85, speedMmMin: 200, measuredOn: '2026-02-01', revision: 1 },
  }),
  kerfStripFile: ({ machineId, materialId }) => ({ params: { machineId, materialId, name: 'strip.nc' } }),
  listCutSheets: () => ({ query: { search: 'marsh' } }),
  createCutSheet: (one) => ({ body: { name: 'Fen panel', plan: samplePlan(one), key: uuid() } }),
  getCutSheet: (one) => ofSheet(one),
  changeCutSheet: (one) => ({ ...ofSheet(one), body: { name: 'Renamed' } }),
  getSheetDraft: (one) => ofSheet(one),
  keepSheetDraft: (one) => ({ ...ofSheet(one), body: { basedOn: 2, values: { quantity: '' } } }),
  dropSheetDraft: (one) => ofSheet(one),
  listSheetVersions: (one) => ofSheet(one),
  saveSheetVersion: (one) => ({
    ...ofSheet(one),
    body: { basedOn: 2, plan: samplePlan(one), note: 'as before', key: uuid() },
  }),
  getSheetVersion: (one) => ofSheet(one, 1),
  releaseSheetVersion: (one) => ({ ...ofSheet(one, 2), body: { reason: 'tried' } }),
  withdrawSheetVersion: (one) => ({ ...ofSheet(one, 1), body: { reason: 'too thin' } }),
  listSheetFiles: (one) => ofSheet(one, 1),
  sheetFile: ({ sheetId }) => ({ params: { sheetId, number: 1, name: 'root.dxf' } }),
  listSheetDownloads: (one) => ofSheet(one, 1),
  cuttingList: () => ({}),
  checkFile: () => ({ query: { code: '7k3m q9xd' } }),
  listCutLogs: ({ sheetId }) => ({ query: { sheetId } }),
  logCut: ({ sheetId, machineId }) => ({
    body: { sheetId, versionNumber: 1, part: 'core', action: 'started', machineId, at: past, key: uuid() },
  }),
  listInspections: ({ sheetId }) => ({ query: { sheetId, outcome: 'unanswered' } }),
  addInspection: ({ sheetId }) => ({
    body: {
      sheetId,
      versionNumber: 1,
      measurements: [{ end: 'tip', station: 0.5, measuredMm: 14.2 }],
      at: past,
      key: uuid(),
    },
  }),
  getInspection: ({ inspectionId }) => ({ params: { inspectionId } }),
  answerInspection: ({ inspectionId }) => ({
    params: { inspectionId },
    body: { decision: 'rejected', note: 'Cut it again.' },
  }),
  addPhoto: ({ inspectionId }) => ({ params: { inspectionId }, file: photo }),
  photo: ({ photoId }) => ({ params: { photoId } }),
  inspectionStatistics: () => ({}),
  desk: () => ({}),
  listFlightConditions: () => ({}),
  createFlightCondition: () => ({ body: { name: uuid(), settings: levelTrainer } }),
  getFlightCondition: ({ conditionId }) => ({ params: { conditionId } }),
  changeFlightCondition: ({ conditionId }) => ({
    params: { conditionId },
    body: { revision: 1, name: uuid() },
  }),
  setDefaultFlightCondition: ({ conditionId }) => ({ params: { conditionId } }),
};
