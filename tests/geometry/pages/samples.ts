import fc from 'fast-check';
import { type SheetIdentity } from '#geometry/cutting/files/identity.ts';
import { type CorePlan, planCore } from '#geometry/cutting/planner.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type Finding } from '#geometry/cutting/findings.ts';
import { type PageDetails } from '#geometry/pages/page.ts';
import { PLAN, RIBS, TEMPLATE, planWith, section } from '#tests/geometry/cutting/plans.ts';

export const SHEET: SheetIdentity = {
  sheetName: 'Reed wing, outer panel left',
  versionNumber: 3,
  status: 'released',
  checksum: '8c1f04d9a77e'.padEnd(64, '5'),
  shortCode: 'K7QM-3F2X',
  address: 'https://wings.example/cut-sheets/0197b2a4-5c1e-7f00-9b60-2f6a4b1c9d11/versions/3',
  root: { sectionName: 'Marsh', versionNumber: 3, checksum: 'a'.repeat(64), designation: 'NACA 2412' },
  tip: { sectionName: 'Marsh tip', versionNumber: 2, checksum: 'b'.repeat(64), designation: 'NACA 2410' },
  author: 'A. Weaver',
  createdAt: '2026-03-04T09:30:00.000Z',
  releasedBy: 'B. Cooper',
  releasedAt: '2026-03-05T10:00:00.000Z',
  machineName: 'Long bench',
  materialName: 'EPS 20',
  ribMaterialName: 'Balsa 3 mm',
};

/** A small pattern in the place of a code. */
export const DETAILS: PageDetails = {
  qr: Array.from({ length: 21 }, (_, row) => Array.from({ length: 21 }, (_, i) => (row * 7 + i * 3) % 5 < 2)),
  owner: 'Fen Works',
};

export interface Planning {
  readonly plan: CorePlan;
  readonly findings: readonly Finding[];
}

const known = new WeakMap<Plan, Planning>();

/** The plan worked out, once. */
export function planned(plan: Plan): Planning {
  const before = known.get(plan);
  if (before) return before;
  const { core, findings } = planCore(plan, { ...SHEET, part: 'core' });
  if (!core) throw new Error('The plan gives no core.');
  const planning = { plan: core, findings };
  known.set(plan, planning);
  return planning;
}

const HINGE = {
  kind: 'hinge',
  name: 'Aileron',
  hingeSurface: 'upper',
  rootStation: 0.75,
  tipStation: 0.75,
  bevelDeg: 20,
  webMm: 1,
} as const;

const BIG = {
  panel: {
    root: { shape: section('4418', 'open'), chordMm: 1200 },
    tip: { shape: section('4415', 'open'), chordMm: 900 },
    spanMm: 1800,
    sweepMm: 200,
  },
  block: { lengthMm: 1400, heightMm: 300, spanMm: 1800 },
  machine: { towerDistanceMm: 2400, travelXMm: 2000, travelYMm: 800, blockXMm: 300, blockFromLeftMm: 300 },
};

/** Plans of each kind that a shop has. */
export const PLANS = {
  'tapered and swept': planWith({ template: TEMPLATE }),
  'chord of 1200 mm': planWith({
    ...BIG,
    template: TEMPLATE,
    features: [...PLAN.features, HINGE],
    ribs: { ...RIBS, stations: { kind: 'count', count: 12 }, lighteningHoles: null },
  }),
  'ribs alone': {
    ...planWith({ ribs: RIBS, kerfMm: { root: 0, tip: 0 } }),
    block: null,
    machine: null,
    material: null,
  },
  'by hand': { ...planWith({ template: TEMPLATE }), machine: null },
  small: planWith({
    template: { ...TEMPLATE, ticks: 50 },
    panel: {
      root: { shape: section('0009'), chordMm: 90 },
      tip: { shape: section('0009'), chordMm: 70 },
      spanMm: 180,
      sweepMm: 10,
    },
    allowances: { upperMm: 0, lowerMm: 0 },
    features: [],
    block: { lengthMm: 120, heightMm: 30, spanMm: 180 },
    machine: { towerDistanceMm: 500 },
  }),
  'pair in two passes': planWith({
    template: TEMPLATE,
    block: { heightMm: 120, pair: true },
    cut: { order: 'two-passes' },
    machine: { trailingEdge: 'far' },
  }),
} satisfies Record<string, Plan>;

/** Names as nobody should give them: endless, without blanks, with signs that no font has, turned round, in several lines. */
export const HOSTILE_NAMES = [
  'W'.repeat(300),
  'a b '.repeat(90),
  'line\nbreak\ttab\u0000nul',
  '翼型 крыло جناح 🛩️ \u202etxt',
  '!= -- ->> (\\) %PDF <script>',
  '',
] as const;

/** The identity with the same name in all its free texts. */
export function namedSheet(name: string, status = 'draft'): SheetIdentity {
  const end = { sectionName: name, versionNumber: 123_456, checksum: name, designation: name };
  return {
    ...SHEET,
    sheetName: name,
    status,
    shortCode: name.slice(0, 40),
    address: `https://wings.example/${name}`,
    root: end,
    tip: end,
    author: name,
    releasedBy: name,
    machineName: name,
    materialName: name,
    ribMaterialName: name,
  };
}

export const names: fc.Arbitrary<string> = fc.oneof(
  fc.string({ maxLength: 120 }),
  fc.constantFrom(...HOSTILE_NAMES),
);
