import { line } from 'd3-shape';
import { type Polyline, at } from '#geometry/cutting/arrays.ts';
import { type MoveKind } from '#geometry/cutting/wire-path.ts';
import { type Point } from '#geometry/point.ts';
import { type Place } from './plan-layout.ts';

type To = Pick<Place, 'toX' | 'toY'>;

/** A line of points as a path; closed when it is an outline. */
export function linePath({ x, y }: Polyline, { toX, toY }: To, closed = true): string {
  const path = line<number>(
    (_, i) => toX(x[i] ?? 0),
    (_, i) => toY(y[i] ?? 0),
  ).digits(2)(x as ArrayLike<number> as number[]);
  return path === null ? '' : `${path}${closed ? 'Z' : ''}`;
}

/** The piece of the way that ends at each node, for the moves of the kinds wanted; other moves are jumped over. */
export function wayPieces(
  { x, y }: Polyline,
  kinds: readonly MoveKind[],
  { toX, toY }: To,
  wanted: (kind: MoveKind) => boolean,
): readonly string[] {
  return kinds.map((kind, i) => {
    const point = `${toX(at(x, i)).toFixed(2)} ${toY(at(y, i)).toFixed(2)}`;
    return i > 0 && wanted(kind) ? `L${point}` : `M${point}`;
  });
}

/** A polygon or line through single points. */
export function pointsPath(points: readonly Point[], { toX, toY }: To, closed = false): string {
  const parts = points.map(
    ({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${toX(x).toFixed(2)} ${toY(y).toFixed(2)}`,
  );
  return parts.join('') + (closed ? 'Z' : '');
}

/** The points of a line. */
export function pointsOf({ x, y }: Polyline): Point[] {
  return Array.from(x, (value, i) => ({ x: value, y: at(y, i) }));
}

/** The smallest convex polygon around points, counter-clockwise (monotone chain after Andrew, 1979). */
export function hullOf(points: readonly Point[]): Point[] {
  const sorted = [...points].sort((a, b) => a.x - b.x || a.y - b.y);
  const half = (of: readonly Point[]): Point[] => {
    const chain: Point[] = [];
    for (const point of of) {
      while (turnsRight(chain.at(-2), chain.at(-1), point)) chain.pop();
      chain.push(point);
    }
    return chain.slice(0, -1);
  };
  return [...half(sorted), ...half(sorted.toReversed())];
}

function turnsRight(a: Point | undefined, b: Point | undefined, c: Point): boolean {
  if (!a || !b) return false;
  return (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x) <= 0;
}
