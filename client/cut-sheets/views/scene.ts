import { type Polyline, at, boxOf } from '#geometry/cutting/arrays.ts';
import { type BlockPlace, toBlock } from '#geometry/cutting/block.ts';
import { ENDS, type End, type Machine, type Plan } from '#geometry/cutting/plan.ts';
import { type Point } from '#geometry/point.ts';
import { type CutModel, type FaceModel, type PlanModel } from './plan-model.ts';

/** One end of a core in the block's frame: x from the front, y from the underside, mm. */
export interface SceneFace {
  readonly contour: Polyline;
  readonly core: Polyline;
  readonly path: Polyline;
  readonly features: readonly { readonly index: number; readonly outline: Polyline }[];
  readonly nose: Point;
  readonly trailingEdge: Point;
}

/** A core in its place; the mirrored one of a pair has its tip where the other has its root. */
export interface SceneCore {
  readonly mirrored: boolean;
  readonly root: SceneFace;
  readonly tip: SceneFace;
}

export interface SceneBlock {
  readonly lengthMm: number;
  readonly heightMm: number;
  readonly marginMm: number;
  /** Distances of its two faces from the root face along the span, mm. */
  readonly from: number;
  readonly to: number;
}

/** The wire's way in the block's frame, in the planes of root and tip and of the two towers. */
export interface SceneWire {
  readonly root: Polyline;
  readonly tip: Polyline;
  readonly leftTower: Polyline;
  readonly rightTower: Polyline;
}

/** The towers, as distances from the root face along the span, and what the machine stands on, mm. */
export interface SceneBench {
  readonly leftAt: number;
  readonly rightAt: number;
  readonly groundY: number;
  readonly reachY: number;
}

/** A piece of the way from tower to tower that is drawn: true distances from the root face, and how far it is moved together. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
  readonly shift: number;
}

/** Everything of a plan in one frame, to be drawn from any side. */
export interface Scene {
  readonly spanMm: number;
  /** One, or with interrupted views (ISO 128-3) up to three: a tower that stands far off is drawn nearer. */
  readonly stretches: readonly Stretch[];
  readonly block: SceneBlock | null;
  readonly cores: readonly SceneCore[];
  readonly bench: SceneBench | null;
  readonly wire: SceneWire | null;
  /** The root is at the left when one looks down on the panel with its leading edge at the top. */
  readonly rootAtLeft: boolean;
}

const ALONE: BlockPlace = { xMm: 0, yMm: 0, tiltDeg: 0, mirrored: false };

export function sceneOf(model: PlanModel): Scene {
  const { plan, fit, cut } = model;
  const { machine } = plan;
  const { spanMm } = plan.panel;
  const block = plan.block && {
    lengthMm: plan.block.lengthMm,
    heightMm: plan.block.heightMm,
    marginMm: plan.block.marginMm,
    ...blockSpan(plan, plan.block.spanMm),
  };
  const bench = machine && benchOf(machine, plan);
  return {
    spanMm,
    stretches: stretchesOf(spanMm, block, bench),
    block,
    bench,
    cores: (fit?.places ?? [ALONE]).map((place) => coreOf(model, place)),
    wire: cut && machine && plan.block ? wireOf(cut, machine, plan.block.lengthMm) : null,
    // x aft, y up and z from root to tip are right-handed; a machine may cut the mirrored panel.
    rootAtLeft: !machine || (machine.rootFace === 'left') === (machine.trailingEdge === 'origin'),
  };
}

/** Shares of the panel's length: what is drawn beside it, the piece at a tower, and the gap between both. */
const BESIDE = 0.24;
const AT_TOWER = 0.05;
const GAP = 0.03;

function stretchesOf(spanMm: number, block: SceneBlock | null, bench: SceneBench | null): Stretch[] {
  const [low, high] = [Math.min(0, block?.from ?? 0), Math.max(spanMm, block?.to ?? 0)];
  if (!bench) return [{ from: low, to: high, shift: 0 }];
  const [first, last] = [Math.min(bench.leftAt, bench.rightAt), Math.max(bench.leftAt, bench.rightAt)];
  const length = high - low;
  const [beside, piece, gap] = [BESIDE * length, AT_TOWER * length, GAP * length];
  const isFar = (distance: number) => distance > beside + piece + 2 * gap;
  const [from, to] = [isFar(low - first) ? low - beside : first, isFar(last - high) ? high + beside : last];
  return [
    ...(from > first ? [{ from: first, to: first + piece, shift: from - gap - (first + piece) }] : []),
    { from, to, shift: 0 },
    ...(to < last ? [{ from: last - piece, to: last, shift: to + gap - (last - piece) }] : []),
  ];
}

/** Where a distance from the root face along the span is drawn. */
export function shownAt({ stretches }: Pick<Scene, 'stretches'>, alongSpan: number): number {
  const nearest = stretches.reduce((best, of) => (away(of, alongSpan) < away(best, alongSpan) ? of : best));
  return alongSpan + nearest.shift;
}

function away({ from, to }: Stretch, at: number): number {
  return Math.max(0, from - at, at - to);
}

/** The block begins at the panel's left face; what it is longer than the panel stands out at the right. */
function blockSpan({ machine, panel }: Plan, blockSpanMm: number): Pick<SceneBlock, 'from' | 'to'> {
  return machine?.rootFace === 'right'
    ? { from: panel.spanMm - blockSpanMm, to: panel.spanMm }
    : { from: 0, to: blockSpanMm };
}

function coreOf(model: PlanModel, place: BlockPlace): SceneCore {
  const { features } = model;
  const face = (of: FaceModel, end: End): SceneFace => ({
    contour: toBlock(place, of.contour),
    core: toBlock(place, of.core),
    path: toBlock(place, of.path),
    features: features.map((feature) => ({ index: feature.index, outline: toBlock(place, feature[end]) })),
    nose: pointIn(place, of.nose),
    trailingEdge: pointIn(place, of.trailingEdge),
  });
  return { mirrored: place.mirrored, root: face(model.root, 'root'), tip: face(model.tip, 'tip') };
}

function pointIn(place: BlockPlace, { x, y }: Point): Point {
  const line = toBlock(place, { x: Float64Array.of(x), y: Float64Array.of(y) });
  return { x: at(line.x, 0), y: at(line.y, 0) };
}

function benchOf(machine: Machine, { panel }: Plan): SceneBench {
  const { blockFromLeftMm, towerDistanceMm, rootFace } = machine;
  const fromRoot = (fromLeft: number) =>
    rootFace === 'left' ? fromLeft - blockFromLeftMm : panel.spanMm + blockFromLeftMm - fromLeft;
  return {
    leftAt: fromRoot(0),
    rightAt: fromRoot(towerDistanceMm),
    groundY: -machine.blockYMm,
    reachY: machine.travelYMm - machine.blockYMm,
  };
}

function wireOf(cut: CutModel, machine: Machine, blockLengthMm: number): SceneWire {
  const inBlock = ({ x, y }: Polyline): Polyline => ({
    x: x.map((value) =>
      machine.trailingEdge === 'origin' ? machine.blockXMm + blockLengthMm - value : value - machine.blockXMm,
    ),
    y: y.map((value) => value - machine.blockYMm),
  });
  const [root, tip] = machine.rootFace === 'left' ? [cut.left, cut.right] : [cut.right, cut.left];
  return {
    root: inBlock(root),
    tip: inBlock(tip),
    leftTower: inBlock(cut.leftTower),
    rightTower: inBlock(cut.rightTower),
  };
}

/** What stands in the plane of the root face or of the tip face. */
export function facesAt({ cores }: Scene, end: End): readonly SceneFace[] {
  return cores.map((core) => (core.mirrored ? core[end === 'root' ? 'tip' : 'root'] : core[end]));
}

/** How far the contours of all cores reach along the chord and in height. */
export function contourBox({ cores }: Scene) {
  return boxOf(...cores.flatMap((core) => ENDS.map((end) => core[end].contour)));
}
