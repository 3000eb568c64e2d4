import { type Point } from '../point.ts';
import { type Box, type Polyline, at, between, boxOf, polylineOf } from './arrays.ts';
import { type Core } from './core.ts';
import {
  type Axis,
  type Cutout,
  type Fault,
  entryOf,
  slotAt,
  stripAt,
  tubeAt,
  verticalCut,
} from './feature-ends.ts';
import { type Finding, error, mm, stationText } from './findings.ts';
import { hingeAt } from './hinge.ts';
import { type Surface } from './placing.ts';
import { ENDS, type End, type Feature, type Plan } from './plan.ts';
import { PART } from './row.ts';

/** A feature in its place, and the way the wire takes to cut it: it leaves the contour at a pair and comes back to it. */
export interface PlacedFeature {
  readonly index: number;
  readonly feature: Feature;
  readonly surface: Surface;
  /** The pair of the chain where the wire leaves. */
  readonly pair: number;
  readonly root: Cutout;
  readonly tip: Cutout;
  /** The wire's points between leaving and coming back, in step, in the panel's frame. */
  readonly way: Readonly<Record<End, Polyline>>;
}

/** How far the wire stays clear of the core where it passes to a feature whose stations differ at root and tip, mm. */
const CLEAR = 2;

/**
 * Places slots, strips, tubes and hinges. A feature has its own place at root and tip and runs straight between them, so a straight spar
 * stays straight however the panel tapers and sweeps; slots and strips keep upright, so it is not twisted either.
 */
export function placeFeatures(
  plan: Plan,
  core: Core,
): { readonly features: PlacedFeature[]; readonly findings: Finding[] } {
  const features: PlacedFeature[] = [];
  const findings: Finding[] = [];
  plan.features.forEach((feature, index) => {
    const cutouts = {
      root: cutoutAt(plan, core, feature, 'root'),
      tip: cutoutAt(plan, core, feature, 'tip'),
    };
    const faults = ENDS.flatMap((end) => faultFindings(plan, feature, index, end, cutouts[end]));
    findings.push(...faults);
    const { root, tip } = cutouts;
    if (typeof root === 'string' || typeof tip === 'string') return;
    const surface = entryOf(feature);
    const pair = pairAt(core, surface, feature.rootStation);
    const way = {
      root: wayTo(core, feature, surface, pair, 'root', root),
      tip: wayTo(core, feature, surface, pair, 'tip', tip),
    };
    features.push({ index, feature, surface, pair, root, tip, way });
  });
  return { features, findings: [...findings, ...overlaps(plan, features)] };
}

function stationAt(feature: Feature, end: End): number {
  return end === 'root' ? feature.rootStation : feature.tipStation;
}

function middleX(core: Core, feature: Feature, end: End): number {
  return core.panel[end].toPanel({ x: stationAt(feature, end), y: 0 }).x;
}

function cutoutAt(plan: Plan, core: Core, feature: Feature, end: End): Cutout | Fault {
  const x = middleX(core, feature, end);
  if (feature.kind === 'slot') {
    const depth = end === 'root' ? feature.rootDepthMm : feature.tipDepthMm;
    return slotAt(core[end], feature.surface, x, feature.widthMm, depth);
  }
  if (feature.kind === 'strip') return stripAt(core[end], x, feature.widthMm);
  if (feature.kind === 'hinge') {
    return hingeAt(core[end], feature.hingeSurface, x, feature.bevelDeg, feature.webMm);
  }
  const axis = tubeAxis(plan, core, feature, end);
  return axis ? tubeAt(core[end], axis, feature.entry, feature.diameterMm) : 'outside';
}

function tubeAxis(
  plan: Plan,
  core: Core,
  feature: Extract<Feature, { kind: 'tube' }>,
  end: End,
): Axis | null {
  const centre = (of: End): Point | null => {
    const x = middleX(core, feature, of);
    const cut = verticalCut(core[of].core, x);
    const height = of === 'root' ? feature.rootHeightMm : feature.tipHeightMm;
    return cut && { x, y: (cut.low + cut.high) / 2 + height };
  };
  const [root, tip] = [centre('root'), centre('tip')];
  if (!root || !tip) return null;
  const span = plan.panel.spanMm;
  return {
    ...(end === 'root' ? root : tip),
    slopeX: (tip.x - root.x) / span,
    slopeY: (tip.y - root.y) / span,
  };
}

function faultFindings(
  plan: Plan,
  feature: Feature,
  index: number,
  end: End,
  cutout: Cutout | Fault,
): Finding[] {
  const station = stationAt(feature, end);
  const name = `The ${feature.kind}${feature.name ? ` “${feature.name}”` : ''}`;
  const place = `at ${stationText(station)} of the ${end} chord`;
  const path = (field: string) => `features.${index}.${field}`;
  const stationField = path(end === 'root' ? 'rootStation' : 'tipStation');
  if (cutout === 'outside') {
    return [
      error('outside-contour', stationField, `${name} does not lie within the core ${place}.`, {
        end,
        station,
      }),
    ];
  }
  if (cutout === 'narrow') {
    const field = path(feature.kind === 'tube' ? 'diameterMm' : 'widthMm');
    const message = `${name} is narrower than the kerf of ${mm(plan.kerfMm[end])} at the ${end}.`;
    return [error('narrower-than-kerf', field, message, { end, station })];
  }
  if (cutout === 'shallow') {
    const message = `${name} has a side shallower than half the kerf of ${mm(plan.kerfMm[end])} at the ${end}.`;
    const field = path(end === 'root' ? 'rootDepthMm' : 'tipDepthMm');
    return [error('shallower-than-kerf', field, message, { end, station })];
  }
  const least = plan.limits.minimumWebMm;
  if (cutout.webMm >= least) return [];
  const field = feature.kind === 'slot' ? path(end === 'root' ? 'rootDepthMm' : 'tipDepthMm') : stationField;
  if (cutout.webMm < 0) {
    return [error('outside-contour', field, `${name} breaks through the core ${place}.`, { end, station })];
  }
  const message = `${name} leaves ${mm(cutout.webMm)} of foam ${place}, less than ${mm(least)}.`;
  return [error('web-too-thin', field, message, { end, station })];
}

/** The pair of the chain on a surface whose station is nearest. */
function pairAt({ panel }: Core, surface: Surface, station: number): number {
  const { chain } = panel;
  let best = -1;
  for (let i = 0; i < chain.station.length; i++) {
    if (chain.part[i] !== PART[surface]) continue;
    if (best < 0 || Math.abs(at(chain.station, i) - station) < Math.abs(at(chain.station, best) - station))
      best = i;
  }
  return best;
}

/**
 * The wire's points for a feature, over the point of its path straight above the feature's middle. Where its station differs between the ends, the
 * wire passes there and back clear of the core.
 */
function wayTo(
  core: Core,
  feature: Feature,
  surface: Surface,
  pair: number,
  end: End,
  cutout: Cutout,
): Polyline {
  const { path } = core[end];
  const x = middleX(core, feature, end);
  const sign = surface === 'upper' ? 1 : -1;
  const cut = verticalCut(path, x);
  const above = { x, y: cut ? (sign > 0 ? cut.high : cut.low) : at(path.y, pair) };
  const detour =
    Math.abs(feature.rootStation - feature.tipStation) < 1e-9
      ? []
      : clearWay(core, surface, end, { x: at(path.x, pair), y: at(path.y, pair) }, above);
  const there = [...detour, above];
  return polylineOf([...there, ...cutout.wire, ...there.slice().reverse()]);
}

/** Up to a level clear of the core, and along it to above a feature. */
function clearWay(core: Core, surface: Surface, end: End, leave: Point, above: Point): Point[] {
  const { path } = core[end];
  const sign = surface === 'upper' ? 1 : -1;
  let level = Math.max(sign * leave.y, sign * above.y);
  path.x.forEach((value, i) => {
    const passed = (value - leave.x) * (value - above.x) <= 0;
    if (passed && core.panel.chain.part[i] === PART[surface]) level = Math.max(level, sign * at(path.y, i));
  });
  const y = sign * (level + CLEAR);
  return [
    { x: leave.x, y },
    { x: above.x, y },
  ];
}

/** Shares of the span at which two features are compared: they may pass through one another between the ends. */
const SHARES = [0, 0.25, 0.5, 0.75, 1] as const;

function overlaps(plan: Plan, features: readonly PlacedFeature[]): Finding[] {
  const web = plan.limits.minimumWebMm;
  return features.flatMap((feature, k) =>
    features.slice(0, k).flatMap((other) => {
      const share = SHARES.find((of) => near(room(feature, of), room(other, of), web));
      if (share === undefined) return [];
      const end = share <= 0.5 ? 'root' : 'tip';
      const spanMm = share * plan.panel.spanMm;
      const message = `Features ${other.index + 1} and ${feature.index + 1} stand less than ${mm(web)} apart at ${mm(spanMm, 0)} from the root.`;
      const place = { end, spanMm, station: stationAt(feature.feature, end) } as const;
      return [error('features-overlap', `features.${feature.index}.${end}Station`, message, place)];
    }),
  );
}

/** The box around a feature with its way in from the surface, at a share of the span. */
function room({ root, tip }: PlacedFeature, share: number): Box[] {
  const box = boxOf(between(root.outline, tip.outline, share));
  const ways = root.mouths.map(({ edges }, i) => {
    const mouth = boxOf(between(polylineOf(edges), polylineOf(tip.mouths[i]?.edges ?? edges), share));
    return { ...mouth, minY: Math.min(mouth.minY, box.minY), maxY: Math.max(mouth.maxY, box.maxY) };
  });
  return [box, ...ways];
}

function near(these: readonly Box[], others: readonly Box[], by: number): boolean {
  return these.some((a) =>
    others.some(
      (b) => a.minX < b.maxX + by && b.minX < a.maxX + by && a.minY < b.maxY + by && b.minY < a.maxY + by,
    ),
  );
}
