import { type Point } from '../point.ts';
import { type CurvePoint, type Outline, type SurfaceCurve, parameterOf } from '../shapes/outline.ts';
import { safeguardedRoot } from './roots.ts';

/**
 * The chord line of an outline: from the nose point, where the surfaces meet, to the middle of the trailing edge. Stations are
 * measured along it in fractions of its length, ordinates square to it in fractions of the sheet's chord.
 */
interface ChordLine {
  readonly nose: Point;
  readonly length: number;
  /** Unit vector along the chord, towards the trailing edge. */
  readonly along: Point;
}

export function chordLineOf(outline: Outline): ChordLine {
  const nose = outline.upper.at(0);
  const [u, l] = [outline.upper.at(1), outline.lower.at(1)];
  const [dx, dy] = [(u.x + l.x) / 2 - nose.x, (u.y + l.y) / 2 - nose.y];
  const length = Math.hypot(dx, dy);
  return { nose, length, along: { x: dx / length, y: dy / length } };
}

/** Station of a point of the sheet. */
export function stationOn({ nose, length, along }: ChordLine, point: Point): number {
  return ((point.x - nose.x) * along.x + (point.y - nose.y) * along.y) / length;
}

/** Ordinate of a point of the sheet, square to the chord line. */
export function ordinateOn({ nose, along }: ChordLine, point: Point): number {
  return (point.y - nose.y) * along.x - (point.x - nose.x) * along.y;
}

/** A surface seen from the chord line: which part of it has one ordinate for each station. */
interface Side {
  readonly line: ChordLine;
  readonly surface: SurfaceCurve;
  /** t of its foremost point, 0 unless the nose reaches ahead of the chord line's end. */
  readonly foremost: number;
  /** Station and ordinate at the trailing edge. */
  readonly end: Point;
  /** Ordinate of the other surface's trailing edge and its station: where the trailing-edge face leads. */
  readonly otherEnd: Point;
}

const T_TOLERANCE = 1e-13;

/** Both surfaces seen from the chord line. */
export function sidesOf(outline: Outline): {
  readonly line: ChordLine;
  readonly upper: Side;
  readonly lower: Side;
} {
  const line = chordLineOf(outline);
  const [u, l] = [outline.upper.at(1), outline.lower.at(1)];
  const upperEnd = { x: stationOn(line, u), y: ordinateOn(line, u) };
  const lowerEnd = { x: stationOn(line, l), y: ordinateOn(line, l) };
  const side = (surface: SurfaceCurve, end: Point, otherEnd: Point): Side => {
    return { line, surface, foremost: foremostOf(line, surface), end, otherEnd };
  };
  return {
    line,
    upper: side(outline.upper, upperEnd, lowerEnd),
    lower: side(outline.lower, lowerEnd, upperEnd),
  };
}

function foremostOf({ along }: ChordLine, surface: SurfaceCurve): number {
  const slopeAt = ({ dx, dy, ddx, ddy }: CurvePoint) => ({
    value: dx * along.x + dy * along.y,
    slope: ddx * along.x + ddy * along.y,
  });
  if (slopeAt(surface.derivatives(0)).value > -1e-12) return 0;
  return safeguardedRoot((t) => slopeAt(surface.derivatives(t)), 0, 0.5, 0.01, T_TOLERANCE);
}

/** Ordinate of a surface at a station and its slope there (infinite slopes never come out: the nose itself is nudged by rounding). */
export interface Ordinate {
  readonly ordinate: number;
  readonly slope: number;
}

/**
 * The ordinate of a surface at a station, found by solving station(t) = station with Newton's method, safeguarded by bisection.
 * Behind the end of a surface whose blunt trailing edge stands oblique, the ordinate is that of the trailing-edge face.
 * @param station 0 … 1
 */
export function ordinateAtStation(side: Side, station: number): Ordinate {
  const { line, end, otherEnd } = side;
  if (station >= end.x) return faceOrdinate(end, otherEnd, station);
  const point = pointAtStation(side, station);
  const run = point.dx * line.along.x + point.dy * line.along.y;
  const rise = point.dy * line.along.x - point.dx * line.along.y;
  return { ordinate: ordinateOn(line, point), slope: run === 0 ? 0 : (rise / run) * line.length };
}

function faceOrdinate(end: Point, otherEnd: Point, station: number): Ordinate {
  const run = otherEnd.x - end.x;
  if (run <= 0) return { ordinate: end.y, slope: 0 };
  const slope = (otherEnd.y - end.y) / run;
  return { ordinate: end.y + slope * (station - end.x), slope };
}

/** The point of a surface at a station that it reaches, on the part behind its foremost point. */
export function pointAtStation({ line, surface, foremost }: Side, station: number): CurvePoint {
  let point = surface.derivatives(foremost);
  const evaluate = (t: number) => {
    point = surface.derivatives(t);
    return {
      value: stationOn(line, point) - station,
      slope: (point.dx * line.along.x + point.dy * line.along.y) / line.length,
    };
  };
  safeguardedRoot(evaluate, foremost, 1, parameterOf(station), T_TOLERANCE);
  return point;
}
