import { type Point } from '../point.ts';
import { elevate, halve } from './bernstein.ts';
import { type CstShape } from './cst-schema.ts';
import { type Naca4Shape, naca4Outline } from './naca4.ts';
import { parameterOf } from './outline.ts';
import { crossesItself } from './self-crossing.ts';

/** Halvings after which a piece is given up as touching: 2⁻³² of the chord. */
const DEEPEST = 32;

/**
 * A station (0 … 1) at which the surfaces of a CST shape cross or touch between nose and trailing edge, or null when the thickness is
 * positive all along.
 *
 * The thickness is C(x) D(x) + x·gap, D the difference of both shape functions in Bernstein form. A Bernstein polynomial lies between
 * its smallest and largest weight (convex hull property), so a piece whose bound is positive is proven free; a piece that is negative
 * at an end is proven crossed; any other is halved. No crossing can slip between samples.
 */
export function cstCrossing(shape: CstShape): number | null {
  let upper = shape.upper;
  let lower = shape.lower;
  while (upper.length < lower.length) upper = elevate(upper);
  while (lower.length < upper.length) lower = elevate(lower);
  const difference = upper.map((weight, i) => weight - (lower[i] ?? 0));
  return crossingWithin(shape, difference, 0, 1, 0);
}

type Gap = Pick<CstShape, 'n1' | 'n2' | 'trailingEdgeGap'>;

function crossingWithin(
  shape: Gap,
  weights: readonly number[],
  from: number,
  to: number,
  depth: number,
): number | null {
  const gap = shape.trailingEdgeGap;
  if (isCrossed(shape, weights[0] ?? 0, from)) return from;
  if (isCrossed(shape, weights.at(-1) ?? 0, to)) return to;
  const least = Math.min(...weights);
  if (least > 0 || (least === 0 && (gap > 0 || weights.some((weight) => weight > 0)))) return null;
  if (gap > 0 && least * largestClassValue(shape, from, to) + from * gap > 0) return null;
  const middle = (from + to) / 2;
  if (depth === DEEPEST || weights.every((weight) => weight === 0)) return middle;
  const { left, right } = halve(weights);
  return (
    crossingWithin(shape, left, from, middle, depth + 1) ??
    crossingWithin(shape, right, middle, to, depth + 1)
  );
}

/** Negative thickness at a station; between the ends, none at all counts as well. */
function isCrossed(shape: Gap, difference: number, station: number): boolean {
  const sign = thicknessSign(shape, difference, station);
  return sign < 0 || (sign === 0 && station > 0 && station < 1);
}

/** The sign of the thickness just inside the section at a station: at the ends, where the class function vanishes, of what leads. */
function thicknessSign(shape: Gap, difference: number, station: number): number {
  const { n1, n2, trailingEdgeGap: gap } = shape;
  const atNose = station === 0;
  if (gap === 0 || (atNose && n1 < 1)) return Math.sign(difference);
  if (atNose) return Math.sign(difference + gap);
  return Math.sign(difference * Math.pow(station, n1) * Math.pow(1 - station, n2) + station * gap);
}

/** Largest x^n1 (1−x)^n2 on an interval; its one maximum lies at n1/(n1+n2). */
function largestClassValue({ n1, n2 }: Gap, from: number, to: number): number {
  const x = Math.min(to, Math.max(from, n1 / (n1 + n2)));
  return Math.pow(x, n1) * Math.pow(1 - x, n2);
}

/** Points per surface with which a strongly bent 4-digit outline is tested against itself, and stations tested for folding. */
const POINTS = 200;

/** What a thick 4-digit section with much camber far forward or aft does on its lower side: it folds back, or crosses itself. */
type Naca4Fault = 'folds' | 'crosses';

/**
 * Whether the lower surface of a 4-digit shape folds back (its station decreases on the way aft, so that no thickness is defined there)
 * or the outline crosses itself; null for a sound outline.
 *
 * With θ the slope angle of the mean line, the lower surface's station is x + yt sin θ. The mean line is concave, turns by less than a
 * half turn and has no bottleneck, so the thickness laid off square to it cannot cross while it stays below the radius of curvature
 * everywhere. Only when it does not, the drawn outline itself is tested, segment against segment.
 */
export function naca4Fault(shape: Naca4Shape): Naca4Fault | null {
  const { maxCamber: m, maxCamberPosition: p } = shape;
  if (m === 0) return null;
  const { lower } = naca4Outline(shape);
  const peak = parameterOf(p);
  for (let i = 1; i < POINTS; i++) {
    if (lower.derivatives(i / POINTS).dx < 0) return 'folds';
  }
  if (lower.derivatives(peak - BESIDE).dx < 0 || lower.derivatives(peak + BESIDE).dx < 0) return 'folds';
  const largestCurvature = Math.max((2 * m) / (p * p), (2 * m) / ((1 - p) * (1 - p)));
  const mayCross = 0.51 * shape.maxThickness * largestCurvature >= 1;
  return mayCross && crossesItself(outlinePolygon(shape)) ? 'crosses' : null;
}

/** How far beside the camber position, in t, the jump of the curvature is looked at from either side. */
const BESIDE = 1e-9;

function outlinePolygon(shape: Naca4Shape): Point[] {
  const { upper, lower } = naca4Outline(shape);
  const parameters = Array.from({ length: POINTS }, (_, i) => i / (POINTS - 1));
  return [
    ...[...parameters].reverse().map((t) => upper.at(t)),
    ...parameters.slice(1).map((t) => lower.at(t)),
  ];
}
