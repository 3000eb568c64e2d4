import { type Polyline, at } from './arrays.ts';

/** Where two segments of a closed polyline cross: segment i runs from point i to point i + 1. */
export interface Crossing {
  readonly first: number;
  readonly second: number;
  /** How far along each of both segments it lies, 0 … 1. */
  readonly firstShare: number;
  readonly secondShare: number;
  readonly x: number;
  readonly y: number;
}

/** Finds the places where a closed polyline crosses itself. Touching in a common point is no crossing. */
export function crossingsOf(line: Polyline): Crossing[] {
  const { x, y } = line;
  const count = x.length;
  const buckets = bucketsOf(line);
  const found: Crossing[] = [];
  const seen = new Set<number>();
  for (const bucket of buckets) {
    for (let a = 0; a < bucket.length; a++) {
      for (let b = a + 1; b < bucket.length; b++) {
        const [i, k] = [at(bucket, a), at(bucket, b)];
        if (apart(y, i, k)) continue;
        const key = i * count + k;
        if (seen.has(key)) continue;
        const crossing = crossingOf(x, y, i, k);
        if (crossing) {
          seen.add(key);
          found.push(crossing);
        }
      }
    }
  }
  return found;
}

/** True when the boxes of two segments do not overlap in y. */
function apart(y: Float64Array, i: number, k: number): boolean {
  const [a, b, c, d] = [at(y, i), at(y, (i + 1) % y.length), at(y, k), at(y, (k + 1) % y.length)];
  return (a < c && a < d && b < c && b < d) || (a > c && a > d && b > c && b > d);
}

/** The segments in strips of equal width along x; a segment stands in every strip it touches, in ascending order. */
function bucketsOf({ x }: Polyline): number[][] {
  const count = x.length;
  let [low, high] = [Infinity, -Infinity];
  for (const value of x) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const strips = Math.max(1, count >> 1);
  const scale = high > low ? (strips - 1e-9) / (high - low) : 0;
  const buckets: number[][] = Array.from({ length: strips }, () => []);
  for (let i = 0; i < count; i++) {
    const a = (at(x, i) - low) * scale;
    const b = (at(x, (i + 1) % count) - low) * scale;
    for (let s = Math.floor(Math.min(a, b)); s <= Math.max(a, b); s++) buckets[s]?.push(i);
  }
  return buckets;
}

function crossingOf(x: Float64Array, y: Float64Array, first: number, second: number): Crossing | null {
  const count = x.length;
  const [a, b, c, d] = [first, (first + 1) % count, second, (second + 1) % count];
  if (same(x, y, a, b) || same(x, y, c, d)) return null;
  if (same(x, y, a, c) || same(x, y, a, d) || same(x, y, b, c) || same(x, y, b, d)) return null;
  const [ax, ay, bx, by] = [at(x, a), at(y, a), at(x, b), at(y, b)];
  const [cx, cy, dx, dy] = [at(x, c), at(y, c), at(x, d), at(y, d)];
  const side = (px: number, py: number, qx: number, qy: number, rx: number, ry: number) =>
    (qx - px) * (ry - py) - (qy - py) * (rx - px);
  const [sc, sd] = [side(ax, ay, bx, by, cx, cy), side(ax, ay, bx, by, dx, dy)];
  const [sa, sb] = [side(cx, cy, dx, dy, ax, ay), side(cx, cy, dx, dy, bx, by)];
  if (sc >= 0 === sd >= 0 || sa >= 0 === sb >= 0) return null;
  const firstShare = sa / (sa - sb);
  const secondShare = sc / (sc - sd);
  const [px, py] = [ax + firstShare * (bx - ax), ay + firstShare * (by - ay)];
  return { first, second, firstShare, secondShare, x: px, y: py };
}

function same(x: Float64Array, y: Float64Array, i: number, k: number): boolean {
  return at(x, i) === at(x, k) && at(y, i) === at(y, k);
}
