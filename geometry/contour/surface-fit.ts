import { CST_LIMITS, type CstShape, type Surface } from '../shapes/cst.ts';
import { weightInfluence } from '../shapes/cst-weights.ts';
import { leastSquares } from '../shapes/least-squares.ts';
import { parameterOf } from '../shapes/outline.ts';
import { modelTolerance } from './model-tolerance.ts';
import { type ChordPoint } from './point-residuals.ts';

/** One surface prepared for fitting: its points between nose and trailing edge. */
export interface Rows {
  readonly stations: Float64Array;
  /** Ordinates without the trailing-edge term. */
  readonly ordinates: Float64Array;
  readonly weights: Float64Array;
  /** By how much an error of the ordinate counts against the tolerance. */
  readonly shares: Float64Array;
}

/** Rows taken of each surface: more would not change the fit. */
const MOST_ROWS = 400;

/**
 * The points of one surface between nose and trailing edge, made ready for fits.
 * @param points in order, seen from the chord
 * @param gap of the trailing edge, fractions of chord
 */
export function rowsOf(points: readonly ChordPoint[], surface: Surface, gap: number): Rows {
  const stride = Math.ceil(points.length / 2 / MOST_ROWS);
  const rows = points.flatMap((point, i) => {
    if (point.surface !== surface || !(point.x > 0 && point.x < 1) || i % stride !== 0) return [];
    const [before, after] = [points[i - 1] ?? point, points[i + 1] ?? point];
    const [dx, dy] = [after.x - before.x, after.y - before.y];
    // An ordinate off by e lies e cos θ off, square to the contour.
    const share = Math.abs(dx) / Math.hypot(dx, dy) / modelTolerance(point.x);
    const stretch = Math.abs(parameterOf(after.x) - parameterOf(before.x));
    const halfGap = surface === 'upper' ? gap / 2 : -gap / 2;
    return [
      { station: point.x, ordinate: point.y - point.x * halfGap, share, weight: share * Math.sqrt(stretch) },
    ];
  });
  return {
    stations: Float64Array.from(rows, ({ station }) => station),
    ordinates: Float64Array.from(rows, ({ ordinate }) => ordinate),
    weights: Float64Array.from(rows, ({ weight }) => weight),
    shares: Float64Array.from(rows, ({ share }) => share),
  };
}

/** Class exponents of a round nose and a pointed or blunt trailing edge (Kulfan & Bussoletti, AIAA 2006-6948). */
export const EXPONENTS = { n1: 0.5, n2: 1 } as const;

function influences(order: number, stations: Float64Array): Float64Array[] {
  const weights = new Array<number>(order + 1).fill(0);
  const unit: CstShape = { kind: 'cst', upper: weights, lower: weights, trailingEdgeGap: 0, ...EXPONENTS };
  return weights.map((_, i) => stations.map((x) => weightInfluence(unit, 'upper', i, x)));
}

/** Weights of one surface and how they follow its points. */
export interface SurfaceFit {
  readonly weights: number[];
  /** The largest error of an ordinate, as a share of the tolerance. */
  readonly share: number;
}

/**
 * Bernstein weights of one surface by least squares, each point weighted by its tolerance and the stretch it stands for.
 * @param order 2 … 12
 * @returns null when the points do not determine the weights
 */
export function fitSurface(rows: Rows, order: number): SurfaceFit | null {
  const columns = influences(order, rows.stations);
  const weigh = (values: Float64Array) => values.map((value, j) => value * (rows.weights[j] ?? 0));
  const weights = leastSquares(columns.map(weigh), weigh(rows.ordinates));
  if (!weights) return null;
  let share = 0;
  rows.ordinates.forEach((ordinate, j) => {
    const fitted = weights.reduce((sum, weight, i) => sum + weight * (columns[i]?.[j] ?? 0), 0);
    share = Math.max(share, Math.abs(fitted - ordinate) * (rows.shares[j] ?? 0));
  });
  return { weights, share };
}

/** An automatic order leaves so many points for each weight, so that the curve does not swing between them. */
const POINTS_PER_WEIGHT = 1.5;
/** An error of ordinates that may turn out within tolerance once it is taken square to the contour. */
const NEARLY = 1.5;

/** Fits of one surface in the order of their order; the rung is the one in use. */
export interface Ladder {
  readonly fits: readonly { readonly order: number; readonly fit: SurfaceFit }[];
  rung: number;
}

/** The fits of one surface from low to high order, beginning at the first that comes near the tolerance. */
export function ladderOf(rows: Rows): Ladder | null {
  const { min, max } = CST_LIMITS.order;
  const highest = Math.min(max, Math.floor(rows.stations.length / POINTS_PER_WEIGHT) - 1);
  const fits = [];
  for (let order = min; order <= Math.max(min, highest); order++) {
    const fit = rows.stations.length > order ? fitSurface(rows, order) : null;
    if (fit) fits.push({ order, fit });
    if (fit && fit.share < 0.5) break;
  }
  if (fits.length === 0) return null;
  const near = fits.findIndex(({ fit }) => fit.share <= NEARLY);
  return { fits, rung: near < 0 ? 0 : near };
}
