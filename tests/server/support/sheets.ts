import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { beginningPlan } from '#server/contracts/beginning-plan.ts';
import { extrudedFoam, wireBench } from '#server/contracts/shop-samples.ts';
import { keepSheetDraft } from '#server/cut-sheets/drafts.ts';
import { type SheetWorks } from '#server/cut-sheets/files/works.ts';
import { createCutSheet } from '#server/cut-sheets/store.ts';
import { releaseSheetVersion } from '#server/cut-sheets/versions/status-store.ts';
import { saveSheetVersion } from '#server/cut-sheets/versions/store.ts';
import { type TestApi, type TestWorkshop } from './api.ts';

/** What a plan names. */
export interface PlanParts {
  readonly sectionId: string;
  readonly machineId: string;
  readonly materialId: string;
}

/** A plan without errors: a tapered panel of version 1 of the section at both ends, cut from foam on the machine. */
export function samplePlan({ sectionId, machineId, materialId }: PlanParts, versionNumber = 1): SheetPlan {
  return beginningPlan({
    root: { sectionId, versionNumber },
    tip: { sectionId, versionNumber },
    machine: { id: machineId, settings: wireBench },
    material: { id: materialId, settings: extrudedFoam },
    kerfMm: 0.8,
  });
}

/** Finds nothing and makes one small file: for tests that need a sheet but none of its geometry. */
export const cheapWorks: SheetWorks = {
  count: async () => ({ errors: 0, warnings: 0 }),
  make: async ({ identity }) => ({
    findings: [],
    files: [
      {
        name: 'root.dxf',
        part: 'core',
        downloadName: `sheet_v${identity.versionNumber}_root_220mm.dxf`,
        mediaType: 'image/vnd.dxf',
        bytes: Buffer.from(`${identity.sheetName} v${identity.versionNumber} ${identity.checksum}`),
      },
    ],
  }),
  archive: async () => Buffer.from('an archive'),
};

/** What the files say of those who made them. */
export const sampleNames = {
  person: 'builder of marsh',
  workshop: 'marsh',
  publicUrl: 'http://127.0.0.1',
};

/** A cut sheet with version 1 released and version 2 a draft, and unsaved work of everybody who may plan. */
export async function makeSheet(
  { knex }: TestApi,
  workshop: TestWorkshop,
  parts: PlanParts,
  works: SheetWorks = cheapWorks,
): Promise<string> {
  const author = workshop.author('builder', new Date('2026-02-02T09:00:00.000Z'));
  const plan = samplePlan(parts);
  const { id } = await createCutSheet(knex, works, author, {
    name: 'Marsh panel',
    purpose: 'outer',
    plan,
    note: '',
  });
  await releaseSheetVersion(knex, works, author, { sheetId: id, number: 1, reason: '', names: sampleNames });
  await saveSheetVersion(knex, works, author, id, { basedOn: 1, plan: { ...plan, quantity: 4 }, note: '' });
  for (const role of ['owner', 'designer', 'builder'] as const) {
    await keepSheetDraft(knex, workshop.author(role), id, { basedOn: 2, values: { quantity: 'six' } });
  }
  return id;
}
