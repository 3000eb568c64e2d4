import { type Polyline, polylineOf } from '#geometry/cutting/arrays.ts';
import { type BlockFit, type FoamAmounts } from '#geometry/cutting/block.ts';
import { type SkinsMeet } from '#geometry/cutting/core.ts';
import { type MeltReport } from '#geometry/cutting/feed.ts';
import { type PlacedFeature } from '#geometry/cutting/features.ts';
import { type InspectionRow } from '#geometry/cutting/inspection.ts';
import {
  type End,
  type Feature,
  hasWire,
  type Plan,
  type RibsPlan,
  type WirePlan,
} from '#geometry/cutting/plan.ts';
import { type CorePlan, type Cut } from '#geometry/cutting/planner.ts';
import { type SheetLayout } from '#geometry/cutting/packing.ts';
import { type RibSet } from '#geometry/cutting/ribs.ts';
import { benchOf, toTowers } from '#geometry/cutting/towers.ts';
import { type MoveKind } from '#geometry/cutting/wire-path.ts';
import { type Point } from '#geometry/point.ts';

/** One end of the panel in the panel's frame, mm. */
export interface FaceModel {
  readonly chordMm: number;
  /** The true contour, the foam between the skins, and the path of the wire's centre round it. */
  readonly contour: Polyline;
  readonly core: Polyline;
  readonly path: Polyline;
  /** The ends of the chord line: nose and trailing edge. */
  readonly nose: Point;
  readonly trailingEdge: Point;
}

export interface FeatureModel {
  /** Its place in the plan's list. */
  readonly index: number;
  readonly kind: Feature['kind'];
  readonly name: string;
  readonly root: Polyline;
  readonly tip: Polyline;
}

/** A rib on its sheet, mm from the sheet's lower left corner. */
export interface PlacedRib {
  readonly number: number;
  readonly sheet: number;
  readonly cuts: readonly Polyline[];
  readonly holes: readonly { readonly x: number; readonly y: number; readonly radius: number }[];
}

export interface RibsModel {
  readonly stationsMm: readonly number[];
  readonly layout: Omit<SheetLayout, 'places'>;
  readonly placed: readonly PlacedRib[];
  readonly sheet: { readonly widthMm: number; readonly heightMm: number };
}

/** The wire's way by its nodes, in the machine's frame, mm and seconds. */
export interface CutModel {
  readonly kinds: readonly MoveKind[];
  readonly labels: readonly (string | null)[];
  readonly left: Polyline;
  readonly right: Polyline;
  readonly leftTower: Polyline;
  readonly rightTower: Polyline;
  /** When the wire comes to each node, and when it goes on, s from the start. */
  readonly arrives: Float64Array;
  readonly leaves: Float64Array;
  /** The program's line (counted from 1) that moves to each node; 0 where there is none. */
  readonly lineOfNode: Int32Array;
  readonly lines: readonly string[];
  readonly totalSeconds: number;
  readonly melt: MeltReport;
  readonly largestDeviationMm: number;
}

/** What is drawn and told of a plan: plain values and arrays, so that a worker can hand them over. */
export interface PlanModel {
  readonly plan: Plan;
  readonly root: FaceModel;
  readonly tip: FaceModel;
  readonly features: readonly FeatureModel[];
  readonly skinsMeet: readonly SkinsMeet[];
  readonly fit: Pick<BlockFit, 'places' | 'marginMm'> | null;
  readonly foam: FoamAmounts | null;
  readonly ribs: RibsModel | null;
  readonly hasTemplates: boolean;
  readonly inspection: readonly InspectionRow[];
  readonly cut: CutModel | null;
}

/** A panel as it was worked out, reduced to what is drawn and told. */
export function modelOf(of: CorePlan): PlanModel {
  const { plan, core, features, fit, foam, ribs, templates, inspection, cut } = of;
  return {
    plan,
    root: faceOf(of, 'root'),
    tip: faceOf(of, 'tip'),
    features: features.map(featureOf),
    skinsMeet: core.skinsMeet,
    fit: fit && { places: fit.places, marginMm: fit.marginMm },
    foam,
    ribs: ribs && plan.ribs && ribsOf(ribs, plan.ribs),
    hasTemplates: templates.length > 0,
    inspection,
    cut: cut && hasWire(plan) ? cutOf(plan, cut) : null,
  };
}

function faceOf({ core }: CorePlan, end: End): FaceModel {
  const section = core.panel[end];
  const { x, y } = core.panel.chain[end];
  const line = (of: Polyline): Polyline => ({ x: of.x, y: of.y });
  return {
    chordMm: section.chordMm,
    contour: { x, y },
    core: line(core[end].core),
    path: line(core[end].path),
    nose: section.toPanel({ x: 0, y: 0 }),
    trailingEdge: section.toPanel({ x: 1, y: 0 }),
  };
}

function ribsOf({ ribs, layout }: RibSet, { sheet }: RibsPlan): RibsModel {
  const { places, ...rest } = layout;
  const placed = places.flatMap((place): PlacedRib[] => {
    const rib = ribs.find(({ number }) => number === place.number);
    if (!rib) return [];
    const { turned, dx, dy } = place;
    const at = (x: number, y: number): Point =>
      turned ? { x: dx - y, y: dy + x } : { x: dx + x, y: dy + y };
    const moved = ({ x, y }: Polyline) => polylineOf(Array.from(x, (value, i) => at(value, y[i] ?? 0)));
    return [
      {
        number: rib.number,
        sheet: place.sheet,
        cuts: [...rib.outlines, ...rib.tubes].map(moved),
        holes: rib.holes.map(({ x, y, radius }) => ({ ...at(x, y), radius })),
      },
    ];
  });
  return { stationsMm: ribs.map(({ spanMm }) => spanMm), layout: rest, placed, sheet };
}

function featureOf({ index, feature, root, tip }: PlacedFeature): FeatureModel {
  return { index, kind: feature.kind, name: feature.name, root: root.outline, tip: tip.outline };
}

function cutOf(plan: WirePlan, { path, program, melt, simulation }: Cut): CutModel {
  const towers = toTowers(benchOf(plan), path.left, path.right);
  const arrives = new Float64Array(path.nodes.length);
  const leaves = new Float64Array(path.nodes.length);
  let clock = 0;
  path.nodes.forEach(({ waitS = 0 }, i) => {
    arrives[i] = clock += program.seconds[i] ?? 0;
    leaves[i] = clock += waitS;
  });
  return {
    kinds: path.nodes.map(({ kind }) => kind),
    labels: path.nodes.map(({ label }) => label ?? null),
    left: path.left,
    right: path.right,
    leftTower: towers.left,
    rightTower: towers.right,
    arrives,
    leaves,
    lineOfNode: program.lineOfNode,
    lines: program.text.trimEnd().split('\n'),
    totalSeconds: clock,
    melt,
    largestDeviationMm: simulation.largestDeviationMm,
  };
}

/** The buffers of a model, to be handed over instead of copied. Those that several lines share are named once. */
export function buffersOf(value: unknown, found = new Set<ArrayBuffer>()): Set<ArrayBuffer> {
  if (ArrayBuffer.isView(value)) {
    if (value.buffer instanceof ArrayBuffer) found.add(value.buffer);
  } else if (typeof value === 'object' && value !== null) {
    for (const part of Object.values(value)) buffersOf(part, found);
  }
  return found;
}
