import {
  balsa,
  expandedFoam,
  extrudedFoam,
  handBow,
  laser,
  plywood,
  wireBench,
} from '#server/contracts/shop-samples.ts';
import { type ShopFilling } from '#server/shop/defaults.ts';

/** The machines and materials of the demo workshop, all invented; nobody has cut a test strip there yet. */
export const demoShop: ShopFilling = {
  machines: [
    { name: 'Long bench', settings: { ...wireBench, towerDistanceMm: 1400, travelXMm: 700 } },
    { name: 'Short bench', settings: { ...wireBench, towerDistanceMm: 760, travelXMm: 450 } },
    { name: 'Two-hand bow', settings: handBow },
    { name: 'Laser by the window', settings: laser },
  ],
  materials: [
    { name: 'XPS 32, blue', settings: extrudedFoam },
    { name: 'EPS 20, white', settings: expandedFoam },
    { name: 'Balsa 2 mm', settings: balsa },
    { name: 'Birch plywood 2 mm', settings: plywood },
  ],
  kerfs: [
    { machine: 'Long bench', material: 'XPS 32, blue', kerfMm: 0.8, speedMmMin: 200 },
    { machine: 'Long bench', material: 'EPS 20, white', kerfMm: 1, speedMmMin: 300 },
    { machine: 'Short bench', material: 'XPS 32, blue', kerfMm: 0.8, speedMmMin: 200 },
    { machine: 'Two-hand bow', material: 'EPS 20, white', kerfMm: 1.2, speedMmMin: null },
    { machine: 'Laser by the window', material: 'Balsa 2 mm', kerfMm: 0.15, speedMmMin: 1500 },
    { machine: 'Laser by the window', material: 'Birch plywood 2 mm', kerfMm: 0.2, speedMmMin: 600 },
  ],
};
