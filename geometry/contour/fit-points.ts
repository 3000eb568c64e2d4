import { CST_LIMITS, type CstShape, type Surface, cstOutline } from '../shapes/cst.ts';
import { ShapeError, shapeError } from '../shapes/error.ts';
import { checkShape } from '../shapes/shape.ts';
import { type FourDigitMatch, matchFourDigits } from './four-digit-match.ts';
import { type TrueChord } from './loop.ts';
import { toleranceVerdict } from './model-tolerance.ts';
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
import { EXPONENTS, type Ladder, type Rows, fitSurface, ladderOf, rowsOf } from './surface-fit.ts';

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
