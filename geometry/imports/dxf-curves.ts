import { type Point } from '../point.ts';

/** A circular arc: counter-clockwise from the start angle (radians) for a positive sweep. */
export interface CircularArc {
  readonly centre: Point;
  readonly radius: number;
  readonly start: number;
  readonly sweep: number;
}

/** The longest step along an arc, whatever the tolerance: 10°. */
const LONGEST_STEP = Math.PI / 18;
const MOST_STEPS = 720;

/**
 * Points on an arc, both ends included, so close that the chords stay within a tolerance.
 * @param tolerance above 0, in the unit of the radius
 */
export function arcPoints({ centre, radius, start, sweep }: CircularArc, tolerance: number): Point[] {
  // The height of an arc over its chord is r (1 − cos θ/2) = 2 r sin² θ/4.
  const step = Math.min(LONGEST_STEP, 4 * Math.asin(Math.min(1, Math.sqrt(tolerance / (2 * radius)))));
  const steps = Math.max(2, Math.min(MOST_STEPS, Math.ceil(Math.abs(sweep) / step)));
  return Array.from({ length: steps + 1 }, (_, i) => {
    const angle = start + (sweep * i) / steps;
    return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) };
  });
}

/**
 * The arc from a to b with a bulge, the tangent of a quarter of its angle, positive to the left of the way (DXF reference, LWPOLYLINE).
 * @param bulge not 0
 */
export function bulgeArc(a: Point, b: Point, bulge: number): CircularArc {
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  // From the middle of the chord to the centre: half the chord times the cotangent of half the angle, (1 − b²)/(2b).
  const offset = (1 - bulge * bulge) / (4 * bulge);
  const centre = { x: (a.x + b.x) / 2 - offset * dy, y: (a.y + b.y) / 2 + offset * dx };
  return {
    centre,
    radius: Math.hypot(a.x - centre.x, a.y - centre.y),
    start: Math.atan2(a.y - centre.y, a.x - centre.x),
    sweep: 4 * Math.atan(bulge),
  };
}

/** A B-spline curve as a drawing holds it. */
export interface NurbsCurve {
  readonly degree: number;
  /** Not falling, as many as control points plus degree plus one. */
  readonly knots: readonly number[];
  readonly control: readonly Point[];
  /** Above 0, one for each control point. */
  readonly weights: readonly number[];
}

/** The point of a B-spline curve at u, by de Boor's recursion in homogeneous coordinates (textbook: Piegl & Tiller, The NURBS Book). */
export function nurbsPoint({ degree, knots, control, weights }: NurbsCurve, span: number, u: number): Point {
  const working = Array.from({ length: degree + 1 }, (_, k) => {
    const index = span - degree + k;
    const [point, weight] = [control[index] ?? { x: 0, y: 0 }, weights[index] ?? 1];
    return { x: point.x * weight, y: point.y * weight, w: weight };
  });
  for (let level = 1; level <= degree; level++) {
    for (let k = degree; k >= level; k--) {
      const i = span - degree + k;
      const [low, high] = [knots[i] ?? 0, knots[i + degree - level + 1] ?? 0];
      const share = high > low ? (u - low) / (high - low) : 0;
      const [a, b] = [working[k - 1], working[k]];
      if (!a || !b) continue;
      working[k] = {
        x: (1 - share) * a.x + share * b.x,
        y: (1 - share) * a.y + share * b.y,
        w: (1 - share) * a.w + share * b.w,
      };
    }
  }
  const { x, y, w } = working[degree] ?? { x: 0, y: 0, w: 1 };
  return { x: x / w, y: y / w };
}

/** Pieces that each span is looked at in before it is refined, so that no turn hides between two of them. */
const FIRST_PIECES = 4;
const MOST_HALVINGS = 8;

/**
 * Points along a B-spline curve, both ends included: each span is halved until the chords stay within a tolerance.
 * @param tolerance above 0, in the unit of the control points
 * @param most the sampling ends after so many points
 */
export function nurbsPoints(curve: NurbsCurve, tolerance: number, most: number): Point[] {
  const { degree, knots, control } = curve;
  const points: Point[] = [];
  for (let span = degree; span < control.length && points.length <= most; span++) {
    const [from, to] = [knots[span] ?? 0, knots[span + 1] ?? 0];
    if (!(to > from)) continue;
    const at = (u: number) => nurbsPoint(curve, span, u);
    for (let piece = 0; piece < FIRST_PIECES; piece++) {
      const [u0, u1] = [piece, piece + 1].map((k) => from + ((to - from) * k) / FIRST_PIECES);
      const [a, b] = [at(u0 ?? from), at(u1 ?? to)];
      if (points.length === 0) points.push(a);
      refine(at, { u: u0 ?? from, point: a }, { u: u1 ?? to, point: b }, MOST_HALVINGS);
    }
  }
  return points;

  function refine(at: (u: number) => Point, a: Place, b: Place, halvings: number): void {
    const u = (a.u + b.u) / 2;
    const middle = { u, point: at(u) };
    if (halvings === 0 || points.length > most || heightOver(a.point, b.point, middle.point) <= tolerance) {
      points.push(b.point);
      return;
    }
    refine(at, a, middle, halvings - 1);
    refine(at, middle, b, halvings - 1);
  }
}

interface Place {
  readonly u: number;
  readonly point: Point;
}

/** Distance of a point from the middle of a chord, square to it, or from an end when the chord has no length. */
function heightOver(a: Point, b: Point, p: Point): number {
  const length = Math.hypot(b.x - a.x, b.y - a.y);
  if (length === 0) return Math.hypot(p.x - a.x, p.y - a.y);
  return Math.abs((b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x)) / length;
}
