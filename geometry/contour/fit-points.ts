import { CST_LIMITS, type CstShape, type Surface, cstOutline } from '../shapes/cst.ts';
import { weightInfluence } from '../shapes/cst-weights.ts';
import { ShapeError, shapeError } from '../shapes/error.ts';
import { leastSquares } from '../shapes/least-squares.ts';
import { parameterOf } from '../shapes/outline.ts';
import { checkShape } from '../shapes/shape.ts';
import { type FourDigitMatch, matchFourDigits } from './four-digit-match.ts';
import { type TrueChord } from './loop.ts';
import { modelTolerance, toleranceVerdict } from './model-tolerance.ts';
import {
  type ChordPoint,
  type ContourPoints,
  type PointResidual,
  SHEET_CHORD,
  largestOf,
  longestChordOf,
  pointsOnChord,
  residualsOf,
  shareOf,
} from './point-residuals.ts';

/** How the order of each surface is chosen: the lowest that meets the tolerance, or given, 2 … 12. */
export type FitOrder = 'auto' | { readonly upper: number; readonly lower: number };

export interface PointFitOptions {
  readonly order: FitOrder;
  /** Indices of points that are left out of fit and verdict. */
  readonly excluded?: readonly number[];
}

/** A free-form shape through the points of a contour, and how well it follows them. */
export interface PointFit {
  /** With a placement when its chord is not the line from (0, 0) to (1, 0). */
  readonly shape: CstShape;
  /** For every point, in the order of the contour; the deviation is positive where the fit lies outside the point. */
  readonly residuals: readonly PointResidual[];
  /** The largest deviation of the points that count. */
  readonly largest: PointResidual;
  /** Indices of the points that count and lie out of tolerance. */
  readonly outside: readonly number[];
  readonly met: boolean;
  readonly verdict: string;
  /** A 4-digit section within the tolerance, when there is one. */
  readonly fourDigit: FourDigitMatch | null;
}

/**
 * Fits a free-form shape to the points of a contour by least squares, each point weighted by the tolerance of wind-tunnel models at its
 * station and by the stretch of contour it stands for. Deviations are taken square to the contour.
 *
 * The fit is tried on the contour's own chord and on its longest, and the better one is kept: a cambered 4-digit nose reaches ahead of
 * x = 0, where no weights can follow it, while a free-form section has its nose just there.
 * @throws ShapeError when an order is out of range or the points are too few for it, or the shape is refused by checkShape
 */
export function fitPoints(contour: ContourPoints, options: PointFitOptions): PointFit {
  const excluded = new Set(options.excluded ?? []);
  const candidates = framesOf(contour).flatMap((chord): Candidate[] => {
    const frame = frameOf(contour, chord, excluded);
    const candidate = options.order === 'auto' ? lowestOrder(frame) : fitOrders(frame, options.order);
    return candidate instanceof ShapeError ? [] : [candidate];
  });
  const [first, second] = candidates;
  if (!first) throw refusalOf(contour, options.order, excluded);
  const { shape, residuals } = second && isBetter(second, first) ? second : first;
  const counted = residuals.filter((residual) => !residual.excluded);
  const largest = largestOf(residuals, 'size');
  if (!largest) throw shapeError('excluded', 'every point is left out');
  const outside = counted.filter((residual) => !residual.within).map(({ index }) => index);
  const points = { counted: counted.length, outside: outside.length, excluded: excluded.size };
  return {
    shape,
    residuals,
    largest,
    outside,
    met: outside.length === 0,
    verdict: toleranceVerdict(largest, points),
    fourDigit: matchFourDigits(contour, options.excluded ?? []),
  };
}

/** A nose this far ahead of the origin cannot be followed on the sheet's chord. */
const AHEAD = 1e-6;

function framesOf(contour: ContourPoints): readonly TrueChord[] {
  const longest = longestChordOf(contour);
  return contour.x.some((x) => x < -AHEAD) ? [longest] : [SHEET_CHORD, longest];
}

/** One surface prepared for fitting: its points between nose and trailing edge. */
interface Rows {
  readonly stations: Float64Array;
  /** Ordinates without the trailing-edge term. */
  readonly ordinates: Float64Array;
  readonly weights: Float64Array;
  /** By how much an error of the ordinate counts against the tolerance. */
  readonly shares: Float64Array;
}

interface Frame {
  readonly contour: ContourPoints;
  readonly chord: TrueChord;
  readonly points: readonly ChordPoint[];
  readonly excluded: ReadonlySet<number>;
  readonly gap: number;
  readonly upper: Rows;
  readonly lower: Rows;
}

interface Candidate {
  readonly shape: CstShape;
  readonly residuals: readonly PointResidual[];
  readonly share: number;
}

function frameOf(contour: ContourPoints, chord: TrueChord, excluded: ReadonlySet<number>): Frame {
  const points = pointsOnChord(contour, chord);
  const gap = Math.max(0, (points[0]?.y ?? 0) - (points.at(-1)?.y ?? 0));
  const used = points.filter(({ index }) => !excluded.has(index));
  const rows = (surface: Surface) => rowsOf(used, surface, gap);
  return { contour, chord, points, excluded, gap, upper: rows('upper'), lower: rows('lower') };
}

/** Rows taken of each surface: more would not change the fit. */
const MOST_ROWS = 400;

function rowsOf(points: readonly ChordPoint[], surface: Surface, gap: number): Rows {
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

const EXPONENTS = { n1: 0.5, n2: 1 } as const;

function influences(order: number, stations: Float64Array): Float64Array[] {
  const weights = new Array<number>(order + 1).fill(0);
  const unit: CstShape = { kind: 'cst', upper: weights, lower: weights, trailingEdgeGap: 0, ...EXPONENTS };
  return weights.map((_, i) => stations.map((x) => weightInfluence(unit, 'upper', i, x)));
}

interface SurfaceFit {
  readonly weights: number[];
  /** The largest error of an ordinate, as a share of the tolerance. */
  readonly share: number;
}

function fitSurface(rows: Rows, order: number): SurfaceFit | null {
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

function candidateOf(
  frame: Frame,
  upper: readonly number[],
  lower: readonly number[],
): Candidate | ShapeError {
  const { chord, contour, points, excluded } = frame;
  const { nose, rotationDeg, scale } = chord;
  const placement = chord === SHEET_CHORD ? {} : { placement: { ...nose, rotationDeg, scale } };
  try {
    const shape: CstShape = {
      ...{ kind: 'cst', upper, lower, ...EXPONENTS, trailingEdgeGap: frame.gap },
      ...placement,
    };
    checkShape(shape);
    const place = (i: number) => ({ x: contour.x[i] ?? 0, y: contour.y[i] ?? 0 });
    const residuals = residualsOf(cstOutline(shape), points, place, excluded);
    return { shape, residuals, share: shareOf(residuals) };
  } catch (error) {
    if (error instanceof ShapeError) return error;
    throw error;
  }
}

function fitOrders(frame: Frame, order: Exclude<FitOrder, 'auto'>): Candidate | ShapeError {
  const surfaces = (['upper', 'lower'] as const).map((surface) => {
    const refusal = orderRefusal(frame[surface], surface, order[surface]);
    return refusal ?? fitSurface(frame[surface], order[surface]) ?? tooAlike(surface);
  });
  const [upper, lower] = surfaces;
  if (!upper || upper instanceof ShapeError) return upper ?? tooAlike('upper');
  if (!lower || lower instanceof ShapeError) return lower ?? tooAlike('lower');
  return candidateOf(frame, upper.weights, lower.weights);
}

function tooAlike(surface: Surface): ShapeError {
  return shapeError(`order.${surface}`, `the points of the ${surface} surface do not determine this order`);
}

function orderRefusal(rows: Rows, surface: Surface, order: number): ShapeError | null {
  const { min, max } = CST_LIMITS.order;
  const path = `order.${surface}`;
  if (!Number.isInteger(order) || order < min || order > max) {
    return shapeError(path, `the order must be a whole number between ${min} and ${max}`);
  }
  const count = rows.stations.length;
  if (count > order) return null;
  return shapeError(
    path,
    `the ${surface} surface has ${count} points between its ends, too few for order ${order}`,
  );
}

/** The refusal of the first frame that can be tried. */
function refusalOf(contour: ContourPoints, order: FitOrder, excluded: ReadonlySet<number>): ShapeError {
  const [chord = SHEET_CHORD] = framesOf(contour);
  const frame = frameOf(contour, chord, excluded);
  const found = order === 'auto' ? lowestOrder(frame) : fitOrders(frame, order);
  return found instanceof ShapeError ? found : shapeError('', 'the points cannot be fitted');
}

/** An automatic order leaves so many points for each weight, so that the curve does not swing between them. */
const POINTS_PER_WEIGHT = 1.5;
/** An error of ordinates that may turn out within tolerance once it is taken square to the contour. */
const NEARLY = 1.5;

interface Ladder {
  readonly fits: readonly { readonly order: number; readonly fit: SurfaceFit }[];
  rung: number;
}

/** The fits of one surface from low to high order, beginning at the first that comes near the tolerance. */
function ladderOf(rows: Rows): Ladder | null {
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

/** The lowest order of each surface that meets the tolerance; the order that comes nearest to it when none does. */
function lowestOrder(frame: Frame): Candidate | ShapeError {
  const ladders = { upper: ladderOf(frame.upper), lower: ladderOf(frame.lower) };
  const { upper, lower } = ladders;
  if (!upper) return tooFew(frame.upper, 'upper');
  if (!lower) return tooFew(frame.lower, 'lower');
  let best: Candidate | ShapeError | null = null;
  for (;;) {
    const weights = (ladder: Ladder) => ladder.fits[ladder.rung]?.fit.weights ?? [];
    const found = candidateOf(frame, weights(upper), weights(lower));
    if (
      !best ||
      (!(found instanceof ShapeError) && (best instanceof ShapeError || found.share < best.share))
    ) {
      best = found;
    }
    if (!(found instanceof ShapeError) && found.share <= 1) return found;
    const higher = (surface: Surface, ladder: Ladder) => {
      const missed =
        found instanceof ShapeError ||
        found.residuals.some((one) => one.surface === surface && !one.excluded && !one.within);
      if (!missed || ladder.rung + 1 >= ladder.fits.length) return false;
      ladder.rung++;
      return true;
    };
    const [up, low] = [higher('upper', upper), higher('lower', lower)];
    if (!up && !low) return best;
  }
}

function tooFew({ stations }: Rows, surface: Surface): ShapeError {
  const message = `the ${surface} surface has ${stations.length} points between its ends, too few for a fit`;
  return shapeError(`order.${surface}`, message);
}

/** Whether one fit is to be preferred to another: within tolerance, then with fewer weights, then nearer. */
function isBetter(one: Candidate, other: Candidate): boolean {
  const [met, otherMet] = [one.share <= 1, other.share <= 1];
  if (met !== otherMet) return met;
  const weights = ({ shape }: Candidate) => shape.upper.length + shape.lower.length;
  if (met && weights(one) !== weights(other)) return weights(one) < weights(other);
  return one.share < other.share;
}
