import { shapeError } from '../shapes/error.ts';
import { type Outline, type SurfaceCurve } from '../shapes/outline.ts';
import { arcError, bestDivision, inflectionsOf } from './arc-error.ts';
import { type Contour, contourAt } from './contour.ts';

/** Accepted tolerances in fractions of chord: from 0.01 µm on a metre of chord to a tenth of the chord. */
export const TOLERANCE_FRACTION = { min: 1e-8, max: 0.1 } as const;

/** Share of the tolerance that is used, so that rounding in the search never exceeds it. */
const USED = 1 - 1e-6;
/** The reach is accepted when the error lies between this share of the tolerance and the whole. */
const FILLED = 1 - 1e-6;

/**
 * Samples the outline with the fewest points whose segments stay within a chordal tolerance. Nose and trailing edge are vertices, every
 * vertex lies on the true outline, and each surface has at least one vertex between its ends.
 *
 * Each piece is walked from the nose, each segment reaching as far as the tolerance allows. Why this is fewest: on a convex arc that
 * turns by no more than a right angle the error never grows when the arc is shortened. (Keep one end, pull the other in: the chord
 * turns about the kept end towards the arc, and each point's distance, its distance from the kept end times the sine of an angle that
 * only shrinks below 90°, shrinks too.) So if any other choice of vertices reaches v₁ < v₂ < …, the walk's k-th vertex is never short of
 * v_k: it starts at or beyond v_(k−1), and the arc from there to v_k is part of one that holds. A corner
 * that turns the same way changes nothing in this. At an inflection, or a corner that turns against the bend, the argument ends; so the walk
 * is done twice, once with these as fixed vertices (fewest under that condition) and once straight across them, and the shorter
 * list is taken. "As far as the tolerance allows" is met to two millionths of the tolerance.
 *
 * @param toleranceFraction chordal tolerance in fractions of chord (tolerance in mm / chord in mm), 1e-8 … 0.1
 * @throws ShapeError when the tolerance is out of range
 */
export function sampleToTolerance(outline: Outline, toleranceFraction: number): Contour {
  const { min, max } = TOLERANCE_FRACTION;
  if (!(toleranceFraction >= min && toleranceFraction <= max)) {
    throw shapeError('tolerance', `tolerance must be between ${min} and ${max} of chord`);
  }
  return contourAt(
    outline,
    fewestParameters(outline.upper, toleranceFraction),
    fewestParameters(outline.lower, toleranceFraction),
  );
}

function fewestParameters(surface: SurfaceCurve, tolerance: number): number[] {
  const inflections = inflectionsOf(surface);
  const across = walk(surface, [0, 1], inflections, tolerance);
  const kept =
    inflections.length === 0 ? across : walk(surface, [0, ...inflections, 1], inflections, tolerance);
  const fewest = kept.length < across.length ? kept : across;
  return fewest.length > 2 ? fewest : [0, bestDivision(surface, inflections), 1];
}

/** The vertices of the walk through pieces whose ends are fixed. */
function walk(
  surface: SurfaceCurve,
  ends: readonly number[],
  inflections: readonly number[],
  tolerance: number,
): number[] {
  const vertices = [0];
  let t = 0;
  let stride = 0.05;
  for (const end of ends.slice(1)) {
    while (t < end) {
      const next = longestReach(surface, t, end, stride, inflections, tolerance);
      stride = next - t;
      t = next;
      vertices.push(t);
    }
  }
  return vertices;
}

/** The furthest t up to `end` whose chord from `from` holds the tolerance: bracketed from the last stride, then a secant on the square root of the error. */
function longestReach(
  surface: SurfaceCurve,
  from: number,
  end: number,
  stride: number,
  inflections: readonly number[],
  tolerance: number,
): number {
  const allowed = tolerance * USED;
  const errorAt = (t: number) => arcError(surface, from, t, inflections);
  let good = from;
  let goodError = 0;
  let bad = Math.min(end, from + stride);
  let badError = errorAt(bad);
  while (badError <= allowed) {
    if (bad === end) return end;
    [good, goodError] = [bad, badError];
    bad = Math.min(end, from + 1.5 * (bad - from));
    badError = errorAt(bad);
  }
  while (goodError < allowed * FILLED && bad - good > 1e-13) {
    // The error of a short arc grows as the square of its length, so its root is nearly a straight line in t.
    const [g, b] = [Math.sqrt(goodError), Math.sqrt(badError)];
    const share = Number.isFinite(b) ? (Math.sqrt(allowed * (1 - FILLED_HALF)) - g) / (b - g) : 0.5;
    const t = good + Math.min(0.95, Math.max(0.05, share)) * (bad - good);
    const error = errorAt(t);
    if (error <= allowed) [good, goodError] = [t, error];
    else [bad, badError] = [t, error];
  }
  return good > from ? good : bad;
}

/** Aims the secant into the middle of the accepted band. */
const FILLED_HALF = (1 - FILLED) / 2;
