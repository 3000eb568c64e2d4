import { type Point } from '../point.ts';
import { splineThrough } from '../shapes/spline.ts';
import { type OrderedLoop } from './section-loop.ts';
import { ImportRefusal } from './refusal.ts';

/** What is known about the unit that an outline is drawn in. */
export interface SourceUnit {
  /** Millimetres in one unit; null when the file does not say. */
  readonly mm: number | null;
  /** What tells a chord of 100 mm from per cent of chord when the file says so. */
  readonly hundred: 'mm' | 'percent';
}

/** Points in fractions of chord and how they came to be so. */
export interface NormalisedPoints {
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly sourceChordMm: number | null;
  readonly notes: readonly string[];
}

/** Chords in mm that are taken for such. */
const CHORD_MM = { min: 10, max: 5000 } as const;
/** Chords that are taken for one. */
const UNIT_CHORD = { min: 0.5, max: 2 } as const;
const PERCENT = { value: 100, tolerance: 0.5 } as const;

/**
 * Lays an outline on the unit chord: the nose at (0, 0), the middle of the trailing edge at (1, 0).
 *
 * The nose is the point of the curve through the points farthest from the trailing edge. But an outline that has a point at the origin
 * and its trailing edge on the x axis already says which chord it means (that of a cambered 4-digit section is not its longest), and
 * keeps it.
 * @throws ImportRefusal when the trailing edge is open by more than a tenth of the chord
 */
export function normalise({ points }: OrderedLoop, unit: SourceUnit): NormalisedPoints {
  const [first, last] = [points[0], points.at(-1)];
  if (!first || !last) throw new ImportRefusal('too-few-points', 'The file holds no points.');
  const middle = { x: (first.x + last.x) / 2, y: (first.y + last.y) / 2 };
  const farthest = farthestFrom(middle, points);
  const chord = Math.hypot(middle.x - farthest.x, middle.y - farthest.y);
  refuseOpen(Math.hypot(first.x - last.x, first.y - last.y) / chord);
  const kept = ownChord(points, middle, chord);
  const nose = kept ?? farthest;
  const [dx, dy] = kept ? [middle.x, 0] : [middle.x - nose.x, middle.y - nose.y];
  const length = Math.hypot(dx, dy);
  const [ux, uy] = [dx / length, dy / length];
  const local = points.map(({ x, y }) => {
    const [px, py] = [x - nose.x, y - nose.y];
    return { x: (px * ux + py * uy) / length, y: (py * ux - px * uy) / length };
  });
  const scale = scaleOf(length, unit);
  const moved = Math.hypot(nose.x, nose.y) / length;
  return {
    x: local.map(({ x }) => x),
    y: local.map(({ y }) => y),
    sourceChordMm: scale.mm,
    notes: [
      ...rotationNote(uy, ux),
      ...(moved > 1e-9 ? [`moved the nose to the origin`] : []),
      ...scale.notes,
    ],
  };
}

const WIDEST_EDGE = 0.1;

function refuseOpen(gap: number): void {
  if (gap <= WIDEST_EDGE) return;
  const share = (100 * gap).toFixed(1);
  const message = `The trailing edge is open by ${share} % of chord; ${100 * WIDEST_EDGE} % is the most.`;
  throw new ImportRefusal('not-a-section', message);
}

/** Shares of the chord: a point is at the origin; the trailing edge lies on the axis; the chord is about the longest one. */
const OWN = { origin: 2e-6, axis: 1e-5, longest: 0.99 } as const;

function ownChord(points: readonly Point[], middle: Point, chord: number): Point | null {
  if (Math.abs(middle.y) > OWN.axis * chord || middle.x < OWN.longest * chord) return null;
  return points.find(({ x, y }) => Math.hypot(x, y) <= OWN.origin * chord) ?? null;
}

const GOLDEN_STEPS = 60;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** The point farthest from another on the smooth curve through points: beside the farthest of them, by golden section. */
function farthestFrom(from: Point, points: readonly Point[]): Point {
  const spline = splineThrough(
    points.map(({ x }) => x),
    points.map(({ y }) => y),
  );
  const distance = ({ x, y }: Point) => Math.hypot(x - from.x, y - from.y);
  let best = 0;
  points.forEach((point, i) => {
    if (distance(point) > distance(points[best] ?? from)) best = i;
  });
  let low = spline.knots[Math.max(0, best - 1)] ?? 0;
  let high = spline.knots[Math.min(points.length - 1, best + 1)] ?? 0;
  for (let step = 0; step < GOLDEN_STEPS; step++) {
    const [c, d] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
    if (distance(spline.at(c)) > distance(spline.at(d))) high = d;
    else low = c;
  }
  const { x, y } = spline.at((low + high) / 2);
  const vertex = points[best] ?? from;
  return distance({ x, y }) > distance(vertex) ? { x, y } : { x: vertex.x, y: vertex.y };
}

function rotationNote(uy: number, ux: number): string[] {
  const degrees = (Math.atan2(uy, ux) * 180) / Math.PI;
  const size = Math.abs(degrees);
  if (size < 1e-6) return [];
  const sense = degrees > 0 ? 'clockwise' : 'counter-clockwise';
  return [`rotated ${size < 0.01 ? size.toPrecision(1) : size.toFixed(2)}° ${sense}`];
}

/** A number in as few of six digits as say it. */
function short(value: number): string {
  return String(Number(value.toPrecision(6)));
}

function scaleOf(chord: number, unit: SourceUnit): { readonly mm: number | null; readonly notes: string[] } {
  const millimetres = (mm: number) => ({ mm, notes: [`scaled from ${short(mm)} mm chord`] });
  const within = (value: number, { min, max }: { min: number; max: number }) => value >= min && value <= max;
  if (unit.mm !== null && within(chord * unit.mm, CHORD_MM)) return millimetres(chord * unit.mm);
  if (within(chord, UNIT_CHORD)) {
    const exact = Math.abs(chord - 1) < 1e-9;
    return { mm: null, notes: exact ? [] : [`scaled from a chord of ${short(chord)}`] };
  }
  const hundred = Math.abs(chord - PERCENT.value) <= PERCENT.tolerance;
  if (unit.mm === null && hundred && unit.hundred === 'percent') {
    return { mm: null, notes: ['scaled from per cent of chord'] };
  }
  if (unit.mm === null && within(chord, CHORD_MM)) return millimetres(chord);
  return { mm: null, notes: [`scaled from a chord of ${short(chord)} in an unknown unit`] };
}
