import { at } from './arrays.ts';
import { ENDS, type End } from './plan.ts';
import { type Row, type RowEnd } from './row.ts';

/** One polygon that must stay within the tolerance, with the directions that are left from the last vertex. */
interface Line {
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Whether a point farther than the tolerance has been passed; the direction to the first of them. */
  open: boolean;
  axisX: number;
  axisY: number;
  /** Slopes about that direction between which every point passed lies within the tolerance. */
  low: number;
  high: number;
}

/**
 * Drops the rows that are not needed: between fixed rows each segment reaches as far as all polygons (the contours of both ends and the
 * wire's raw path at both) stay within the tolerance of it. One pass: a row is reachable while its direction lies in the wedge left by all
 * rows passed (the cone method of line simplification; common practice).
 * @param tolerance mm
 * @param longest rows that a segment may span
 * @param grown how far outside the contour, before the skin is taken off, the wire's path runs at each end, mm
 */
export function thin(
  rows: readonly Row[],
  tolerance: number,
  longest: number,
  grown: Readonly<Record<End, number>>,
): Row[] {
  const skinned = rows.some(({ root, tip }) => root.skin > 0 || tip.skin > 0);
  const lines = ENDS.flatMap((end) => {
    const by = grown[end];
    const contour = lineOf(rows, end, () => 0);
    if (by === 0 && !skinned) return [contour];
    const path = lineOf(rows, end, ({ skin }) => by - skin);
    // Where skins meet, the path turns round the core's edge as quickly as the normals do.
    return skinned && by > 0 ? [contour, path, lineOf(rows, end, () => by)] : [contour, path];
  });
  const kept: Row[] = [];
  for (let i = 0; i < rows.length; i = reach(rows, lines, i, tolerance, longest)) {
    const row = rows[i];
    if (row) kept.push(row);
  }
  return kept;
}

function lineOf(rows: readonly Row[], end: End, by: (of: RowEnd) => number): Line {
  const [x, y] = [new Float64Array(rows.length), new Float64Array(rows.length)];
  rows.forEach(({ [end]: of }, i) => {
    const distance = by(of);
    x[i] = of.x + distance * of.nx;
    y[i] = of.y + distance * of.ny;
  });
  return { x, y, open: false, axisX: 1, axisY: 0, low: -Infinity, high: Infinity };
}

/** The last row that a segment from `from` may end at. */
function reach(
  rows: readonly Row[],
  lines: readonly Line[],
  from: number,
  tolerance: number,
  longest: number,
): number {
  for (const line of lines) line.open = false;
  for (let k = from + 1; k < rows.length; k++) {
    for (const line of lines) {
      if (!passes(line, from, k, tolerance)) return Math.max(from + 1, k - 1);
    }
    if (rows[k]?.fixed || k - from >= longest) return k;
  }
  return rows.length;
}

/**
 * Whether a segment may end at row `to`, and narrows the directions to those that pass it within the tolerance: in the frame of the first direction
 * the tangents from the origin to a circle of radius t about (u, v) have the slopes (u v ± t √(u² + v² − t²)) / (u² − t²).
 */
function passes(line: Line, from: number, to: number, tolerance: number): boolean {
  const dx = at(line.x, to) - at(line.x, from);
  const dy = at(line.y, to) - at(line.y, from);
  const square = dx * dx + dy * dy;
  const t2 = tolerance * tolerance;
  if (square <= t2) return true;
  if (!line.open) {
    const size = Math.sqrt(square);
    [line.axisX, line.axisY] = [dx / size, dy / size];
    const spread = tolerance / Math.sqrt(square - t2);
    [line.low, line.high, line.open] = [-spread, spread, true];
    return true;
  }
  const u = dx * line.axisX + dy * line.axisY;
  const v = dy * line.axisX - dx * line.axisY;
  // Abreast or behind, where slopes no longer tell directions.
  if (u <= tolerance) return false;
  const slope = v / u;
  if (slope < line.low || slope > line.high) return false;
  const [middle, half, scale] = [u * v, tolerance * Math.sqrt(square - t2), u * u - t2];
  line.low = Math.max(line.low, (middle - half) / scale);
  line.high = Math.min(line.high, (middle + half) / scale);
  return true;
}
