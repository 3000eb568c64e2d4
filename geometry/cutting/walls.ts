import { type Point } from '../point.ts';

/** The points that divide a straight wall evenly, ends left out. */
export function alongWall(from: Point, to: Point, count: number): Point[] {
  return Array.from({ length: count }, (_, i) => {
    const share = (i + 1) / (count + 1);
    return { x: from.x + share * (to.x - from.x), y: from.y + share * (to.y - from.y) };
  });
}
