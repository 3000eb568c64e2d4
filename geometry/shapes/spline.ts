import { type CurvePoint } from './outline.ts';

/** A smooth curve through points, as a function of the length s of the polygon through them: 0 at the first, `length` at the last. */
export interface ParametricSpline {
  readonly length: number;
  /** s of each point, ascending. */
  readonly knots: Float64Array;
  /** The point at s and its first and second derivatives with respect to s; s outside is taken as the nearest end. */
  at(s: number): CurvePoint;
}

/**
 * The parametric cubic spline through points, twice continuously differentiable, over the chord length of its polygon: textbook
 * (C. de Boor, A Practical Guide to Splines, on parametric spline curves). Each end piece keeps the second derivative of its inner
 * knot (a parabola), which stays calm where the spacing of the last points is uneven.
 * @param x,y three points or more, neighbours apart from each other
 */
export function splineThrough(x: ArrayLike<number>, y: ArrayLike<number>): ParametricSpline {
  const knots = chordLengths(x, y);
  const byX = pieces(knots, x);
  const byY = pieces(knots, y);
  const last = knots.length - 1;
  const length = knots[last] ?? 0;
  return {
    length,
    knots,
    at(s) {
      const place = Math.min(length, Math.max(0, s));
      const piece = pieceAt(knots, place);
      const u = place - (knots[piece] ?? 0);
      const k = 4 * piece;
      const [x1, x2, x3] = [byX[k + 1] ?? 0, byX[k + 2] ?? 0, byX[k + 3] ?? 0];
      const [y1, y2, y3] = [byY[k + 1] ?? 0, byY[k + 2] ?? 0, byY[k + 3] ?? 0];
      // At a knot its own coordinates, without the rounding of the polynomial of the piece before.
      const end = place === length;
      return {
        x: end ? (x[last] ?? 0) : (byX[k] ?? 0) + u * (x1 + u * (x2 + u * x3)),
        y: end ? (y[last] ?? 0) : (byY[k] ?? 0) + u * (y1 + u * (y2 + u * y3)),
        dx: x1 + u * (2 * x2 + 3 * u * x3),
        dy: y1 + u * (2 * y2 + 3 * u * y3),
        ddx: 2 * x2 + 6 * u * x3,
        ddy: 2 * y2 + 6 * u * y3,
      };
    },
  };
}

function chordLengths(x: ArrayLike<number>, y: ArrayLike<number>): Float64Array {
  const knots = new Float64Array(x.length);
  for (let i = 1; i < x.length; i++) {
    const step = Math.hypot((x[i] ?? 0) - (x[i - 1] ?? 0), (y[i] ?? 0) - (y[i - 1] ?? 0));
    knots[i] = (knots[i - 1] ?? 0) + step;
  }
  return knots;
}

/** The piece that s lies in, by halving. */
function pieceAt(knots: Float64Array, s: number): number {
  let [low, high] = [0, knots.length - 1];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((knots[middle] ?? 0) <= s) low = middle;
    else high = middle;
  }
  return low;
}

/** Four polynomial coefficients for each piece, in powers of the distance from its first knot. */
function pieces(knots: Float64Array, values: ArrayLike<number>): Float64Array {
  const second = secondDerivatives(knots, values);
  const result = new Float64Array(4 * (knots.length - 1));
  for (let i = 0; i + 1 < knots.length; i++) {
    const h = (knots[i + 1] ?? 0) - (knots[i] ?? 0);
    const [m, next] = [second[i] ?? 0, second[i + 1] ?? 0];
    const [from, to] = [values[i] ?? 0, values[i + 1] ?? 0];
    result.set([from, (to - from) / h - (h * (2 * m + next)) / 6, m / 2, (next - m) / (6 * h)], 4 * i);
  }
  return result;
}

/** Second derivatives at the knots, from the tridiagonal system of the inner ones (Thomas' elimination). */
function secondDerivatives(knots: Float64Array, values: ArrayLike<number>): Float64Array {
  const last = knots.length - 1;
  const second = new Float64Array(last + 1);
  const upper = new Float64Array(last + 1);
  for (let i = 1; i < last; i++) {
    const before = (knots[i] ?? 0) - (knots[i - 1] ?? 0);
    const after = (knots[i + 1] ?? 0) - (knots[i] ?? 0);
    const value = values[i] ?? 0;
    const bend = ((values[i + 1] ?? 0) - value) / after - (value - (values[i - 1] ?? 0)) / before;
    // At either end the unknown beyond equals its neighbour.
    let diagonal = 2 * (before + after) + (i === 1 ? before : 0) + (i === last - 1 ? after : 0);
    let right = 6 * bend;
    if (i > 1) {
      diagonal -= before * (upper[i - 1] ?? 0);
      right -= before * (second[i - 1] ?? 0);
    }
    upper[i] = after / diagonal;
    second[i] = right / diagonal;
  }
  for (let i = last - 2; i >= 1; i--) second[i] = (second[i] ?? 0) - (upper[i] ?? 0) * (second[i + 1] ?? 0);
  second[0] = second[1] ?? 0;
  second[last] = second[last - 1] ?? 0;
  return second;
}
