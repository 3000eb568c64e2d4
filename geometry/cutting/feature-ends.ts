import { type Point } from '../point.ts';
import { type Polyline, at, polylineOf, segmentDistance } from './arrays.ts';
import { type CoreEnd } from './core.ts';
import { alongWall } from './walls.ts';
import { type Feature } from './plan.ts';
import { type Surface } from './placing.ts';

/** What a feature is at one end, in the panel's frame. */
export interface Cutout {
  /** The foam taken out, counter-clockwise. */
  readonly outline: Polyline;
  /** Centre of the wire, from the mouth round and back to the mouth. */
  readonly wire: readonly Point[];
  /** Where it opens the core's surfaces: the two edges on each. */
  readonly mouths: readonly Mouth[];
  /**
   * Points of its walls that the kerf just touches, in step between the ends: null in corners that the round kerf can't reach and where the entry
   * slit opens the wall.
   */
  readonly walls: readonly (Point | null)[];
  /** Foam left to the next surface of the core, mm; below 0 it breaks through. */
  readonly webMm: number;
}

/** The opening of a feature in a surface of the core. */
export interface Mouth {
  readonly surface: Surface;
  readonly edges: readonly [Point, Point];
}

/** Why a feature can't be cut at one end. */
export type Fault = 'outside' | 'narrow' | 'shallow';

/** A vertical line's lowest and highest point on an outline. */
interface Cut {
  readonly low: number;
  readonly high: number;
}

/** Where the vertical line at x meets a closed outline; null when it misses. */
export function verticalCut({ x, y }: Polyline, at_: number): Cut | null {
  let [low, high] = [Infinity, -Infinity];
  for (let i = 0, k = x.length - 1; i < x.length; k = i++) {
    const [a, b] = [at(x, k), at(x, i)];
    if (a < at_ === b < at_) continue;
    const height = at(y, k) + ((at_ - a) / (b - a)) * (at(y, i) - at(y, k));
    if (height < low) low = height;
    if (height > high) high = height;
  }
  return high >= low ? { low, high } : null;
}

/** A rectangle from one surface. Its sides stand upright and its floor lies level in the panel, not turned with the washout. */
export function slotAt(
  { core, path, halfKerfMm: h }: CoreEnd,
  surface: Surface,
  x: number,
  widthMm: number,
  depthMm: number,
): Cutout | Fault {
  const [aft, fore] = [x + widthMm / 2, x - widthMm / 2];
  const cuts = [x, aft, fore].map((value) => verticalCut(core, value));
  const mouths = [aft - h, fore + h].map((value) => verticalCut(path, value));
  const [middle, aftCut, foreCut] = cuts;
  const [aftMouth, foreMouth] = mouths;
  if (!middle || !aftCut || !foreCut || !aftMouth || !foreMouth) return 'outside';
  if (widthMm < 2 * h - 1e-9) return 'narrow';
  const up = surface === 'upper';
  const floor = up ? middle.high - depthMm : middle.low + depthMm;
  const inner = up ? floor + h : floor - h;
  const mouth = (cut: Cut) => (up ? cut.high : cut.low);
  const depthAt = (cut: Cut) => (up ? cut.high - floor : floor - cut.low);
  // A shallower wall can't come out upright: the kerf is round.
  if (Math.min(depthAt(middle), depthAt(aftCut), depthAt(foreCut)) < h) return 'shallow';
  const far = (cut: Cut) => (up ? floor - cut.low : cut.high - floor);
  const outline = [
    { x: aft, y: mouth(aftCut) },
    { x: fore, y: mouth(foreCut) },
    { x: fore, y: floor },
    { x: aft, y: floor },
  ];
  const wire = [
    { x: aft - h, y: mouth(aftMouth) },
    { x: aft - h, y: inner },
    { x: fore + h, y: inner },
    { x: fore + h, y: mouth(foreMouth) },
  ];
  const wall = (side: number, cut: Cut) => alongWall({ x: side, y: mouth(cut) }, { x: side, y: inner }, 3);
  return {
    outline: polylineOf(up ? outline : outline.reverse()),
    wire: up ? wire : wire.reverse(),
    mouths: [
      {
        surface,
        edges: [
          { x: aft, y: mouth(aftCut) },
          { x: fore, y: mouth(foreCut) },
        ],
      },
    ],
    walls: [
      ...wall(aft, aftCut),
      ...wall(fore, foreCut),
      ...alongWall({ x: aft - h, y: floor }, { x: fore + h, y: floor }, 3),
    ],
    webMm: Math.min(far(middle), far(aftCut), far(foreCut)),
  };
}

/** A strip through both surfaces, cut from the upper one. */
export function stripAt({ core, path, halfKerfMm: h }: CoreEnd, x: number, widthMm: number): Cutout | Fault {
  const [aft, fore] = [x + widthMm / 2, x - widthMm / 2];
  const [aftCut, foreCut] = [verticalCut(core, aft), verticalCut(core, fore)];
  const [aftPath, forePath] = [verticalCut(path, aft - h), verticalCut(path, fore + h)];
  if (!aftCut || !foreCut || !aftPath || !forePath) return 'outside';
  if (widthMm < 2 * h - 1e-9) return 'narrow';
  return {
    outline: polylineOf([
      { x: aft, y: aftCut.high },
      { x: fore, y: foreCut.high },
      { x: fore, y: foreCut.low },
      { x: aft, y: aftCut.low },
    ]),
    wire: [
      { x: aft - h, y: aftPath.high },
      { x: aft - h, y: aftPath.low },
      { x: fore + h, y: forePath.low },
      { x: fore + h, y: forePath.high },
    ],
    mouths: (['upper', 'lower'] as const).map((surface) => ({
      surface,
      edges: [
        { x: aft, y: surface === 'upper' ? aftCut.high : aftCut.low },
        { x: fore, y: surface === 'upper' ? foreCut.high : foreCut.low },
      ],
    })),
    walls: [
      ...alongWall({ x: aft, y: aftCut.high }, { x: aft, y: aftCut.low }, 5),
      ...alongWall({ x: fore, y: foreCut.high }, { x: fore, y: foreCut.low }, 5),
    ],
    webMm: Infinity,
  };
}

/** The axis of a tube: its point in this face, and how far it runs aside for each mm of span. */
export interface Axis extends Point {
  readonly slopeX: number;
  readonly slopeY: number;
}

const AROUND = 96;

/**
 * A round tube that may run aslant: the face cuts it in an ellipse, whose long axis points the way the tube leans and is longer by the
 * root of 1 + lean². The wire starts and ends at the point nearest to the entry.
 */
export function tubeAt(
  { core, halfKerfMm: h }: CoreEnd,
  axis: Axis,
  entry: Surface,
  diameterMm: number,
): Cutout | Fault {
  const radius = diameterMm / 2;
  if (radius <= h) return 'narrow';
  const lean = Math.atan2(axis.slopeY, axis.slopeX);
  const stretch = Math.sqrt(1 + axis.slopeX ** 2 + axis.slopeY ** 2);
  const [cos, sin] = [Math.cos(lean), Math.sin(lean)];
  const start = entry === 'upper' ? Math.PI / 2 : -Math.PI / 2;
  const ring = (inset: number) =>
    Array.from({ length: AROUND + 1 }, (_, i): Point => {
      const angle = start - lean + (2 * Math.PI * i) / AROUND;
      const [u, v] = [Math.cos(angle), Math.sin(angle)];
      const size = Math.hypot(u / stretch, v);
      const along = radius * stretch * u - (inset * (u / stretch)) / size;
      const across = radius * v - (inset * v) / size;
      return { x: axis.x + cos * along - sin * across, y: axis.y + sin * along + cos * across };
    });
  const outline = polylineOf(ring(0).slice(0, -1));
  const webMm = clearance(core, outline);
  if (webMm === null) return 'outside';
  const wire = ring(h);
  const first = wire[0];
  const cut = first && verticalCut(core, first.x);
  if (!cut) return 'outside';
  const surface = entry === 'upper' ? cut.high : cut.low;
  const beside = ({ x, y }: Point) =>
    Math.abs(x - first.x) > 1.05 * h || (entry === 'upper' ? y < axis.y : y > axis.y);
  const walls = ring(0).map((point) => (beside(point) ? point : null));
  return {
    outline,
    wire,
    mouths: [
      {
        surface: entry,
        edges: [
          { x: first.x - h, y: surface },
          { x: first.x + h, y: surface },
        ],
      },
    ],
    walls,
    webMm,
  };
}

/** The least distance between a shape inside a core and the core's outline; null when some point lies outside. */
function clearance(core: Polyline, shape: Polyline): number | null {
  let least = Infinity;
  for (let i = 0; i < shape.x.length; i += 2) {
    const [x, y] = [at(shape.x, i), at(shape.y, i)];
    const cut = verticalCut(core, x);
    if (!cut || y <= cut.low || y >= cut.high) return null;
    for (let b = 0, a = core.x.length - 1; b < core.x.length; a = b++) {
      if (Math.min(at(core.x, a), at(core.x, b)) > x + least) continue;
      if (Math.max(at(core.x, a), at(core.x, b)) < x - least) continue;
      least = Math.min(
        least,
        segmentDistance(x, y, at(core.x, a), at(core.y, a), at(core.x, b), at(core.y, b)),
      );
    }
  }
  return least;
}

/** The surface that the wire leaves to cut a feature. */
export function entryOf(feature: Feature): Surface {
  if (feature.kind === 'slot') return feature.surface;
  if (feature.kind === 'tube') return feature.entry;
  if (feature.kind === 'strip') return 'upper';
  return feature.hingeSurface === 'upper' ? 'lower' : 'upper';
}
