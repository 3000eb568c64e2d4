import { type Polyline } from './arrays.ts';
import { ENDS, type End } from './plan.ts';
import { type Row, type RowEnd } from './row.ts';

/** Directions from the last vertex that keep every point passed so far within the tolerance, as angles about the first of them. */
interface Wedge {
  readonly axis: number;
  readonly low: number;
  readonly high: number;
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
  const lines = ENDS.flatMap((end) => [
    lineOf(rows, (row) => row[end]),
    moved(rows, end, ({ skin }) => grown[end] - skin),
    // Where skins meet, the path turns round the core's edge as quickly as the normals do.
    ...(skinned && grown[end] > 0 ? [moved(rows, end, () => grown[end])] : []),
  ]);
  const kept: Row[] = [];
  for (let i = 0; i < rows.length; i = reach(rows, lines, i, tolerance, longest)) {
    const row = rows[i];
    if (row) kept.push(row);
  }
  return kept;
}

function moved(rows: readonly Row[], end: End, by: (of: RowEnd) => number): Polyline {
  return lineOf(rows, ({ [end]: of }) => ({ x: of.x + by(of) * of.nx, y: of.y + by(of) * of.ny }));
}

function lineOf(rows: readonly Row[], point: (row: Row) => { x: number; y: number }): Polyline {
  const points = rows.map(point);
  return { x: Float64Array.from(points, ({ x }) => x), y: Float64Array.from(points, ({ y }) => y) };
}

/** The last row that a segment from `from` may end at. */
function reach(
  rows: readonly Row[],
  lines: readonly Polyline[],
  from: number,
  tolerance: number,
  longest: number,
): number {
  const wedges: (Wedge | null)[] = lines.map(() => null);
  for (let k = from + 1; k < rows.length; k++) {
    for (let l = 0; l < lines.length; l++) {
      const line = lines[l];
      if (!line) continue;
      const next = narrowed(line, from, k, wedges[l] ?? null, tolerance);
      if (next === 'outside') return Math.max(from + 1, k - 1);
      wedges[l] = next;
    }
    if (rows[k]?.fixed || k - from >= longest) return k;
  }
  return rows.length;
}

function narrowed(
  { x, y }: Polyline,
  from: number,
  to: number,
  wedge: Wedge | null,
  tolerance: number,
): Wedge | null | 'outside' {
  const dx = (x[to] ?? NaN) - (x[from] ?? NaN);
  const dy = (y[to] ?? NaN) - (y[from] ?? NaN);
  const distance = Math.hypot(dx, dy);
  if (distance <= tolerance) return wedge;
  const spread = Math.asin(Math.min(1, tolerance / distance));
  const angle = Math.atan2(dy, dx);
  if (wedge === null) return { axis: angle, low: -spread, high: spread };
  let turn = angle - wedge.axis;
  if (turn > Math.PI) turn -= 2 * Math.PI;
  else if (turn < -Math.PI) turn += 2 * Math.PI;
  if (turn < wedge.low || turn > wedge.high) return 'outside';
  return {
    axis: wedge.axis,
    low: Math.max(wedge.low, turn - spread),
    high: Math.min(wedge.high, turn + spread),
  };
}
