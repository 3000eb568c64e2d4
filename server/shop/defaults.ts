import { type Knex } from 'knex';
import { type MachineSettings, type MaterialSettings } from '#server/contracts/shop.ts';
import { type Author } from '#server/sections/rules.ts';
import { putKerf } from './kerfs/store.ts';
import { createItem, machines, materials } from './store.ts';

/** Machines, materials and kerfs to begin with; names tie the kerfs to their pair. */
export interface ShopFilling {
  readonly machines: readonly { readonly name: string; readonly settings: MachineSettings }[];
  readonly materials: readonly { readonly name: string; readonly settings: MaterialSettings }[];
  readonly kerfs: readonly {
    readonly machine: string;
    readonly material: string;
    readonly kerfMm: number;
    readonly speedMmMin: number | null;
  }[];
}

export const wireBench = {
  kind: 'wire',
  towerDistanceMm: 1000,
  travelXMm: 600,
  travelYMm: 300,
  maxFeedMmMin: 1000,
  travelFeedMmMin: 600,
  blockXMm: 80,
  blockYMm: 30,
  blockFromLeftMm: 150,
  rootFace: 'left',
  trailingEdge: 'far',
  controller: {
    axes: { leftX: 'X', leftY: 'Y', rightX: 'U', rightY: 'V' },
    decimals: 4,
    lineNumbers: true,
    timeMode: 'inverse-time',
    inverseTime: 'per-minute',
    feedOver: 'left-tower',
    dwellUnit: 'seconds',
    header: [],
    footer: [],
  },
} satisfies MachineSettings;

export const handBow = { kind: 'bow', wireDiameterMm: 0.4, wireLengthMm: 900 } satisfies MachineSettings;

export const laser = {
  kind: 'laser',
  sheetWidthMm: 600,
  sheetHeightMm: 400,
  travelXMm: 620,
  travelYMm: 420,
  maxFeedMmMin: 6000,
} satisfies MachineSettings;

const router = {
  kind: 'router',
  sheetWidthMm: 900,
  sheetHeightMm: 600,
  travelXMm: 950,
  travelYMm: 650,
  maxFeedMmMin: 3000,
} satisfies MachineSettings;

const block = { blockLengthMm: 600, blockHeightMm: 60, blockSpanMm: 1250 };

/** Densities and wire speeds: common practice; foam is cut at 100 to 500 mm/min, expanded foam faster than extruded. */
export const extrudedFoam = {
  kind: 'foam',
  densityKgM3: 32,
  feedMmMin: 200,
  maxFeedMmMin: 350,
  ...block,
} satisfies MaterialSettings;
export const expandedFoam = {
  kind: 'foam',
  densityKgM3: 20,
  feedMmMin: 300,
  maxFeedMmMin: 500,
  ...block,
  blockHeightMm: 100,
} satisfies MaterialSettings;
export const balsa = {
  kind: 'sheet',
  thicknessMm: 2,
  densityKgM3: 160,
  sheetWidthMm: 1000,
  sheetHeightMm: 100,
} satisfies MaterialSettings;
export const plywood = {
  kind: 'sheet',
  thicknessMm: 2,
  densityKgM3: 680,
  sheetWidthMm: 600,
  sheetHeightMm: 300,
} satisfies MaterialSettings;

/** What a new workshop finds. Kerfs are common practice (0.5 to 1.5 mm for hot wire); each is marked as not measured. */
export const shopDefaults: ShopFilling = {
  machines: [
    { name: 'Four-axis wire', settings: wireBench },
    { name: 'Hand bow', settings: handBow },
    { name: 'Laser', settings: laser },
    { name: 'Router', settings: router },
  ],
  materials: [
    { name: 'XPS 32', settings: extrudedFoam },
    { name: 'EPS 20', settings: expandedFoam },
    { name: 'Balsa 2 mm', settings: balsa },
    { name: 'Birch plywood 2 mm', settings: plywood },
  ],
  kerfs: [
    { machine: 'Four-axis wire', material: 'XPS 32', kerfMm: 0.8, speedMmMin: 200 },
    { machine: 'Four-axis wire', material: 'EPS 20', kerfMm: 1, speedMmMin: 300 },
    { machine: 'Hand bow', material: 'XPS 32', kerfMm: 1, speedMmMin: null },
    { machine: 'Hand bow', material: 'EPS 20', kerfMm: 1.2, speedMmMin: null },
    { machine: 'Laser', material: 'Balsa 2 mm', kerfMm: 0.15, speedMmMin: 1500 },
    { machine: 'Laser', material: 'Birch plywood 2 mm', kerfMm: 0.2, speedMmMin: 600 },
    { machine: 'Router', material: 'Balsa 2 mm', kerfMm: 2, speedMmMin: 1200 },
    { machine: 'Router', material: 'Birch plywood 2 mm', kerfMm: 2, speedMmMin: 600 },
  ],
};

/** Fills a workshop that has none of these yet, through the same stores that people use. */
export async function fillShop(db: Knex, author: Author, filling: ShopFilling): Promise<void> {
  const machineIds = new Map<string, string>();
  for (const machine of filling.machines) {
    machineIds.set(machine.name, (await createItem(db, author, machines, machine)).id);
  }
  const materialIds = new Map<string, string>();
  for (const material of filling.materials) {
    materialIds.set(material.name, (await createItem(db, author, materials, material)).id);
  }
  for (const { machine, material, kerfMm, speedMmMin } of filling.kerfs) {
    const place = { machineId: machineIds.get(machine) ?? '', materialId: materialIds.get(material) ?? '' };
    await putKerf(db, author, place, { kerfMm, speedMmMin, measuredOn: null, revision: null });
  }
}
