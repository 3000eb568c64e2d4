import { type Point } from '../point.ts';

/**
 * True when two segments of an open polyline that are not neighbours properly cross: meet in one inner point of both. Ends that touch
 * do not count, so a closed outline whose first and last point are the same is sound.
 *
 * The polyline is cut into chains along which x never turns back. Segments of one chain cannot properly cross, and of two chains only
 * those segments are compared that share a range of x. For outlines of a few chains that takes linear time, with the outcome of
 * comparing every pair.
 */
export function crossesItself(points: readonly Point[]): boolean {
  const chains = chainsOf(points);
  return chains.some((chain, i) => chains.slice(i + 1).some((other) => chainsCross(chain, other)));
}

/** Points in the order of x. */
type Chain = readonly Point[];

function chainsOf(points: readonly Point[]): Chain[] {
  const chains: Chain[] = [];
  let from = 0;
  let direction = 0;
  const cut = (to: number) => {
    const chain = points.slice(from, to + 1);
    chains.push(direction < 0 ? chain.reverse() : chain);
    from = to;
  };
  points.forEach(({ x }, i) => {
    const sense = Math.sign(x - (points[i - 1]?.x ?? x));
    if (sense !== 0 && sense === -direction) cut(i - 1);
    if (sense !== 0) direction = sense;
  });
  cut(points.length - 1);
  return chains;
}

function chainsCross(chain: Chain, other: Chain): boolean {
  let first = 1;
  for (let i = 1; i < chain.length; i++) {
    const [a, b] = [chain[i - 1], chain[i]];
    if (!a || !b) continue;
    while (first < other.length && (other[first]?.x ?? Infinity) < a.x) first++;
    for (let j = first; j < other.length; j++) {
      const [c, d] = [other[j - 1], other[j]];
      if (!c || !d || c.x > b.x) break;
      if (segmentsCross(a, b, c, d)) return true;
    }
  }
  return false;
}

function segmentsCross(a: Point, b: Point, c: Point, d: Point): boolean {
  return turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0;
}

function turn(a: Point, b: Point, c: Point): number {
  return (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x);
}
