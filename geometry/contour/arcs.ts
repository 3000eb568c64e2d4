import type { Point } from '../point.ts';
import type { Outline, SurfaceCurve } from '../shapes/outline.ts';
import type { Extents } from './contour.ts';
import { arcDistance, arcExtremes, arcHeight, biarc, type Arc } from './biarc.ts';
import { goldenMaximum } from './roots.ts';
import { TOLERANCE_FRACTION } from './sampling.ts';

/**
 * An outline of circular arcs and straight pieces, in fractions of chord: upper trailing edge, nose, lower trailing edge, as a
 * contour runs. All vertices lie on the outline.
 */
export interface ArcContour {
  readonly x: Float64Array;
  readonly y: Float64Array;
  /**
   * Bulge of the piece from each vertex to the next: tangent of a quarter of the arc's angle, positive counter-clockwise, 0
   * straight. The last one belongs to the piece that closes the outline onto vertex 0: the base of a blunt trailing edge,
   * straight, or the end of the lower surface at a sharp one.
   */
  readonly bulge: Float64Array;
  /** Place of each vertex along the outline: -1 at the upper trailing edge, 0 at the nose, 1 at the lower trailing edge. */
  readonly place: Float64Array;
  readonly sharp: boolean;
}

/** Points at which an arc is compared with the outline while it is sought; the lobes of the error need about ten each. */
const SEARCH_SAMPLES = 20;
/** Part of the tolerance that the search may use, and by which it takes less when the arcs found turn out to exceed the tolerance. */
const SEARCH_SHARE = 0.98;
/** Points at which the arcs found are compared with the outline; then the peak is refined. */
const CHECK_SAMPLES = 100;
/** The reach of a pair is found to this part of itself. */
const REACH_PRECISION = 1e-3;
/** A remainder shorter than this part of the piece before it is shared out between the two. */
const SHORT_REMAINDER = 0.1;
/** A peak of the error is found to this part of the distance between samples. */
const PEAK_PRECISION = 0.02;
/** Places nearer than this are too near to be told apart when halved. */
const SMALLEST_STEP = 1e-14;
/** An arc that is lower than this part of the tolerance is a straight piece. */
const FLAT_SHARE = 1e-3;

/**
 * The outline as pairs of tangent arcs, as few as a greedy search finds: each pair reaches as far as the tolerance lets it. The
 * arcs of a pair take the outline's tangents at the pair's ends and meet, tangent to each other, in a point of the outline; a
 * pair never spans the nose or a jump of curvature. Where arcs do not follow (the nose of a section whose class exponent is
 * not 0.5) straight pieces take their place.
 *
 * Source: that the tangent arcs through two points with given tangents have one free parameter: K. M. Bolton, "Biarc curves",
 * Computer-Aided Design 7 (1975), from memory; the joint on the curve is derived at {@link biarc}.
 *
 * @param tolerance largest distance between outline and arcs, fraction of chord, 1e-8 to 0.1
 * @param shortest shortest arc that is written, fraction of chord, from 0 to `tolerance`
 * @throws RangeError when `tolerance` or `shortest` is outside its range
 */
export function arcContour(outline: Outline, tolerance: number, shortest = 0): ArcContour {
  const { min, max } = TOLERANCE_FRACTION;
  if (!(tolerance >= min && tolerance <= max))
    throw new RangeError(`tolerance must be from ${min} to ${max}, not ${tolerance}`);
  if (!(shortest >= 0 && shortest <= tolerance))
    throw new RangeError(`shortest must be from 0 to the tolerance, not ${shortest}`);
  const track = trackOf(outline);
  for (let allowed = SEARCH_SHARE * tolerance; ; allowed *= SEARCH_SHARE) {
    const fit = (from: number, to: number) => fitPieces(track, from, to, allowed, shortest);
    const pieces = track.breaks
      .slice(1)
      .flatMap((to, i) => piecesBetween(track, fit, track.breaks[i] ?? to, to));
    const arcs = assemble(track, pieces, outline.sharp);
    if (largestArcError(outline, arcs) <= tolerance) return arcs;
  }
}

/** Largest distance of the outline from its arcs, fraction of chord, by dense comparison and refinement at its peak. */
export function largestArcError(outline: Outline, arcs: ArcContour): number {
  const track = trackOf(outline);
  let largest = 0;
  for (const { arc, from, to } of arcsOf(arcs)) {
    if (from === to) continue;
    largest = Math.max(
      largest,
      peakBetween((place) => arcDistance(track.at(place), arc), from, to),
    );
  }
  return largest;
}

/** Smallest and largest coordinates of the arcs, fractions of chord. */
export function arcExtents(arcs: ArcContour): Extents {
  const box = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity };
  for (const { arc } of arcsOf(arcs)) {
    for (const { x, y } of [arc.a, arc.b, ...arcExtremes(arc)]) {
      box.minX = Math.min(box.minX, x);
      box.maxX = Math.max(box.maxX, x);
      box.minY = Math.min(box.minY, y);
      box.maxY = Math.max(box.maxY, y);
    }
  }
  return box;
}

/** The outline as one curve over its places, in the direction of travel. */
interface Track {
  at(place: number): Point;
  /** Direction of travel; at the nose that of the surface on which `inside` lies. */
  direction(place: number, inside: number): Point;
  /** Places at which the curvature jumps, with both ends and the nose. */
  readonly breaks: readonly number[];
}

function trackOf({ upper, lower }: Outline): Track {
  const inner = ({ breaks }: SurfaceCurve) => breaks.filter((t) => t > 0 && t < 1);
  return {
    at: (place) => (place < 0 ? upper.at(-place) : lower.at(place)),
    direction: (place, inside) =>
      inside < 0 ? directionOf(upper, -place, -1) : directionOf(lower, place, 1),
    breaks: [
      -1,
      ...inner(upper)
        .map((t) => -t)
        .sort((a, b) => a - b),
      0,
      ...[...inner(lower)].sort((a, b) => a - b),
      1,
    ],
  };
}

/** A cosine parameter stands still at the ends; the direction there is taken so near to the end that it is the same. */
const NUDGE = 1e-6;

function directionOf(curve: SurfaceCurve, t: number, sign: number): Point {
  const { dx, dy } = curve.derivatives(t);
  if (Math.hypot(dx, dy) > NUDGE) return { x: sign * dx, y: sign * dy };
  const near = curve.derivatives(t < 0.5 ? t + NUDGE : t - NUDGE);
  return { x: sign * near.dx, y: sign * near.dy };
}

/** A piece by the place of its end and its bulge. */
interface Piece {
  readonly end: number;
  readonly bulge: number;
}

type Fit = (from: number, to: number) => readonly Piece[] | null;

function piecesBetween(track: Track, fit: Fit, from: number, to: number): readonly Piece[] {
  const pieces: Piece[] = [];
  let start = from;
  while (start < to) {
    let found = farthest(fit, start, to);
    const end = found.at(-1)?.end ?? to;
    const remainder = distance(track.at(end), track.at(to));
    if (end < to && remainder < SHORT_REMAINDER * distance(track.at(start), track.at(end))) {
      found = fit(start, (start + to) / 2) ?? found;
    }
    pieces.push(...found);
    start = found.at(-1)?.end ?? to;
  }
  const [only, ...more] = pieces;
  if (to - from < 1 || more.length > 0 || only?.bulge !== 0) return pieces;
  // A whole surface as one straight piece would leave the outline without area.
  const middle = (from + to) / 2;
  return [...piecesBetween(track, fit, from, middle), ...piecesBetween(track, fit, middle, to)];
}

/** The pieces that reach farthest from `start`, by bisection; a short enough straight piece always fits. */
function farthest(fit: Fit, start: number, to: number): readonly Piece[] {
  const whole = fit(start, to);
  if (whole !== null) return whole;
  let best: readonly Piece[] | null = null;
  let [reached, beyond] = [start, to];
  while (best === null || beyond - reached > REACH_PRECISION * (reached - start)) {
    const middle = (reached + beyond) / 2;
    if (middle <= start) return [{ end: beyond, bulge: 0 }];
    const pieces = fit(start, middle);
    if (pieces === null) beyond = middle;
    else [best, reached] = [pieces, middle];
  }
  return best;
}

/** A pair of arcs from one place to another, or one straight piece, or null when neither keeps the tolerance. */
function fitPieces(
  track: Track,
  from: number,
  to: number,
  tolerance: number,
  shortest: number,
): readonly Piece[] | null {
  const inside = (from + to) / 2;
  const pair = biarc(track.at, from, to, track.direction(from, inside), track.direction(to, inside));
  if (pair !== null) {
    const first = flattened(pair.first, tolerance);
    const second = flattened(pair.second, tolerance);
    const bent = first.bulge !== 0 || second.bulge !== 0;
    const long = Math.min(distance(first.a, first.b), distance(second.a, second.b)) >= shortest;
    if (
      bent &&
      long &&
      follows(track, first, from, pair.joint, tolerance) &&
      follows(track, second, pair.joint, to, tolerance)
    ) {
      return [
        { end: pair.joint, bulge: first.bulge },
        { end: to, bulge: second.bulge },
      ];
    }
  }
  const straight = { a: track.at(from), b: track.at(to), bulge: 0 };
  return follows(track, straight, from, to, tolerance) ? [{ end: to, bulge: 0 }] : null;
}

const distance = (a: Point, b: Point): number => Math.hypot(b.x - a.x, b.y - a.y);

function flattened(arc: Arc, tolerance: number): Arc {
  return arcHeight(arc) <= FLAT_SHARE * tolerance ? { ...arc, bulge: 0 } : arc;
}

function follows(track: Track, arc: Arc, from: number, to: number, tolerance: number): boolean {
  for (let i = 1; i < SEARCH_SAMPLES; i += 1) {
    if (arcDistance(track.at(placeAt(from, to, i / SEARCH_SAMPLES)), arc) > tolerance) return false;
  }
  return true;
}

/** Places between two, closer to each other at both ends, where the outline may bend fast. */
function placeAt(from: number, to: number, share: number): number {
  return from + ((to - from) * (1 - Math.cos(Math.PI * share))) / 2;
}

function assemble(track: Track, pieces: readonly Piece[], sharp: boolean): ArcContour {
  const ends = sharp ? pieces.slice(0, -1) : pieces;
  const place = Float64Array.from([-1, ...ends.map(({ end }) => end)]);
  const points = Array.from(place, (at) => track.at(at));
  const bulges = pieces.map(({ bulge }) => bulge);
  return {
    x: Float64Array.from(points, ({ x }) => x),
    y: Float64Array.from(points, ({ y }) => y),
    bulge: Float64Array.from(sharp ? bulges : [...bulges, 0]),
    place,
    sharp,
  };
}

/** The arcs with the places of their ends; the base of a blunt trailing edge has both at 1. */
function arcsOf({ x, y, bulge, place }: ArcContour) {
  return Array.from(x, (_, i) => {
    const next = (i + 1) % x.length;
    const arc: Arc = {
      a: { x: x[i] ?? 0, y: y[i] ?? 0 },
      b: { x: x[next] ?? 0, y: y[next] ?? 0 },
      bulge: bulge[i] ?? 0,
    };
    return { arc, from: place[i] ?? 0, to: next === 0 ? 1 : (place[next] ?? 0) };
  });
}

/** Largest value of `error` between two places: dense sampling, then golden section about the largest sample. */
function peakBetween(error: (place: number) => number, from: number, to: number): number {
  const at = (i: number) => placeAt(from, to, i / CHECK_SAMPLES);
  let [largest, peak] = [0, 1];
  for (let i = 1; i < CHECK_SAMPLES; i += 1) {
    const value = error(at(i));
    if (value > largest) [largest, peak] = [value, i];
  }
  const [low, high] = [at(peak - 1), at(peak + 1)];
  const precision = Math.max((high - low) * PEAK_PRECISION, SMALLEST_STEP);
  return Math.max(largest, goldenMaximum(error, low, high, precision).value);
}
