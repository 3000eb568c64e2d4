import { type ContourPoints, pointsOnChord, residualsOf, SHEET_CHORD } from '../contour/point-residuals.ts';
import { shapeErrorOf } from '../shapes/error.ts';
import { MEASURED_LIMITS, type MeasuredShape, measuredOutline, measuredSchema } from '../shapes/measured.ts';

/** A contour kept as points. */
export interface KeptContour {
  readonly shape: MeasuredShape;
  /** Points of the source that were left out because there were too many. */
  readonly removed: number;
  /** The largest distance of a point that was left out from the kept curve, fractions of chord. */
  readonly residual: number;
}

/**
 * The measured contour through imported points: all of them, or when they are more than such a contour can have, a choice that is
 * densest where the outline bends. The work grows in proportion to the number of points.
 * @throws ShapeError naming the point when the curve through the points is no valid outline
 */
export function toMeasured(contour: ContourPoints): KeptContour {
  const kept = chosen(contour, MEASURED_LIMITS.points.max);
  const pick = (list: readonly number[]) => kept.map((i) => list[i] ?? 0);
  const result = measuredSchema.safeParse({ kind: 'measured', x: pick(contour.x), y: pick(contour.y) });
  if (!result.success) throw shapeErrorOf(result.error);
  const shape = result.data;
  const removed = contour.x.length - kept.length;
  return { shape, removed, residual: removed === 0 ? 0 : largestDistance(shape, contour) };
}

/** A turn by one radian counts as much as half a chord of way. */
const TURN_SHARE = 0.5;

/** Indices of at most `most` points, at equal steps of way and turn; both ends and the point nearest to the nose among them. */
function chosen({ x, y }: ContourPoints, most: number): number[] {
  const count = x.length;
  if (count <= most) return Array.from({ length: count }, (_, i) => i);
  const progress = new Float64Array(count);
  let nose = 0;
  for (let i = 1; i < count; i++) {
    const [ax, ay] = [x[i - 1] ?? 0, y[i - 1] ?? 0];
    const [bx, by] = [x[i] ?? 0, y[i] ?? 0];
    const [cx, cy] = [x[i + 1] ?? bx, y[i + 1] ?? by];
    const [px, py, qx, qy] = [bx - ax, by - ay, cx - bx, cy - by];
    const turn = Math.abs(Math.atan2(px * qy - py * qx, px * qx + py * qy));
    progress[i] = (progress[i - 1] ?? 0) + Math.hypot(px, py) + TURN_SHARE * turn;
    if (Math.hypot(bx, by) < Math.hypot(x[nose] ?? 0, y[nose] ?? 0)) nose = i;
  }
  const step = (progress[count - 1] ?? 1) / (most - 3);
  const kept = [0];
  let taken = 0;
  for (let i = 1; i < count - 1; i++) {
    const due = Math.floor((progress[i] ?? 0) / step);
    if (due <= taken && i !== nose) continue;
    taken = Math.max(taken, due);
    kept.push(i);
  }
  kept.push(count - 1);
  return kept;
}

function largestDistance(shape: MeasuredShape, contour: ContourPoints): number {
  const points = pointsOnChord(contour, SHEET_CHORD);
  const place = (i: number) => ({ x: contour.x[i] ?? 0, y: contour.y[i] ?? 0 });
  const residuals = residualsOf(measuredOutline(shape), points, place, new Set());
  return residuals.reduce((largest, { deviation }) => Math.max(largest, Math.abs(deviation)), 0);
}
