import { z } from 'zod';
import { type ShapeIssue } from './error.ts';
import { percent } from './fields.ts';
import { type CurvePoint, type Outline, type SurfaceCurve } from './outline.ts';
import { crossingSides } from './simple-polygon.ts';
import { type ParametricSpline, splineThrough } from './spline.ts';

/** The accepted ranges of a contour kept as points, in fractions of chord. */
export const MEASURED_LIMITS = {
  points: { min: 10, max: 2000 },
  x: { min: -0.05, max: 1.05 },
  y: { min: -0.5, max: 0.5 },
  /** How far nose and trailing edge may lie from the ends of the chord, (0, 0) and (1, 0). */
  chordEnds: 0.01,
  trailingEdgeGap: 0.1,
  /** Nearest neighbours. */
  apart: 1e-9,
} as const;

type Coordinates = z.ZodType<readonly number[], readonly number[]>;

function coordinates(axis: 'x' | 'y'): Coordinates {
  const { min, max } = MEASURED_LIMITS[axis];
  const { points } = MEASURED_LIMITS;
  const count = `a measured contour must have ${points.min} to ${points.max} points`;
  const range = `each ${axis} must be between ${percent(min)} % and ${percent(max)} % of chord`;
  const coordinate = z.number({ error: range }).min(min, { error: range }).max(max, { error: range });
  return z
    .array(coordinate, { error: count })
    .min(points.min, { error: count })
    .max(points.max, { error: count });
}

/**
 * A section kept as points, in fractions of chord: upper trailing edge → nose → lower trailing edge, the chord from (0, 0) to (1, 0).
 * A sharp trailing edge stands at both ends. The nose need not be one of the points: it is where the curve passes the origin.
 */
export const measuredSchema = z
  .strictObject({ kind: z.literal('measured'), x: coordinates('x'), y: coordinates('y') })
  .superRefine((shape, context) => {
    if (context.issues.length > 0) return;
    for (const { path, message } of measuredFaults(shape)) {
      context.addIssue({ code: 'custom', path: path.split('.'), message });
    }
  });

export type MeasuredShape = Readonly<z.infer<typeof measuredSchema>>;

/** "Measured contour, 159 points" */
export function describeMeasured({ x }: MeasuredShape): string {
  return `Measured contour, ${x.length} points`;
}

/** What is wrong with points whose number and ranges are in order. */
function measuredFaults({ x, y }: MeasuredShape): ShapeIssue[] {
  if (x.length !== y.length) {
    return [{ path: 'y', message: `y must have as many values as x: ${y.length} for ${x.length}` }];
  }
  const repeated = x.findIndex((_, i) => i > 0 && distance(x, y, i, i - 1) < MEASURED_LIMITS.apart);
  if (repeated > 0) {
    return [{ path: `x.${repeated}`, message: `point ${repeated + 1} repeats the one before` }];
  }
  return [...chordFaults({ kind: 'measured', x, y }), ...crossingFaults(x, y)];
}

function distance(x: readonly number[], y: readonly number[], i: number, k: number): number {
  return Math.hypot((x[i] ?? 0) - (x[k] ?? 0), (y[i] ?? 0) - (y[k] ?? 0));
}

function chordFaults(shape: MeasuredShape): ShapeIssue[] {
  const { x, y } = shape;
  const last = x.length - 1;
  const gap = distance(x, y, 0, last);
  const middle = { x: ((x[0] ?? 0) + (x[last] ?? 0)) / 2, y: ((y[0] ?? 0) + (y[last] ?? 0)) / 2 };
  const { spline, nose } = curveOf(shape);
  const noseAt = spline.at(nose);
  const { chordEnds, trailingEdgeGap } = MEASURED_LIMITS;
  if (Math.hypot(middle.x - 1, middle.y) > chordEnds)
    return [
      { path: 'x.0', message: 'the trailing edge must lie at 100 % of the chord, ends first and last' },
    ];
  if (gap > trailingEdgeGap) {
    const limit = percent(trailingEdgeGap);
    return [
      { path: `y.${last}`, message: `the trailing edge may be open by ${limit} % of chord at the most` },
    ];
  }
  if (Math.hypot(noseAt.x, noseAt.y) > chordEnds || nose <= 0 || nose >= spline.length)
    return [{ path: 'x', message: 'the nose must lie at the origin, between both surfaces' }];
  return turnsLeft(x, y)
    ? []
    : [
        {
          path: 'y',
          message: 'the points must run from the upper trailing edge round the nose to the lower',
        },
      ];
}

/** Whether the area enclosed is positive: counter-clockwise. */
function turnsLeft(x: readonly number[], y: readonly number[]): boolean {
  let twice = 0;
  x.forEach((from, i) => {
    const next = (i + 1) % x.length;
    twice += from * (y[next] ?? 0) - (x[next] ?? 0) * (y[i] ?? 0);
  });
  return twice > 0;
}

/** Looked at between two points of the contour, so that the drawn curve is judged and not the polygon alone. */
const CHECKS_PER_PIECE = 3;

function crossingFaults(x: readonly number[], y: readonly number[]): ShapeIssue[] {
  const spline = splineThrough(x, y);
  const px: number[] = [];
  const py: number[] = [];
  const sharp = x[0] === x.at(-1) && y[0] === y.at(-1);
  for (let i = 0; i + 1 < x.length; i++) {
    const [from, to] = [spline.knots[i] ?? 0, spline.knots[i + 1] ?? 0];
    for (let k = 0; k < CHECKS_PER_PIECE; k++) {
      const point = spline.at(from + ((to - from) * k) / CHECKS_PER_PIECE);
      px.push(point.x);
      py.push(point.y);
    }
  }
  if (!sharp) {
    px.push(x.at(-1) ?? 0);
    py.push(y.at(-1) ?? 0);
  }
  const found = crossingSides(px, py);
  if (!found) return [];
  const index = Math.min(x.length - 1, Math.floor(found[0] / CHECKS_PER_PIECE));
  const place = percent(x[index] ?? 0, 1);
  return [{ path: `y.${index}`, message: `the outline crosses or touches itself near ${place} % of chord` }];
}

interface Curve {
  readonly spline: ParametricSpline;
  /** s of the point nearest to the origin. */
  readonly nose: number;
}

const GOLDEN_STEPS = 60;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** The curve through the points and its nose: the point nearest to the origin, by golden section beside the nearest of the points. */
function curveOf({ x, y }: MeasuredShape): Curve {
  const spline = splineThrough(x, y);
  let nearest = 0;
  const reach = (i: number) => Math.hypot(x[i] ?? 0, y[i] ?? 0);
  for (let i = 1; i < x.length; i++) if (reach(i) < reach(nearest)) nearest = i;
  const knot = spline.knots[nearest] ?? 0;
  if (reach(nearest) === 0) return { spline, nose: knot };
  const square = (s: number) => {
    const point = spline.at(s);
    return point.x * point.x + point.y * point.y;
  };
  let low = spline.knots[Math.max(0, nearest - 1)] ?? 0;
  let high = spline.knots[Math.min(x.length - 1, nearest + 1)] ?? 0;
  for (let step = 0; step < GOLDEN_STEPS; step++) {
    const [c, d] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
    if (square(c) < square(d)) high = d;
    else low = c;
  }
  const found = (low + high) / 2;
  return { spline, nose: square(found) < square(knot) ? found : knot };
}

/**
 * The outline of a measured contour: the cubic spline through its points (see splineThrough), parted at the nose. The shape is taken as
 * valid (see measuredSchema). Curvature is continuous; it is as calm as the points are, for nothing is smoothed.
 */
export function measuredOutline(shape: MeasuredShape): Outline {
  const { spline, nose } = curveOf(shape);
  const upper = surfaceOf(spline, nose, 0);
  const lower = surfaceOf(spline, nose, spline.length);
  const [a, b] = [upper.at(1), lower.at(1)];
  return {
    upper,
    lower,
    sharp: a.x === b.x && a.y === b.y,
    meanLine: (station) => {
      const [u, l] = [ordinateNear(upper, station), ordinateNear(lower, station)];
      return { x: station, y: (u + l) / 2 };
    },
  };
}

const QUARTER = Math.PI / 2;
/** The station whose place along the surface sets how steps of t are spread. */
const MATCHED_STATION = 0.05;
/** Share of the round part at the nose in the length of a surface: at least so much that t stays regular there. */
const ROUND_SHARE = { min: 0.01, max: 0.9 } as const;

/**
 * A surface as a curve of t: the length from the nose is L (k u + (1 − k) u²) with u = sin(πt/2). About a round nose length goes as u
 * and further aft as the station u², so that with k from one matched station equal steps of t are nearly the cosine spacing.
 */
function surfaceOf(spline: ParametricSpline, nose: number, end: number): SurfaceCurve {
  const run = end - nose;
  const u0 = Math.sqrt(MATCHED_STATION);
  const share = (lengthTo(spline, nose, end, MATCHED_STATION) - MATCHED_STATION) / (u0 - MATCHED_STATION);
  const k = Math.min(ROUND_SHARE.max, Math.max(ROUND_SHARE.min, share));
  const place = (t: number) => {
    const u = Math.sin(QUARTER * t);
    return t === 1 ? end : nose + run * u * (k + (1 - k) * u);
  };
  const inside = Array.from(spline.knots).filter((s) => (s - nose) * (s - end) < 0);
  const knots = inside.map((s) => parameterAt((s - nose) / run, k));
  return {
    breaks: [],
    knots: run < 0 ? knots.reverse() : knots,
    at(t) {
      const { x, y } = spline.at(place(t));
      return { x, y };
    },
    derivatives(t): CurvePoint {
      const u = Math.sin(QUARTER * t);
      const u1 = QUARTER * Math.sin(QUARTER * (1 - t));
      const u2 = -QUARTER * QUARTER * u;
      const s1 = run * (k + 2 * (1 - k) * u) * u1;
      const s2 = run * ((k + 2 * (1 - k) * u) * u2 + 2 * (1 - k) * u1 * u1);
      const point = spline.at(place(t));
      return {
        x: point.x,
        y: point.y,
        dx: point.dx * s1,
        dy: point.dy * s1,
        ddx: point.ddx * s1 * s1 + point.dx * s2,
        ddy: point.ddy * s1 * s1 + point.dy * s2,
      };
    },
  };
}

/** t at a share of the length: the positive root of k u + (1 − k) u² = share, written without cancellation. */
function parameterAt(share: number, k: number): number {
  const u = (2 * share) / (k + Math.sqrt(k * k + 4 * (1 - k) * share));
  return Math.asin(Math.min(1, u)) / QUARTER;
}

const HALVINGS = 50;

/** Share of a surface's length at which it reaches a station, by halving. */
function lengthTo(spline: ParametricSpline, nose: number, end: number, station: number): number {
  let [low, high] = [0, 1];
  for (let step = 0; step < HALVINGS; step++) {
    const middle = (low + high) / 2;
    if (spline.at(nose + (end - nose) * middle).x < station) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

function ordinateNear(surface: SurfaceCurve, station: number): number {
  let [low, high] = [0, 1];
  for (let step = 0; step < HALVINGS; step++) {
    const middle = (low + high) / 2;
    if (surface.at(middle).x < station) low = middle;
    else high = middle;
  }
  return surface.at(station >= 1 ? 1 : station <= 0 ? 0 : low).y;
}
