import fc from 'fast-check';
import {
  type Feature,
  type Plan,
  type RibsPlan,
  type TemplatePlan,
  type WirePlan,
  hasWire,
  planSchema,
} from '#geometry/cutting/plan.ts';
import { parseDesignation } from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';

/** A 4-digit section by its digits. */
export function section(digits: string, trailingEdge: 'open' | 'closed' = 'closed'): Shape {
  const values = parseDesignation(digits);
  if (!values) throw new Error(`${digits} is no designation`);
  return { kind: 'naca4', ...values, trailingEdge };
}

export const TUBE: Extract<Feature, { kind: 'tube' }> = {
  kind: 'tube',
  name: 'Main tube',
  entry: 'lower',
  rootStation: 0.28,
  tipStation: 0.28,
  diameterMm: 6,
  rootHeightMm: 0,
  tipHeightMm: 0,
};

export const SLOT: Extract<Feature, { kind: 'slot' }> = {
  kind: 'slot',
  name: 'Cap',
  surface: 'upper',
  rootStation: 0.4,
  tipStation: 0.4,
  widthMm: 5,
  rootDepthMm: 2,
  tipDepthMm: 2,
};

/** A checked plan that a wire machine cuts. */
function wired(values: unknown): WirePlan {
  const plan = planSchema.parse(values);
  if (!hasWire(plan)) throw new Error('The plan has no machine, block or material.');
  return plan;
}

/** The tapered panel of the shop: 220 → 160 mm, 600 mm span, 2° washout, 1 mm skin, 0.8 mm kerf, a tube and a slot. */
export const PLAN: WirePlan = wired({
  panel: {
    root: { shape: section('2412', 'open'), chordMm: 220 },
    tip: { shape: section('2412', 'open'), chordMm: 160 },
    spanMm: 600,
    sweepMm: 30,
    washoutDeg: 2,
    washoutStation: 0.25,
    verticalOffsetMm: 4,
  },
  allowances: { upperMm: 1, lowerMm: 1 },
  kerfMm: { root: 0.8, tip: 0.8 },
  stock: { leadingEdgeStation: null, trailingEdgeStation: null },
  features: [TUBE, SLOT],
  block: {
    lengthMm: 260,
    heightMm: 60,
    spanMm: 600,
    marginMm: 5,
    coreXMm: null,
    coreYMm: null,
    tiltDeg: 0,
    pair: false,
  },
  machine: {
    name: 'Long bench',
    towerDistanceMm: 900,
    travelXMm: 600,
    travelYMm: 300,
    maxFeedMmMin: 1200,
    travelFeedMmMin: 900,
    blockXMm: 60,
    blockYMm: 20,
    blockFromLeftMm: 150,
    rootFace: 'left',
    trailingEdge: 'origin',
    controller: {
      axes: { leftX: 'X', leftY: 'Y', rightX: 'U', rightY: 'V' },
      decimals: 4,
      lineNumbers: true,
      timeMode: 'inverse-time',
      inverseTime: 'per-minute',
      feedOver: 'all-axes',
      dwellUnit: 'seconds',
      header: ['M3 S450 (wire on)'],
      footer: ['M5', 'M2'],
    },
  },
  material: { name: 'EPS 20', densityKgM3: 20, feedMmMin: 240, maxFeedMmMin: 300 },
  cut: { order: 'round', toleranceMm: 0.01, pointsPerSurface: 40, clearanceMm: 10, warmUpS: 3 },
  ribs: null,
  template: null,
  limits: { minimumWebMm: 1, minimumTrailingEdgeMm: 0.8, speedRatio: 3 },
  inspection: { stations: [0.1, 0.3, 0.65], toleranceMm: 0.3, measured: 'core' },
} satisfies Plan);

/** A rib set of 3 mm material with all that a rib can carry. */
export const RIBS: RibsPlan = {
  stations: { kind: 'count', count: 8 },
  materialThicknessMm: 3,
  fitAllowanceMm: 0.1,
  sheet: { widthMm: 600, heightMm: 300, borderMm: 5, spacingMm: 3 },
  lighteningHoles: { most: 3, minimumWebMm: 4, smallestDiameterMm: 5 },
  jigTabs: { stations: [0.15, 0.65], widthMm: 8, heightMm: 6 },
  numberHeightMm: 3,
};

export const TEMPLATE: TemplatePlan = {
  wireDiameterMm: 0.4,
  ticks: 20,
  rampFraction: 0.15,
  pinDiameterMm: 3,
  pinStations: [0.25, 0.6],
};

/** The plan of the machine with some of its parts replaced, one level deep. */
export function planWith(changes: {
  readonly [Key in keyof WirePlan]?: Partial<WirePlan[Key]> | WirePlan[Key];
}): WirePlan {
  const merged = Object.entries(changes).map(([key, value]) => {
    const old = PLAN[key as keyof Plan];
    const both = typeof old === 'object' && old && !Array.isArray(old) && value && !Array.isArray(value);
    return [key, both ? { ...old, ...value } : value];
  });
  return wired({ ...PLAN, ...Object.fromEntries(merged) });
}

/** The plan without features, skins and kerf, and both ends alike. */
export function prismOf(shape: Shape, chordMm: number): WirePlan {
  return planWith({
    panel: {
      root: { shape, chordMm },
      tip: { shape, chordMm },
      sweepMm: 0,
      washoutDeg: 0,
      verticalOffsetMm: 0,
    },
    allowances: { upperMm: 0, lowerMm: 0 },
    kerfMm: { root: 0, tip: 0 },
    features: [],
  });
}

const within = (min: number, max: number) =>
  fc.noBias(fc.integer({ min: 0, max: 1_000_000 })).map((n) => min + ((max - min) * n) / 1_000_000);

/** A section that a wing has: a 4-digit form or a smooth free one. */
const ordinary: fc.Arbitrary<Shape> = fc.oneof(
  fc.record({
    kind: fc.constant('naca4' as const),
    maxCamber: fc.oneof(fc.constant(0), within(0.005, 0.05)),
    maxCamberPosition: within(0.3, 0.6),
    maxThickness: within(0.07, 0.18),
    trailingEdge: fc.constantFrom('open' as const, 'closed' as const),
  }),
  fc.record({
    kind: fc.constant('cst' as const),
    upper: fc.array(within(0.13, 0.24), { minLength: 3, maxLength: 7 }),
    lower: fc.array(within(-0.17, -0.07), { minLength: 3, maxLength: 7 }),
    n1: fc.constant(0.5),
    n2: fc.constant(1),
    trailingEdgeGap: fc.oneof(fc.constant(0), within(0.001, 0.02)),
  }),
);

/** The section with its thickness and camber multiplied: what a tip is to its root. */
function scaled(shape: Shape, factor: number): Shape {
  if (shape.kind === 'naca4') return { ...shape, maxThickness: shape.maxThickness * factor };
  return { ...shape, upper: shape.upper.map((w) => w * factor), lower: shape.lower.map((w) => w * factor) };
}

/** Random plans of ordinary sections: taper, sweep, washout, kerf and skins as a shop would choose them. */
export const plans: fc.Arbitrary<WirePlan> = fc
  .record({
    root: ordinary,
    tipFactor: within(0.8, 1.2),
    rootChord: within(150, 400),
    taper: within(0.6, 1),
    spanMm: within(200, 1000),
    sweepMm: within(-60, 200),
    washoutDeg: within(-5, 5),
    washoutStation: within(0, 1),
    upperMm: fc.oneof(fc.constant(0), within(0, 1.5)),
    lowerMm: fc.oneof(fc.constant(0), within(0, 1.5)),
    rootKerf: within(0.2, 1.6),
    tipKerf: within(0.2, 1.6),
    rootFace: fc.constantFrom('left' as const, 'right' as const),
    trailingEdge: fc.constantFrom('origin' as const, 'far' as const),
    order: fc.constantFrom('round' as const, 'two-passes' as const),
  })
  .map((of) =>
    planWith({
      panel: {
        root: { shape: of.root, chordMm: of.rootChord },
        tip: { shape: scaled(of.root, of.tipFactor), chordMm: of.rootChord * of.taper },
        spanMm: of.spanMm,
        sweepMm: of.sweepMm,
        washoutDeg: of.washoutDeg,
        washoutStation: of.washoutStation,
        verticalOffsetMm: 0,
      },
      allowances: { upperMm: of.upperMm, lowerMm: of.lowerMm },
      kerfMm: { root: of.rootKerf, tip: of.tipKerf },
      features: [],
      block: { lengthMm: 1000, heightMm: 600, spanMm: of.spanMm },
      machine: {
        towerDistanceMm: of.spanMm + 400,
        travelXMm: 3000,
        travelYMm: 1500,
        blockXMm: 900,
        blockYMm: 200,
        blockFromLeftMm: 180,
        maxFeedMmMin: 20_000,
        rootFace: of.rootFace,
        trailingEdge: of.trailingEdge,
      },
      cut: { order: of.order },
    }),
  );
