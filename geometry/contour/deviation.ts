import { type Point } from '../point.ts';
import { type Surface } from '../shapes/cst.ts';
import { shapeError } from '../shapes/error.ts';
import { type Outline } from '../shapes/outline.ts';
import { chordLineOf, stationOn } from './chord-line.ts';
import { type Loop, loopOf, nearestOn, outwardNormal } from './loop.ts';

/**
 * How two outlines are laid on each other. `chord`: nose and middle of the trailing edge on each other, turned and scaled to it;
 * `leading-edge`: the noses on each other; `quarter-chord`: the points at 25 % of the chord lines on each other; `sheet`: as they lie.
 */
export const ALIGNMENTS = ['chord', 'leading-edge', 'quarter-chord', 'sheet'] as const;
export type Alignment = (typeof ALIGNMENTS)[number];

/** How far one outline lies from another at one place. */
export interface ContourDeviation {
  readonly surface: Surface;
  /** Along the first outline's chord line, 0 … 1. */
  readonly station: number;
  /** The place on the first outline. */
  readonly at: Point;
  /** The first outline's unit normal there, outward. */
  readonly normal: Point;
  /** Along that normal, fractions of chord; positive where the second outline lies outside the first. */
  readonly deviation: number;
}

export interface OutlineDeviation {
  /** Upper trailing edge → nose → lower trailing edge, at equal steps of t. */
  readonly places: readonly ContourDeviation[];
  /** The largest in size, and the largest to either side; null when there is none on that side. */
  readonly largest: ContourDeviation;
  readonly largestOutside: ContourDeviation | null;
  readonly largestInside: ContourDeviation | null;
}

/** Fewest and most places on a surface, nose and trailing edge counted. */
export const DEVIATION_PLACES = { min: 5, max: 1000, usual: 121 } as const;

/**
 * The deviation of a second outline from a first, square to the first, along its contour.
 *
 * The line along the normal is met with the second outline by Newton's method from its nearest point. Where that line passes it by
 * (about a trailing edge that lies elsewhere), the nearest point stands for it, or at an end of the second outline its distance in the
 * direction of the normal.
 * @param placesPerSurface 5 … 1000
 * @throws ShapeError when the number of places is out of range
 */
export function deviationOf(
  first: Outline,
  second: Outline,
  alignment: Alignment,
  placesPerSurface: number = DEVIATION_PLACES.usual,
): OutlineDeviation {
  const { min, max } = DEVIATION_PLACES;
  if (!Number.isInteger(placesPerSurface) || placesPerSurface < min || placesPerSurface > max) {
    throw shapeError('placesPerSurface', `placesPerSurface must be a whole number between ${min} and ${max}`);
  }
  const line = chordLineOf(first);
  const [own, other] = [loopOf(first), movedLoop(loopOf(second), alignmentOf(first, second, alignment))];
  const near = nearTable(other);
  const last = placesPerSurface - 1;
  const places = Array.from({ length: 2 * last + 1 }, (_, i): ContourDeviation => {
    const w = (last - i) / last;
    const { x, y } = own(w);
    const [at, normal] = [{ x, y }, outwardNormal(own, w)];
    const deviation = along(other, at, normal, nearestIn(near, at));
    return { surface: w >= 0 ? 'upper' : 'lower', station: stationOn(line, at), at, normal, deviation };
  });
  const [outside, inside] = [extreme(places, 1), extreme(places, -1)];
  const largest = (outside?.deviation ?? 0) >= -(inside?.deviation ?? 0) ? outside : inside;
  const [none] = places;
  if (!none) throw shapeError('placesPerSurface', 'there are no places');
  return { places, largest: largest ?? none, largestOutside: outside, largestInside: inside };
}

/** The place with the largest deviation of a sign; null when none has that sign. */
function extreme(places: readonly ContourDeviation[], sign: 1 | -1): ContourDeviation | null {
  let best: ContourDeviation | null = null;
  for (const place of places) {
    if (sign * place.deviation > (best ? sign * best.deviation : 0)) best = place;
  }
  return best;
}

/** x' = x + a·u − b·v, y' = y + b·u + a·v. */
interface Motion {
  readonly x: number;
  readonly y: number;
  readonly a: number;
  readonly b: number;
}

function movedLoop(loop: Loop, { x, y, a, b }: Motion): Loop {
  return (w) => {
    const p = loop(w);
    return {
      x: x + a * p.x - b * p.y,
      y: y + b * p.x + a * p.y,
      dx: a * p.dx - b * p.dy,
      dy: b * p.dx + a * p.dy,
      ddx: a * p.ddx - b * p.ddy,
      ddy: b * p.ddx + a * p.ddy,
    };
  };
}

/** Points of a second outline where they come to lie when it is laid on a first, for drawing both on each other. */
export function laidOn(
  first: Outline,
  second: Outline,
  alignment: Alignment,
  points: readonly Point[],
): Point[] {
  const { x, y, a, b } = alignmentOf(first, second, alignment);
  return points.map((p) => ({ x: x + a * p.x - b * p.y, y: y + b * p.x + a * p.y }));
}

/** The share of the chord line that is laid on its like. */
const LAID = { 'leading-edge': 0, 'quarter-chord': 0.25 } as const;

/** The motion that lays the second outline on the first. */
function alignmentOf(first: Outline, second: Outline, alignment: Alignment): Motion {
  if (alignment === 'sheet') return { x: 0, y: 0, a: 1, b: 0 };
  const [to, from] = [chordLineOf(first), chordLineOf(second)];
  if (alignment === 'chord') {
    const scale = to.length / from.length;
    const a = scale * (to.along.x * from.along.x + to.along.y * from.along.y);
    const b = scale * (to.along.y * from.along.x - to.along.x * from.along.y);
    return {
      x: to.nose.x - a * from.nose.x + b * from.nose.y,
      y: to.nose.y - b * from.nose.x - a * from.nose.y,
      a,
      b,
    };
  }
  const share = LAID[alignment];
  const point = ({ nose, along: { x, y }, length }: typeof to) => {
    return { x: nose.x + share * length * x, y: nose.y + share * length * y };
  };
  const [p, q] = [point(to), point(from)];
  return { x: p.x - q.x, y: p.y - q.y, a: 1, b: 0 };
}

const TABLE_STEPS = 160;

interface NearTable {
  readonly x: Float64Array;
  readonly y: Float64Array;
}

function nearTable(loop: Loop): NearTable {
  const points = Array.from({ length: 2 * TABLE_STEPS + 1 }, (_, i) => loop(i / TABLE_STEPS - 1));
  return { x: Float64Array.from(points, ({ x }) => x), y: Float64Array.from(points, ({ y }) => y) };
}

/** w of the point of the table that is nearest. */
function nearestIn({ x, y }: NearTable, at: Point): number {
  let [best, least] = [0, Infinity];
  for (let i = 0; i < x.length; i++) {
    const [dx, dy] = [(x[i] ?? 0) - at.x, (y[i] ?? 0) - at.y];
    const square = dx * dx + dy * dy;
    if (square < least) [best, least] = [i, square];
  }
  return best / TABLE_STEPS - 1;
}

const NEWTON_STEPS = 24;
/** Fractions of chord: the line along the normal is met. */
const MET = 1e-12;
/** A meeting farther than so many times the nearest point belongs to another part of the outline. */
const FARTHER = 3;
const END = 1 - 1e-9;

/** The way along a normal from a point to a loop. @param start w of about the nearest point */
function along(loop: Loop, at: Point, normal: Point, start: number): number {
  const nearest = nearestOn(loop, at, start);
  let w = nearest.w;
  for (let step = 0; step < NEWTON_STEPS; step++) {
    const p = loop(w);
    const [rx, ry] = [p.x - at.x, p.y - at.y];
    const across = rx * normal.y - ry * normal.x;
    const height = rx * normal.x + ry * normal.y;
    if (Math.abs(across) <= MET && Math.abs(height) <= FARTHER * nearest.distance + MET) return height;
    const slope = p.dx * normal.y - p.dy * normal.x;
    const next = Math.min(1, Math.max(-1, w - across / slope));
    if (!Number.isFinite(next) || next === w) break;
    w = next;
  }
  const foot = loop(nearest.w);
  const height = (foot.x - at.x) * normal.x + (foot.y - at.y) * normal.y;
  return Math.abs(nearest.w) >= END ? height : Math.sign(height) * nearest.distance;
}
