import { type Feature, type RibsPlan, type TemplatePlan } from '#geometry/cutting/plan.ts';

/** What a feature is when it is added: plausible for a small wing, to be changed. Common practice. */
export const NEW_FEATURES: Readonly<Record<Feature['kind'], Feature>> = {
  slot: {
    kind: 'slot',
    name: '',
    surface: 'upper',
    rootStation: 0.3,
    tipStation: 0.3,
    widthMm: 6,
    rootDepthMm: 3,
    tipDepthMm: 3,
  },
  strip: { kind: 'strip', name: '', rootStation: 0.3, tipStation: 0.3, widthMm: 3 },
  tube: {
    kind: 'tube',
    name: '',
    entry: 'lower',
    rootStation: 0.28,
    tipStation: 0.28,
    diameterMm: 6,
    rootHeightMm: 0,
    tipHeightMm: 0,
  },
  hinge: {
    kind: 'hinge',
    name: '',
    hingeSurface: 'upper',
    rootStation: 0.75,
    tipStation: 0.75,
    bevelDeg: 20,
    webMm: 1,
  },
};

export const NEW_RIBS: RibsPlan = {
  stations: { kind: 'count', count: 8 },
  materialThicknessMm: 2,
  fitAllowanceMm: 0.1,
  sheet: { widthMm: 600, heightMm: 300, borderMm: 5, spacingMm: 3 },
  lighteningHoles: { most: 4, minimumWebMm: 4, smallestDiameterMm: 6 },
  jigTabs: { stations: [0.15, 0.7], widthMm: 8, heightMm: 12 },
  numberHeightMm: 4,
};
export const NEW_HOLES = NEW_RIBS.lighteningHoles ?? {};
export const NEW_TABS = NEW_RIBS.jigTabs ?? {};

export const NEW_TEMPLATE: TemplatePlan = {
  wireDiameterMm: 0.4,
  ticks: 10,
  rampFraction: 0.1,
  pinDiameterMm: 3,
  pinStations: [0.25, 0.6],
};
