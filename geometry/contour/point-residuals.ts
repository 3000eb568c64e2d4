import { type Point } from '../point.ts';
import { type Surface } from '../shapes/cst.ts';
import { measuredOutline } from '../shapes/measured.ts';
import { type Outline, parameterOf } from '../shapes/outline.ts';
import { type TrueChord, loopOf, nearestOn, onChord, outwardNormal, trueChordOf } from './loop.ts';
import { type PlacedDeviation, modelTolerance } from './model-tolerance.ts';

/** A contour as points: fractions of chord, upper trailing edge → nose → lower trailing edge, the chord from (0, 0) to (1, 0). */
export interface ContourPoints {
  readonly x: readonly number[];
  readonly y: readonly number[];
}

/** A point of a contour as seen from a chord. */
export interface ChordPoint extends Point {
  readonly index: number;
  readonly surface: Surface;
}

/** How far a shape lies from one point of a contour. */
export interface PointResidual extends PlacedDeviation {
  readonly index: number;
  /** The point itself. */
  readonly at: Point;
  /** The tolerance at its station, fractions of chord. */
  readonly allowed: number;
  readonly within: boolean;
  /** Left out of the fit and of the verdict. */
  readonly excluded: boolean;
}

/** The chord from (0, 0) to (1, 0). */
export const SHEET_CHORD: TrueChord = {
  nose: { x: 0, y: 0 },
  noseW: 0,
  scale: 1,
  rotationDeg: 0,
  along: { x: 1, y: 0 },
};

/** The longest chord of the smooth curve through the points. */
export function longestChordOf({ x, y }: ContourPoints): TrueChord {
  return trueChordOf(measuredOutline({ kind: 'measured', x, y }));
}

/** The points in the frame of a chord, parted at the foremost. */
export function pointsOnChord({ x, y }: ContourPoints, chord: TrueChord): readonly ChordPoint[] {
  const local = x.map((value, i) => onChord(chord, { x: value, y: y[i] ?? 0 }));
  let foremost = 0;
  local.forEach((point, i) => {
    if (point.x < (local[foremost]?.x ?? Infinity)) foremost = i;
  });
  return local.map((point, index) => {
    const upper = index < foremost || (index === foremost && point.y >= 0);
    return { ...point, index, surface: upper ? 'upper' : 'lower' };
  });
}

/**
 * Where an outline lies from the points of a contour, square to it: positive where the outline lies outside a point.
 * @param points as seen from a chord of the outline
 * @param place the points in the outline's own frame, by index
 * @param excluded indices of points that do not count
 */
export function residualsOf(
  outline: Outline,
  points: readonly ChordPoint[],
  place: (index: number) => Point,
  excluded: ReadonlySet<number>,
): readonly PointResidual[] {
  const loop = loopOf(outline);
  return points.map(({ index, surface, x: station }) => {
    const at = place(index);
    const side = surface === 'upper' ? 1 : -1;
    const { w } = nearestOn(loop, at, side * parameterOf(station));
    const [foot, normal] = [loop(w), outwardNormal(loop, w)];
    const deviation = (foot.x - at.x) * normal.x + (foot.y - at.y) * normal.y;
    const allowed = modelTolerance(station);
    const within = Math.abs(deviation) <= allowed;
    return { index, surface, station, at, deviation, allowed, within, excluded: excluded.has(index) };
  });
}

/** The counted residual with the largest share of what is allowed, or the largest itself. */
export function largestOf(
  residuals: readonly PointResidual[],
  by: 'share' | 'size',
): PointResidual | undefined {
  const value = ({ deviation, allowed }: PointResidual) =>
    Math.abs(deviation) / (by === 'share' ? allowed : 1);
  let best: PointResidual | undefined;
  for (const residual of residuals) {
    if (!residual.excluded && (!best || value(residual) > value(best))) best = residual;
  }
  return best;
}

/** The largest share of the tolerance that a counted point takes: up to 1 within it. */
export function shareOf(residuals: readonly PointResidual[]): number {
  const worst = largestOf(residuals, 'share');
  return worst ? Math.abs(worst.deviation) / worst.allowed : 0;
}
