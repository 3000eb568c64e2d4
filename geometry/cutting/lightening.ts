import { type Point } from '../point.ts';
import { type Polyline, at, boxOf, segmentDistance } from './arrays.ts';
import { verticalCut } from './feature-ends.ts';

/** A round hole. */
export interface Hole extends Point {
  readonly radius: number;
}

export interface LighteningRules {
  readonly most: number;
  readonly minimumWebMm: number;
  readonly smallestDiameterMm: number;
}

const SAMPLES = 90;

/**
 * Round holes half way between the surfaces, the largest first, each as large as the web to the outline (notches and tabs included), to the other
 * holes and to the obstacles allows.
 * @param outline the rib's outline, closed
 * @param whole the same without notches and tabs: gives the middle
 * @param obstacles holes that are there already, as for tubes
 */
export function lighteningHoles(
  outline: Polyline,
  whole: Polyline,
  obstacles: readonly Hole[],
  rules: LighteningRules,
): Hole[] {
  const rooms = roomsAlong(outline, whole);
  const holes: Hole[] = [];
  while (holes.length < rules.most) {
    const taken = [...obstacles, ...holes];
    let best: Hole | null = null;
    for (const { x, y, radius: room } of rooms) {
      const radius =
        Math.min(room, ...taken.map((of) => Math.hypot(x - of.x, y - of.y) - of.radius)) - rules.minimumWebMm;
      if (!best || radius > best.radius) best = { x, y, radius };
    }
    if (!best || best.radius < rules.smallestDiameterMm / 2) break;
    holes.push(best);
  }
  return holes;
}

/** Points along the middle of an outline with their distance from it, in its inside. */
export function roomsAlong(outline: Polyline, whole: Polyline): Hole[] {
  const { minX, maxX } = boxOf(whole);
  return Array.from({ length: SAMPLES }, (_, i): Hole | null => {
    const x = minX + ((maxX - minX) * (i + 1)) / (SAMPLES + 1);
    const cut = verticalCut(whole, x);
    if (!cut) return null;
    const y = (cut.low + cut.high) / 2;
    return { x, y, radius: inside(outline, x, y) ? distanceFrom(outline, x, y) : 0 };
  }).filter((room) => room !== null);
}

function distanceFrom({ x, y }: Polyline, px: number, py: number): number {
  let least = Infinity;
  for (let b = 0, a = x.length - 1; b < x.length; a = b++) {
    const [ax, ay, bx, by] = [at(x, a), at(y, a), at(x, b), at(y, b)];
    if (Math.min(ax, bx) - px > least || px - Math.max(ax, bx) > least) continue;
    least = Math.min(least, segmentDistance(px, py, ax, ay, bx, by));
  }
  return least;
}

/** Even-odd rule: a ray to the left crosses the outline an odd number of times. */
function inside({ x, y }: Polyline, px: number, py: number): boolean {
  let odd = false;
  for (let b = 0, a = x.length - 1; b < x.length; a = b++) {
    const [ay, by] = [at(y, a), at(y, b)];
    if (ay > py === by > py) continue;
    if (at(x, a) + ((py - ay) / (by - ay)) * (at(x, b) - at(x, a)) < px) odd = !odd;
  }
  return odd;
}
