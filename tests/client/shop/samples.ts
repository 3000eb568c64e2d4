import { idOf } from '#tests/client/support/samples.ts';
import { extrudedFoam, handBow, wireBench } from '#server/contracts/shop-samples.ts';
import { type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';

const common = {
  archived: false,
  revision: 1,
  createdAt: '2024-03-01T10:00:00.000Z',
  updatedAt: '2024-03-02T10:00:00.000Z',
  updatedBy: { id: idOf(1), name: 'Tobin Sedgley' },
};

export const bench: Machine = { ...common, id: idOf(11), name: 'Long bench', settings: wireBench };
export const bow: Machine = { ...common, id: idOf(12), name: 'Two-hand bow', settings: handBow };
export const oldBow: Machine = { ...bow, id: idOf(13), name: 'Old bow', archived: true };
export const foam: Material = { ...common, id: idOf(21), name: 'XPS 32', settings: extrudedFoam };
export const kerf: Kerf = {
  machineId: bench.id,
  materialId: foam.id,
  kerfMm: 0.8,
  speedMmMin: 200,
  isDefault: true,
  measuredOn: null,
  by: common.updatedBy,
  revision: 1,
  updatedAt: common.updatedAt,
};
