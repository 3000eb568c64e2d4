import { z } from 'zod';
import { shapeSchema } from '../shapes/shape.ts';
import { length, name, number, station, whole } from './fields.ts';

/** The accepted ranges, for fields and checks alike. Lengths in mm, angles in degrees, stations in fractions of chord. */
export const PLAN_LIMITS = {
  chordMm: { min: 10, max: 4000 },
  spanMm: { min: 1, max: 4000 },
  washoutDeg: { min: -15, max: 15 },
  skinMm: { min: 0, max: 20 },
  kerfMm: { min: 0, max: 6 },
  toleranceMm: { min: 0.001, max: 0.5 },
  feedMmMin: { min: 1, max: 20_000 },
  inspectionStation: { min: 0.02, max: 0.98 },
  inspectionMm: { min: 0.01, max: 5 },
  features: 24,
  ribs: 60,
  inspectionStations: 12,
} as const;

const feed = (label: string) =>
  number(label, ' mm/min', PLAN_LIMITS.feedMmMin.min, PLAN_LIMITS.feedMmMin.max);

const endSchema = (label: string) =>
  z.strictObject({
    shape: shapeSchema,
    chordMm: length(`The ${label} chord`, PLAN_LIMITS.chordMm.min, PLAN_LIMITS.chordMm.max),
  });

/**
 * A panel between two parallel faces. x runs aft, y up, z from the root face to the tip face; the root's leading edge is the origin.
 * Straight rulings join equal chord stations of the same surface.
 */
export const panelSchema = z.strictObject({
  root: endSchema('root'),
  tip: endSchema('tip'),
  spanMm: length('The span', PLAN_LIMITS.spanMm.min, PLAN_LIMITS.spanMm.max),
  /** How far aft the tip's leading edge lies before the washout turns it. */
  sweepMm: length('The sweep', -3000, 3000),
  /** Positive: the tip's leading edge turns down. */
  washoutDeg: number('The washout', '°', PLAN_LIMITS.washoutDeg.min, PLAN_LIMITS.washoutDeg.max),
  /** The chord station about which the tip is turned. */
  washoutStation: station('The washout station'),
  verticalOffsetMm: length('The vertical offset', -1000, 1000),
});

const skin = (label: string) => length(label, PLAN_LIMITS.skinMm.min, PLAN_LIMITS.skinMm.max);
const kerf = (label: string) => length(label, PLAN_LIMITS.kerfMm.min, PLAN_LIMITS.kerfMm.max);

const slotSchema = z.strictObject({
  kind: z.literal('slot'),
  name,
  surface: z.enum(['upper', 'lower']),
  rootStation: station('The slot’s root station'),
  tipStation: station('The slot’s tip station'),
  widthMm: length('The slot’s width', 0.2, 300),
  /** Depth from the core's surface at the middle of the slot. */
  rootDepthMm: length('The slot’s depth at the root', 0.2, 300),
  tipDepthMm: length('The slot’s depth at the tip', 0.2, 300),
});

/** A strip taken out through both surfaces, as for a shear web. */
const stripSchema = z.strictObject({
  kind: z.literal('strip'),
  name,
  rootStation: station('The strip’s root station'),
  tipStation: station('The strip’s tip station'),
  widthMm: length('The strip’s width', 0.2, 300),
});

const tubeSchema = z.strictObject({
  kind: z.literal('tube'),
  name,
  /** The surface that the entry slit comes from. */
  entry: z.enum(['upper', 'lower']),
  rootStation: station('The tube’s root station'),
  tipStation: station('The tube’s tip station'),
  diameterMm: length('The tube’s diameter', 0.5, 200),
  /** Height of the tube's axis above the middle of the core. */
  rootHeightMm: length('The tube’s height at the root', -200, 200),
  tipHeightMm: length('The tube’s height at the tip', -200, 200),
});

/** A hinge line: a V cut from the surface opposite to the hinge, up to a web of foam that stays (0: none). */
const hingeSchema = z.strictObject({
  kind: z.literal('hinge'),
  name,
  hingeSurface: z.enum(['upper', 'lower']),
  rootStation: station('The hinge’s root station'),
  tipStation: station('The hinge’s tip station'),
  /** Whole angle of the V; 0 is a plain slit. */
  bevelDeg: number('The bevel', '°', 0, 90),
  webMm: length('The web at the hinge', 0, 20),
});

export const featureSchema = z.discriminatedUnion(
  'kind',
  [slotSchema, stripSchema, tubeSchema, hingeSchema],
  {
    error: 'A feature is a slot, a strip, a tube or a hinge.',
  },
);

export const blockSchema = z.strictObject({
  /** Along the chord, mm. */
  lengthMm: length('The block’s length', 10, 5000),
  heightMm: length('The block’s height', 3, 2000),
  /** Along the span; at least the panel's. */
  spanMm: length('The block’s span', 1, 5000),
  /** Foam that must stay around the core at both faces. */
  marginMm: length('The block’s margin', 0, 200),
  /** The root's leading edge in the block, from its front and its underside; null places the cut in the middle. */
  coreXMm: length('The core’s place in the block', -5000, 5000).nullable(),
  coreYMm: length('The core’s height in the block', -2000, 2000).nullable(),
  /** Turns the core in the block, leading edge up. */
  tiltDeg: number('The tilt', '°', -45, 45),
  /** A mirrored second core from the same block. */
  pair: z.boolean({ error: 'The pair is yes or no.' }),
});

const letter = z.enum(['X', 'Y', 'Z', 'U', 'V', 'W', 'A', 'B', 'C'], {
  error: 'An axis letter is one of X, Y, Z, U, V, W, A, B and C.',
});
/** One line of words (letter and number) or a comment in parentheses, as RS-274 knows them. */
const codeLine = z
  .string({ error: 'A header or footer line is text.' })
  .max(80, { error: 'A header or footer line has at most 80 characters.' })
  .regex(/^(?:[A-Z][+-]?\d+(?:\.\d+)? *)*(?:\([A-Za-z0-9 .,:/+-]*\))?$/, {
    error: 'A header or footer line holds words such as M3 or S500, or a comment in parentheses.',
  });
const codeLines = z.array(codeLine).max(30, { error: 'At most 30 lines.' });

/** How the controller wants its program. */
export const controllerSchema = z.strictObject({
  axes: z
    .strictObject({ leftX: letter, leftY: letter, rightX: letter, rightY: letter })
    .refine((axes) => new Set(Object.values(axes)).size === 4, {
      error: 'Each axis needs a letter of its own.',
    }),
  decimals: whole('The decimals', 2, 6),
  lineNumbers: z.boolean({ error: 'Line numbers are yes or no.' }),
  /** G93, the time of each move, or G94, its speed. */
  timeMode: z.enum(['inverse-time', 'feed-per-minute']),
  /** What F means under G93: 1/min is the common one; 1/s and the time itself in seconds are dialects. */
  inverseTime: z.enum(['per-minute', 'per-second', 'seconds']),
  /** What F is measured over under G94: the left tower (the right one when the left stands), or all four axes together. */
  feedOver: z.enum(['left-tower', 'all-axes']),
  dwellUnit: z.enum(['seconds', 'milliseconds']),
  header: codeLines,
  footer: codeLines,
});

export const machineSchema = z.strictObject({
  name,
  /** Between the tower planes. */
  towerDistanceMm: length('The tower distance', 10, 8000),
  travelXMm: length('The travel in X', 10, 8000),
  travelYMm: length('The travel in Y', 10, 4000),
  maxFeedMmMin: feed('The machine’s feed limit'),
  travelFeedMmMin: feed('The travel feed'),
  /** The block's edge nearest to the origin in X, and its underside. */
  blockXMm: length('The block’s place in X', 0, 8000),
  blockYMm: length('The block’s place in Y', 0, 4000),
  /** The block's left face, from the left tower. */
  blockFromLeftMm: length('The block’s distance from the left tower', -8000, 8000),
  rootFace: z.enum(['left', 'right']),
  /** Which way the trailing edge points along X. */
  trailingEdge: z.enum(['origin', 'far']),
  controller: controllerSchema,
});

export const materialSchema = z.strictObject({
  name,
  densityKgM3: number('The density', ' kg/m³', 1, 500),
  /** Wire speed wanted in the foam, and the speed it must never exceed. */
  feedMmMin: feed('The cutting feed'),
  maxFeedMmMin: feed('The material’s feed limit'),
});

export const cutSchema = z.strictObject({
  /** All the way round, or out through the front at the leading edge and in again by the same slit. */
  order: z.enum(['round', 'two-passes']),
  /** Largest distance between the cut polygon and the true contour. */
  toleranceMm: length('The tolerance', PLAN_LIMITS.toleranceMm.min, PLAN_LIMITS.toleranceMm.max),
  /** Fewest points on each surface. */
  pointsPerSurface: whole('The points per surface', 10, 1000),
  /** Distance from the block at which the wire travels, and the least lead-in in front of the foam. */
  clearanceMm: length('The clearance', 1, 200),
  warmUpS: number('The warm-up time', ' s', 0, 120),
});

const sheetSchema = z.strictObject({
  widthMm: length('The sheet’s width', 10, 5000),
  heightMm: length('The sheet’s height', 10, 5000),
  borderMm: length('The sheet’s border', 0, 100),
  spacingMm: length('The spacing between ribs', 0, 100),
});

export const ribsSchema = z.strictObject({
  /** Evenly from root to tip, or a list of distances from the root face in mm. */
  stations: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('count'), count: whole('The number of ribs', 1, PLAN_LIMITS.ribs) }),
    z.strictObject({
      kind: z.literal('list'),
      mm: z
        .array(length('A rib’s station', 0, PLAN_LIMITS.spanMm.max))
        .min(1, { error: 'The list of stations is empty.' })
        .max(PLAN_LIMITS.ribs, { error: `At most ${PLAN_LIMITS.ribs} ribs.` }),
    }),
  ]),
  materialThicknessMm: length('The rib material’s thickness', 0.2, 30),
  /** Added to the width of a notch and to the diameter of a hole so that the part goes in. */
  fitAllowanceMm: length('The fit allowance', -1, 2),
  sheet: sheetSchema,
  lighteningHoles: z
    .strictObject({
      most: whole('The number of lightening holes', 1, 12),
      minimumWebMm: length('The web between holes', 0.5, 50),
      smallestDiameterMm: length('The smallest lightening hole', 1, 200),
    })
    .nullable(),
  jigTabs: z
    .strictObject({
      /** Chord stations of the two tabs. */
      stations: z.tuple([station('A jig tab’s station'), station('A jig tab’s station')]),
      widthMm: length('The jig tab’s width', 1, 100),
      /** Height of the board below the lowest rib. */
      heightMm: length('The jig tab’s height', 1, 200),
    })
    .nullable(),
  numberHeightMm: length('The height of the rib number', 1, 30),
});

export const templateSchema = z.strictObject({
  wireDiameterMm: length('The wire’s diameter', 0, 3),
  /** Chord stations of the ticks are spaced by 1/ticks. */
  ticks: whole('The number of ticks', 4, 50),
  /** Length of the ramp behind the trailing edge, in fractions of each end's chord. */
  rampFraction: number('The ramp', ' of the chord', 0.02, 0.5),
  pinDiameterMm: length('The pin hole', 0.5, 12),
  pinStations: z.tuple([station('A pin’s station'), station('A pin’s station')]),
});

export const limitsSchema = z.strictObject({
  /** Least foam between a feature and a surface or another feature. */
  minimumWebMm: length('The least web', 0, 50),
  /** Bare foam thinner than this at the trailing edge is warned of. */
  minimumTrailingEdgeMm: length('The least trailing edge', 0, 20),
  /** Ratio of the wire's speeds at both ends that is warned of. */
  speedRatio: number('The speed ratio', '', 1, 50),
});

const { inspectionStation, inspectionMm } = PLAN_LIMITS;
const inspectionStationRange = `An inspection station must be between ${inspectionStation.min * 100} % and ${inspectionStation.max * 100} % of chord.`;

/** Where the finished part is measured with a caliper. */
export const inspectionSchema = z.strictObject({
  stations: z
    .array(
      z
        .number({ error: inspectionStationRange })
        .min(inspectionStation.min, { error: inspectionStationRange })
        .max(inspectionStation.max, { error: inspectionStationRange }),
    )
    .min(1, { error: 'The inspection needs a station.' })
    .max(PLAN_LIMITS.inspectionStations, { error: `At most ${PLAN_LIMITS.inspectionStations} stations.` })
    .refine((stations) => new Set(stations).size === stations.length, {
      error: 'An inspection station stands twice.',
    }),
  toleranceMm: length('The inspection tolerance', inspectionMm.min, inspectionMm.max),
  /** The bare core, or the part with its skins on. */
  measured: z.enum(['core', 'with-skin'], { error: 'What is measured is the core or the part with skin.' }),
});

/** Everything that decides what is cut. Same plan, same cut. */
export const planSchema = z.strictObject({
  panel: panelSchema,
  /** Thickness of the skins, or of the sheeting on ribs. */
  allowances: z.strictObject({ upperMm: skin('The upper skin'), lowerMm: skin('The lower skin') }),
  kerfMm: z.strictObject({ root: kerf('The kerf at the root'), tip: kerf('The kerf at the tip') }),
  /** Chord stations at which leading- and trailing-edge stock takes the place of foam; null: none. */
  stock: z
    .strictObject({
      leadingEdgeStation: station('The leading-edge stock').nullable(),
      trailingEdgeStation: station('The trailing-edge stock').nullable(),
    })
    .refine(
      ({ leadingEdgeStation, trailingEdgeStation }) =>
        (trailingEdgeStation ?? 1) - (leadingEdgeStation ?? 0) >= 0.05,
      { path: ['trailingEdgeStation'], error: 'At least 5 % of the chord must stay between the stocks.' },
    ),
  features: z
    .array(featureSchema)
    .max(PLAN_LIMITS.features, { error: `At most ${PLAN_LIMITS.features} features.` }),
  /** Foam to cut a core from, and what it is made of; null: no foam core, ribs alone. */
  block: blockSchema.nullable(),
  /** Null: no wire machine cuts, but people by hand, or there are ribs alone. */
  machine: machineSchema.nullable(),
  material: materialSchema.nullable(),
  cut: cutSchema,
  ribs: ribsSchema.nullable(),
  template: templateSchema.nullable(),
  limits: limitsSchema,
  inspection: inspectionSchema,
});

export type Plan = z.infer<typeof planSchema>;
/** A plan of a foam core. */
export type FoamPlan = Plan & { readonly block: BlockPlan; readonly material: Material };
/** A plan that a wire machine cuts. */
export type WirePlan = FoamPlan & { readonly machine: Machine };
/** What a program and its simulation need to know beside the wire's path; every `WirePlan` is one. */
export interface WireSetup {
  readonly machine: Machine;
  readonly material: Material;
  readonly block: Pick<BlockPlan, 'lengthMm' | 'heightMm'>;
  /** Between the two faces in which the path is given. */
  readonly panel: Pick<PanelPlan, 'spanMm'>;
}
export type PanelPlan = z.infer<typeof panelSchema>;
export type Feature = z.infer<typeof featureSchema>;
export type BlockPlan = z.infer<typeof blockSchema>;
export type Machine = z.infer<typeof machineSchema>;
export type Controller = z.infer<typeof controllerSchema>;
export type Material = z.infer<typeof materialSchema>;
export type RibsPlan = z.infer<typeof ribsSchema>;
export type TemplatePlan = z.infer<typeof templateSchema>;
export type End = 'root' | 'tip';
export const ENDS = ['root', 'tip'] as const;

/** Whether a plan has all that the amounts of foam need. */
export function hasFoam(plan: Plan): plan is FoamPlan {
  return plan.block !== null && plan.material !== null;
}

/** Whether a plan has all that a machine program needs. */
export function hasWire(plan: Plan): plan is WirePlan {
  return hasFoam(plan) && plan.machine !== null;
}
