import { type Point } from '../point.ts';
import { type CurvePoint, type Outline, type SurfaceCurve } from '../shapes/outline.ts';
import { goldenMaximum } from './roots.ts';

/** A radius of curvature in fractions of chord and the point of the outline that has it. */
interface RadiusAt {
  readonly radius: number;
  readonly at: Point;
}

export interface Radii {
  /** Radius of curvature of each surface at the nose point; 0 for a pointed nose. */
  readonly noseRadiusUpper: number;
  readonly noseRadiusLower: number;
  /** The smaller of both. */
  readonly noseRadius: number;
  readonly smallestConvexRadius: RadiusAt;
  /** Null when no part of the outline is hollow. */
  readonly smallestConcaveRadius: RadiusAt | null;
}

/** A first derivative shorter than this has vanished: the curve has a point there. */
const POINTED = 1e-9;
/** Curvature below this counts as straight: a radius of a million chords. */
const STRAIGHT = 1e-6;
/** The last t looked at, 2.5 millionths of the chord before the trailing edge: there the outline has a corner, not a radius. */
const LAST = 1 - 1e-3;
/** Distance in t from a jump of the curvature at which each side of it is looked at. */
const BESIDE = 1e-9;
const T_TOLERANCE = 1e-6;
const STEPS = 128;
/** Steps are halved again and again towards the nose, whose curvature changes within its own radius. */
const NOSE_PARAMETERS = [0, 1 / 32, 1 / 16, 1 / 8, 1 / 4, 1 / 2].map((share) => share / STEPS);

/** +1 or −1: the sense in which a surface, run from the nose, turns where it is convex. */
type Sense = 1 | -1;

/**
 * Curvature (x'y'' − y'x'')/|P'|³ (textbook), positive where the section is convex.
 * @param sense −1 on the upper surface, which turns clockwise from nose to trailing edge, +1 on the lower
 */
export function convexCurvature({ dx, dy, ddx, ddy }: CurvePoint, sense: Sense): number {
  const square = dx * dx + dy * dy;
  return (sense * (dx * ddy - dy * ddx)) / (square * Math.sqrt(square));
}

/**
 * Nose radii and the smallest convex and hollow radius of the exact outline: a scan of the curvature at equal steps of t, finer at the
 * nose, refined by golden section about its extremes. What a cutter's wire or mill must follow. The radii are those of the smooth parts:
 * the slight corner of a 4-digit section at its camber position (see SurfaceCurve.breaks) and the trailing edge are not counted.
 */
export function radiiOf(outline: Outline): Radii {
  const nose = outline.upper.at(0);
  const noseRadiusUpper = noseRadius(outline.upper, -1);
  const noseRadiusLower = noseRadius(outline.lower, 1);
  const upper = tightestOn(outline.upper, -1);
  const lower = tightestOn(outline.lower, 1);
  const convex = tighter(upper.convex, lower.convex);
  const hollow = tighter(upper.hollow, lower.hollow);
  const pointed = noseRadiusUpper === 0 || noseRadiusLower === 0;
  return {
    noseRadiusUpper,
    noseRadiusLower,
    noseRadius: Math.min(noseRadiusUpper, noseRadiusLower),
    smallestConvexRadius: pointed ? { radius: 0, at: nose } : { radius: 1 / convex.curvature, at: convex.at },
    smallestConcaveRadius:
      hollow.curvature < STRAIGHT ? null : { radius: 1 / hollow.curvature, at: hollow.at },
  };
}

function noseRadius(surface: SurfaceCurve, sense: Sense): number {
  const nose = surface.derivatives(0);
  return isPointed(nose) ? 0 : 1 / convexCurvature(nose, sense);
}

interface Bend {
  readonly curvature: number;
  readonly at: Point;
}

/** The larger of two bends. */
function tighter(a: Bend, b: Bend): Bend {
  return b.curvature > a.curvature ? b : a;
}

/** The largest convex and the largest hollow curvature of one surface. */
function tightestOn(surface: SurfaceCurve, sense: Sense): { readonly convex: Bend; readonly hollow: Bend } {
  const none: Bend = { curvature: -Infinity, at: surface.at(0) };
  let best = { convex: none, hollow: none };
  for (const [from, to] of smoothPieces(surface)) {
    const parameters = parametersOn(from, to);
    const curvatures = parameters.map((t) => regularCurvature(surface, sense, t));
    best = {
      convex: tighter(best.convex, refine(surface, sense, parameters, curvatures, 1)),
      hollow: tighter(best.hollow, refine(surface, sense, parameters, curvatures, -1)),
    };
  }
  return best;
}

/** The curvature, or null at a point where the first derivative vanishes. */
function regularCurvature(surface: SurfaceCurve, sense: Sense, t: number): number | null {
  const point = surface.derivatives(t);
  return isPointed(point) ? null : convexCurvature(point, sense);
}

function isPointed({ dx, dy }: CurvePoint): boolean {
  return dx * dx + dy * dy < POINTED * POINTED;
}

/** The largest value of sign × curvature: the largest of the scan, then golden section between its neighbours. */
function refine(
  surface: SurfaceCurve,
  sense: Sense,
  parameters: readonly number[],
  curvatures: readonly (number | null)[],
  sign: 1 | -1,
): Bend {
  let top = 0;
  const scanned = (i: number) => sign * (curvatures[i] ?? -sign * Infinity);
  for (let i = 1; i < parameters.length; i++) if (scanned(i) > scanned(top)) top = i;
  const at = parameters[top] ?? 0;
  const best = { at, value: scanned(top) };
  if (best.value <= 0) return { curvature: best.value, at: surface.at(at) };
  const peak = goldenMaximum(
    (t) => sign * (regularCurvature(surface, sense, t) ?? -sign * Infinity),
    parameters[Math.max(0, top - 1)] ?? at,
    parameters[Math.min(parameters.length - 1, top + 1)] ?? at,
    T_TOLERANCE,
  );
  const found = peak.value > best.value ? peak : best;
  return { curvature: found.value, at: surface.at(found.at) };
}

function smoothPieces(surface: SurfaceCurve): (readonly [number, number])[] {
  const starts = [0, ...surface.breaks.map((t) => t + BESIDE)];
  const ends = [...surface.breaks.map((t) => t - BESIDE), LAST];
  return starts.map((start, i) => [start, ends[i] ?? LAST]);
}

function parametersOn(from: number, to: number): number[] {
  const inside: number[] = from === 0 ? NOSE_PARAMETERS.filter((t) => t < to) : [from];
  for (let i = 1; i < STEPS; i++) {
    const t = i / STEPS;
    if (t > from && t < to) inside.push(t);
  }
  return [...inside, to];
}
