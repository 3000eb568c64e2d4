import { type Point } from '../point.ts';
import { type Rect } from './page.ts';

/**
 * The pieces of a line that lie within a rectangle, each as a line of its own; its ends on the border are exact to rounding
 * (clipping of each segment against the four sides, Liang and Barsky, A new concept and method for line clipping, 1984).
 */
export function clippedLine(points: readonly Point[], closed: boolean, rect: Rect): Point[][] {
  const first = points[0];
  const whole = closed && first ? [...points, first] : points;
  const pieces: Point[][] = [];
  let piece: Point[] = [];
  whole.slice(1).forEach((to, i) => {
    const from = whole[i];
    const inside = from && clippedSegment(from, to, rect);
    if (!inside) return;
    const [a, b] = inside;
    const last = piece.at(-1);
    if (last && last.x === a.x && last.y === a.y) piece.push(b);
    else {
      piece = [a, b];
      pieces.push(piece);
    }
  });
  return pieces;
}

function clippedSegment(a: Point, b: Point, { x, y, width, height }: Rect): [Point, Point] | null {
  let [from, to] = [0, 1];
  for (const [start, way, low, high] of [
    [a.x, b.x - a.x, x, x + width],
    [a.y, b.y - a.y, y, y + height],
  ] as const) {
    if (way === 0) {
      if (start < low || start > high) return null;
      continue;
    }
    const [p, q] = [(low - start) / way, (high - start) / way];
    from = Math.max(from, Math.min(p, q));
    to = Math.min(to, Math.max(p, q));
  }
  if (from >= to) return null;
  const along = (share: number): Point =>
    share === 0 ? a : share === 1 ? b : { x: a.x + share * (b.x - a.x), y: a.y + share * (b.y - a.y) };
  return [along(from), along(to)];
}
