import { type Shape } from '#geometry/shapes/shape.ts';
import { beginningPlan } from '#server/contracts/beginning-plan.ts';
import { type CutSheet, type SheetPlan, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { resolvePlan, shortCodeOf } from '#server/contracts/sheet-plan.ts';
import { bench, foam } from '#tests/client/shop/samples.ts';
import { idOf } from '#tests/client/support/samples.ts';

const SHAPE: Shape = {
  kind: 'naca4',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'open',
};
const SECTION = idOf(101);
const PERSON = { id: idOf(1), name: 'Ines Varga' };
const AT = '2024-03-02T10:00:00.000Z';

/** A tapered panel with a slot, cut from foam on the bench. */
export const PLAN: SheetPlan = {
  ...beginningPlan({
    root: { sectionId: SECTION, versionNumber: 3 },
    tip: { sectionId: SECTION, versionNumber: 3 },
    machine: bench,
    material: foam,
    kerfMm: 0.8,
  }),
  // Coarse, so that the tests take little time.
  cut: { order: 'round', toleranceMm: 0.3, pointsPerSurface: 12, clearanceMm: 10, warmUpS: 3 },
  allowances: { upperMm: 1, lowerMm: 1 },
  features: [
    {
      kind: 'slot',
      name: 'Cap',
      surface: 'upper',
      rootStation: 0.4,
      tipStation: 0.4,
      widthMm: 6,
      rootDepthMm: 3,
      tipDepthMm: 3,
    },
  ],
};

const source = {
  sectionId: SECTION,
  sectionName: 'Heron outer panel',
  versionNumber: 3,
  description: 'NACA 2412',
  checksum: 'a'.repeat(64),
  status: 'released' as const,
  statusAt: AT,
  inForce: 3,
};

export function versionOf(number: number, change: Partial<SheetVersion> = {}): SheetVersion {
  const plan = change.plan ?? PLAN;
  return {
    id: idOf(300 + number),
    sheetId: idOf(200),
    sheetName: 'Heron left',
    number,
    basedOn: null,
    status: 'draft',
    statusReason: '',
    statusBy: null,
    statusAt: null,
    plan,
    pinned: resolvePlan(plan, { root: SHAPE, tip: SHAPE, machine: bench, material: foam }),
    root: source,
    tip: source,
    machine: { id: bench.id, name: bench.name, kind: 'wire' },
    material: { id: foam.id, name: foam.name },
    ribMachine: null,
    ribMaterial: null,
    parts: ['core'],
    errors: 0,
    warnings: 0,
    checksum: 'b'.repeat(64),
    shortCode: shortCodeOf('b'.repeat(64)),
    note: '',
    author: PERSON,
    createdAt: AT,
    ...change,
  };
}

export const SHEET: CutSheet = {
  id: idOf(200),
  name: 'Heron left',
  purpose: '',
  archived: false,
  createdAt: AT,
  updatedAt: AT,
  updatedBy: PERSON,
  versionCount: 1,
  releasedNumber: null,
  latest: {
    number: 1,
    status: 'draft',
    root: source,
    tip: source,
    rootChordMm: 220,
    tipChordMm: 180,
    spanMm: 600,
    quantity: 2,
    parts: ['core'],
    machine: { id: bench.id, name: bench.name, kind: 'wire' },
    material: { id: foam.id, name: foam.name },
    errors: 0,
    warnings: 0,
  },
  progress: [],
};

/** The section version that both ends are made from, as the server tells of it. */
export const SECTION_VERSION = {
  id: idOf(400),
  sectionId: SECTION,
  sectionName: 'Heron outer panel',
  number: 3,
  basedOn: null,
  status: 'released',
  statusReason: '',
  statusBy: PERSON,
  statusAt: AT,
  shape: SHAPE,
  description: 'NACA 2412',
  checksum: 'a'.repeat(64),
  note: '',
  author: PERSON,
  createdAt: AT,
};
