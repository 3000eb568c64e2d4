import { type NamedPlan } from './sheet-histories.ts';

/** A panel of one section that tapers, cut from foam; what differs from sheet to sheet is told beside it. */
export const panel: NamedPlan = {
  panel: {
    root: { section: 'Heron outer panel', version: 3, chordMm: 220 },
    tip: { section: 'Heron outer panel', version: 3, chordMm: 160 },
    spanMm: 600,
    sweepMm: 15,
    washoutDeg: 2,
    washoutStation: 0.25,
    verticalOffsetMm: 0,
  },
  allowances: { upperMm: 0.3, lowerMm: 0.3 },
  kerfMm: { root: 0.8, tip: 0.8 },
  stock: { leadingEdgeStation: null, trailingEdgeStation: 0.96 },
  features: [
    {
      kind: 'tube',
      name: 'Spar tube',
      entry: 'lower',
      rootStation: 0.28,
      tipStation: 0.28,
      diameterMm: 6,
      rootHeightMm: 0,
      tipHeightMm: 0,
    },
    {
      kind: 'slot',
      name: 'Upper cap',
      surface: 'upper',
      rootStation: 0.42,
      tipStation: 0.42,
      widthMm: 5,
      rootDepthMm: 2,
      tipDepthMm: 2,
    },
  ],
  block: {
    lengthMm: 270,
    heightMm: 60,
    spanMm: 600,
    marginMm: 5,
    coreXMm: null,
    coreYMm: null,
    tiltDeg: 0,
    pair: false,
  },
  cut: { order: 'round', toleranceMm: 0.02, pointsPerSurface: 60, clearanceMm: 10, warmUpS: 3 },
  ribs: null,
  template: null,
  limits: { minimumWebMm: 1.5, minimumTrailingEdgeMm: 0.8, speedRatio: 2 },
  inspection: { stations: [0.15, 0.3, 0.5, 0.7], toleranceMm: 0.3, measured: 'core' },
  machine: 'Long bench',
  material: 'XPS 32, blue',
  ribMachine: null,
  ribMaterial: null,
  quantity: 4,
  paper: 'A4',
};

function ends(section: string, version: number, rootMm: number, tipMm: number) {
  return {
    root: { section, version, chordMm: rootMm },
    tip: { section, version, chordMm: tipMm },
  };
}

export const firstSet: NamedPlan = {
  ...panel,
  panel: { ...panel.panel, ...ends('Heron outer panel', 2, 220, 160) },
  features: panel.features.slice(0, 1),
  quantity: 2,
};

export const winglet: NamedPlan = {
  ...panel,
  panel: {
    ...panel.panel,
    ...ends('Heron winglet', 2, 140, 90),
    spanMm: 180,
    sweepMm: 40,
    washoutDeg: 0,
  },
  allowances: { upperMm: 0.2, lowerMm: 0.2 },
  kerfMm: { root: 1.2, tip: 1.2 },
  features: [],
  block: { ...blockOf(190, 40, 180), marginMm: 4 },
  template: {
    wireDiameterMm: 0.4,
    ticks: 20,
    rampFraction: 0.15,
    pinDiameterMm: 3,
    pinStations: [0.3, 0.6],
  },
  machine: 'Two-hand bow',
  material: 'EPS 20, white',
  quantity: 2,
};

/** A block of foam that the core lies in the middle of. */
export function blockOf(lengthMm: number, heightMm: number, spanMm: number) {
  return { lengthMm, heightMm, spanMm, marginMm: 5, coreXMm: null, coreYMm: null, tiltDeg: 0, pair: false };
}

export const trainer: NamedPlan = {
  ...panel,
  panel: {
    ...panel.panel,
    ...ends('Curlew trainer wing', 2, 250, 250),
    spanMm: 700,
    sweepMm: 0,
    washoutDeg: 0,
  },
  allowances: { upperMm: 1, lowerMm: 1 },
  kerfMm: { root: 0.15, tip: 0.15 },
  stock: { leadingEdgeStation: null, trailingEdgeStation: null },
  features: [
    {
      kind: 'slot',
      name: 'Upper spar cap',
      surface: 'upper',
      rootStation: 0.3,
      tipStation: 0.3,
      widthMm: 5,
      rootDepthMm: 5,
      tipDepthMm: 5,
    },
    {
      kind: 'slot',
      name: 'Lower spar cap',
      surface: 'lower',
      rootStation: 0.3,
      tipStation: 0.3,
      widthMm: 5,
      rootDepthMm: 5,
      tipDepthMm: 5,
    },
  ],
  block: null,
  ribs: {
    stations: { kind: 'count', count: 9 },
    materialThicknessMm: 2,
    fitAllowanceMm: 0.1,
    sheet: { widthMm: 600, heightMm: 100, borderMm: 5, spacingMm: 3 },
    lighteningHoles: { most: 3, minimumWebMm: 4, smallestDiameterMm: 6 },
    jigTabs: null,
    numberHeightMm: 4,
  },
  inspection: { ...panel.inspection, toleranceMm: 0.5, measured: 'with-skin' },
  machine: null,
  material: null,
  ribMachine: 'Laser by the window',
  ribMaterial: 'Balsa 2 mm',
  quantity: 2,
};

export const rudder: NamedPlan = {
  ...panel,
  panel: {
    ...panel.panel,
    ...ends('Sedge rudder', 2, 90, 70),
    spanMm: 260,
    sweepMm: 10,
    washoutDeg: 0,
  },
  allowances: { upperMm: 0, lowerMm: 0 },
  stock: { leadingEdgeStation: null, trailingEdgeStation: null },
  features: [],
  block: blockOf(130, 40, 260),
  machine: 'Short bench',
  quantity: 1,
};

/** Bittern's tip is not released, and the block of the shelf is too low for it with this washout. */
export const bittern: NamedPlan = {
  ...panel,
  panel: {
    ...panel.panel,
    root: { section: 'Bittern wing root', version: 2, chordMm: 300 },
    tip: { section: 'Bittern wing tip', version: 2, chordMm: 170 },
    spanMm: 750,
    sweepMm: 220,
    washoutDeg: 3,
  },
  features: panel.features.slice(0, 1),
  block: blockOf(460, 35, 750),
  material: 'EPS 20, white',
  kerfMm: { root: 1, tip: 1 },
  quantity: 2,
};
