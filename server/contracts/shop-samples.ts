import { type MachineSettings, type MaterialSettings } from './shop.ts';

/** Plausible machines and materials to begin with, in a new workshop and in an empty form. All of them are invented. */
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

export const router = {
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
