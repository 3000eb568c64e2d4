import { type Point } from '../point.ts';
import { type Polyline, at, polylineOf } from './arrays.ts';
import { type BlockPlace, toBlock, toMachine } from './block.ts';
import { type Core } from './core.ts';
import { type PlacedFeature } from './features.ts';
import { type WirePlan } from './plan.ts';
import { PART } from './row.ts';

/** What the wire does on its way to a node. */
export type MoveKind = 'travel' | 'lead' | 'cut' | 'slit';

/** A place the wire goes through: its points in the planes of the panel's two faces, in the machine's frame, mm. */
export interface WireNode {
  readonly left: Point;
  readonly right: Point;
  readonly kind: MoveKind;
  /** Chord station on the contour; null elsewhere. */
  readonly station: number | null;
  /** Which core of the block, from 0. */
  readonly core: number;
  /** Begins a part of the cut, in words for the sheet and the program. */
  readonly label?: string;
  /** The wire waits here for so long before it goes on. */
  readonly waitS?: number;
}

/** The whole way of the wire from the machine's origin and back. */
export interface WirePath {
  readonly nodes: readonly WireNode[];
  readonly left: Polyline;
  readonly right: Polyline;
}

/** A point of the way round one core, at both of its ends, with what it is. */
interface Step {
  readonly root: Point;
  readonly tip: Point;
  readonly kind: MoveKind;
  readonly station: number | null;
  readonly label?: string;
  /** The wire leaves through the front here and comes back. */
  readonly throughFront?: boolean;
}

/**
 * The wire's way: from the origin round the block to the trailing edge, in, along the upper surface, round the nose, along the lower surface and out
 * again; features are cut where the wire passes them, there and back. In two passes the wire leaves through the front at
 * the nose and comes back by the same slit.
 */
export function buildWirePath(
  plan: WirePlan,
  core: Core,
  features: readonly PlacedFeature[],
  places: readonly BlockPlace[],
): WirePath {
  const steps = aroundCore(plan, core, features);
  const nodes = places.flatMap((place, index) => coreNodes(plan, steps, place, index));
  const first = nodes[0];
  const last = nodes.at(-1);
  if (!first || !last) return pathOf([]);
  return pathOf([...approach(plan, first), ...nodes, ...approach(plan, last).reverse()]);
}

/** A path through given nodes. */
export function pathOf(nodes: readonly WireNode[]): WirePath {
  return {
    nodes,
    left: polylineOf(nodes.map(({ left }) => left)),
    right: polylineOf(nodes.map(({ right }) => right)),
  };
}

/** The way round the core in the panel's frame, from the trailing edge to the trailing edge. */
function aroundCore(plan: WirePlan, core: Core, features: readonly PlacedFeature[]): Step[] {
  const { station, part } = core.panel.chain;
  const steps: Step[] = [];
  let labelled: number = PART.tail;
  const turn = nosePair(core);
  for (let i = 0; i < station.length; i++) {
    const here: Step = {
      root: pointAt(core.root.path, i),
      tip: pointAt(core.tip.path, i),
      kind: 'cut',
      station: at(station, i),
    };
    const kind = at(part, i);
    const begins = kind !== labelled && (kind === PART.upper || kind === PART.lower);
    if (begins) labelled = kind;
    const label = kind === PART.upper ? 'Upper surface' : 'Lower surface';
    steps.push({
      ...here,
      ...(begins ? { label } : {}),
      ...(i === turn && plan.cut.order === 'two-passes' ? { throughFront: true } : {}),
    });
    for (const feature of features) if (feature.pair === i) steps.push(...slit(feature, here));
  }
  return steps;
}

/** The middle one of the pairs at the nose. */
function nosePair({ panel }: Core): number {
  const nose = Array.from(panel.chain.part.keys()).filter((i) => panel.chain.part[i] === PART.nose);
  return nose[nose.length >> 1] ?? -1;
}

function slit({ feature, way }: PlacedFeature, here: Step): Step[] {
  const title = feature.kind.charAt(0).toUpperCase() + feature.kind.slice(1);
  const steps = Array.from(way.root.x.keys(), (i): Step => ({
    root: pointAt(way.root, i),
    tip: pointAt(way.tip, i),
    kind: 'slit',
    station: null,
    ...(i === 0 ? { label: feature.name ? `${title}: ${feature.name}` : title } : {}),
  }));
  return [...steps, { ...here, kind: 'slit', station: null }];
}

function pointAt({ x, y }: Polyline, i: number): Point {
  return { x: at(x, i), y: at(y, i) };
}

/** The steps round one core on the machine, with the way in and out behind the trailing edge. */
function coreNodes(plan: WirePlan, steps: readonly Step[], place: BlockPlace, core: number): WireNode[] {
  const onMachine = (end: 'root' | 'tip') =>
    toMachine(plan.machine, plan.block, toBlock(place, polylineOf(steps.map((step) => step[end]))));
  const rootLeft = (plan.machine.rootFace === 'left') !== place.mirrored;
  const [left, right] = rootLeft
    ? [onMachine('root'), onMachine('tip')]
    : [onMachine('tip'), onMachine('root')];
  const { rear, front } = clearPlanes(plan);
  const nodes: WireNode[] = [];
  steps.forEach(({ kind, station, label, throughFront }, i) => {
    const node = { left: pointAt(left, i), right: pointAt(right, i), kind, station, core };
    if (i === 0) {
      nodes.push({
        ...aside(node, rear, 'travel'),
        label: 'Travel to the trailing edge',
        waitS: plan.cut.warmUpS,
      });
      nodes.push({ ...node, kind: 'lead', label: 'Lead in' });
      return;
    }
    nodes.push({ ...node, ...(label === undefined ? {} : { label }) });
    if (throughFront) {
      nodes.push({ ...aside(node, front, 'lead'), label: 'Out through the front' });
      nodes.push({ ...node, kind: 'lead', station: null, label: 'In again by the same slit' });
    }
    if (i === steps.length - 1) nodes.push({ ...aside(node, rear, 'lead'), label: 'Lead out' });
  });
  return nodes;
}

/** The planes across the bench, behind and in front of the block, where the wire hangs clear. */
function clearPlanes({ machine, block, cut }: WirePlan): { rear: number; front: number } {
  const near = machine.blockXMm - cut.clearanceMm;
  const far = machine.blockXMm + block.lengthMm + cut.clearanceMm;
  return machine.trailingEdge === 'origin' ? { rear: near, front: far } : { rear: far, front: near };
}

function aside(node: WireNode, x: number, kind: MoveKind): WireNode {
  return { ...node, left: { x, y: node.left.y }, right: { x, y: node.right.y }, kind, station: null };
}

/** From the origin to where the wire enters: over the block when the trailing edge points away from the origin. */
function approach({ machine, block, cut }: WirePlan, entry: WireNode): WireNode[] {
  const travel = (left: Point, right: Point): WireNode => ({
    left,
    right,
    kind: 'travel',
    station: null,
    core: entry.core,
  });
  const level = (x: number, y: number) => travel({ x, y }, { x, y });
  const home = level(0, 0);
  if (machine.trailingEdge === 'origin') {
    return [home, travel({ x: 0, y: entry.left.y }, { x: 0, y: entry.right.y })];
  }
  const over = machine.blockYMm + block.heightMm + cut.clearanceMm;
  return [home, level(0, over), level(entry.left.x, over)];
}
