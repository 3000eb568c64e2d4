import { type Polyline, at, segmentDistance } from '#geometry/cutting/arrays.ts';
import { type Outline } from '#geometry/shapes/outline.ts';

/** Distance of a point from a polyline, every segment tried. */
export function distanceTo(line: Polyline, x: number, y: number, closed = true): number {
  let least = Infinity;
  const count = line.x.length;
  for (let i = closed ? 0 : 1, k = closed ? count - 1 : 0; i < count; k = i++) {
    const [ax, bx] = [at(line.x, k), at(line.x, i)];
    // Farther along x alone.
    if (Math.min(ax, bx) - x >= least || x - Math.max(ax, bx) >= least) continue;
    least = Math.min(least, segmentDistance(x, y, ax, at(line.y, k), bx, at(line.y, i)));
  }
  return least;
}

/** The largest distance of the points of one line from another, its segments halved so often. */
export function farthest(from: Polyline, to: Polyline, halves = 1): number {
  let most = 0;
  for (let i = 0; i < from.x.length; i++) {
    const k = (i + 1) % from.x.length;
    for (let h = 0; h < halves; h++) {
      const share = h / halves;
      const x = at(from.x, i) + share * (at(from.x, k) - at(from.x, i));
      const y = at(from.y, i) + share * (at(from.y, k) - at(from.y, i));
      most = Math.max(most, distanceTo(to, x, y));
    }
  }
  return most;
}

/** A section's outline as a very fine closed polygon, counter-clockwise from the upper trailing edge. */
export function fine(outline: Outline, chordMm: number, perSurface = 1500): Polyline {
  const upper = Array.from({ length: perSurface + 1 }, (_, i) => outline.upper.at(1 - i / perSurface));
  const lower = Array.from({ length: perSurface }, (_, i) => outline.lower.at((i + 1) / perSurface));
  const points = [...upper, ...(outline.sharp ? lower.slice(0, -1) : lower)];
  return {
    x: Float64Array.from(points, ({ x }) => x * chordMm),
    y: Float64Array.from(points, ({ y }) => y * chordMm),
  };
}

/** Every pair of segments that crosses in the inside of both, tried one by one. */
export function crossingsByHand({ x, y }: Polyline): number {
  let found = 0;
  const n = x.length;
  const side = (a: number, b: number, c: number) =>
    (x[b]! - x[a]!) * (y[c]! - y[a]!) - (y[b]! - y[a]!) * (x[c]! - x[a]!);
  for (let i = 0; i < n; i++) {
    for (let k = i + 2; k < n; k++) {
      const [a, b, c, d] = [i, (i + 1) % n, k, (k + 1) % n];
      if (side(a, b, c) * side(a, b, d) < -1e-18 && side(c, d, a) * side(c, d, b) < -1e-18) found += 1;
    }
  }
  return found;
}

/** The perimeter of a closed polyline. */
export function perimeterOf({ x, y }: Polyline): number {
  return x.reduce((sum, value, i) => {
    const k = (i + 1) % x.length;
    return sum + Math.hypot(x[k]! - value, y[k]! - y[i]!);
  }, 0);
}
