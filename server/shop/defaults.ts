import { type Knex } from 'knex';
import { type MachineSettings, type MaterialSettings } from '#server/contracts/shop.ts';
import {
  balsa,
  expandedFoam,
  extrudedFoam,
  handBow,
  laser,
  plywood,
  router,
  wireBench,
} from '#server/contracts/shop-samples.ts';
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
