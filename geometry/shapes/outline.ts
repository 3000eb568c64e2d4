import { type Point } from '../point.ts';

/** A point of a surface with its first and second derivatives with respect to the parameter t. */
export interface CurvePoint extends Point {
  readonly dx: number;
  readonly dy: number;
  readonly ddx: number;
  readonly ddy: number;
}

/**
 * One surface of a section as a smooth curve of t, from the nose (t = 0) to the trailing edge (t = 1).
 * The station runs as sin²(πt/2) = (1 − cos πt)/2, so that equal steps of t are the cosine spacing and the square root at a round
 * nose becomes a smooth function. At a pointed end (a closed trailing edge, a nose without radius) the first derivative vanishes.
 */
export interface SurfaceCurve {
  /** The point at t, 0 … 1. */
  at(t: number): Point;
  /** The point and its analytic derivatives at t, 0 … 1; always finite. */
  derivatives(t: number): CurvePoint;
  /**
   * Values of t, ascending and inside 0 … 1, where the curve is not smooth. At the camber position of a 4-digit section the curvature of the
   * mean line jumps; thickness laid off square to it then turns the surfaces by a small corner as well, unless the thickness is
   * largest just there (0.02° on 2412). Derivatives at a break are those of one of its sides.
   */
  readonly breaks: readonly number[];
  /**
   * Values of t, ascending and inside 0 … 1, at which one smooth piece goes over into the next, as the points of a contour kept as points;
   * absent where the curve is one formula. Between two of them the curve may bend differently from what lies beside.
   */
  readonly knots?: readonly number[];
}

/** The outline of a section: two surfaces that share the nose point at t = 0. */
export interface Outline {
  readonly upper: SurfaceCurve;
  readonly lower: SurfaceCurve;
  /** True when both surfaces end in the same point. */
  readonly sharp: boolean;
  /** The point of the mean camber line at a chord station 0 … 1, for drawing. */
  meanLine(station: number): Point;
}

/** The parameter t at which the station is `station` (0 … 1) when the surface follows sin²(πt/2) exactly. */
export function parameterOf(station: number): number {
  return (2 / Math.PI) * Math.asin(Math.sqrt(Math.min(1, Math.max(0, station))));
}

/** sin²(πt/2), the station that belongs to t. */
export function stationOf(t: number): number {
  const s = Math.sin((Math.PI / 2) * t);
  return s * s;
}
