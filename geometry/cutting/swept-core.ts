import { type Polyline, at, between, squareDistance } from './arrays.ts';
import { type ExpectedCore, inMouth } from './expected-core.ts';

/** The largest difference between the core that the program cuts and the planned one in one plane across the span. */
export interface PlaneDeviation {
  /** Share of the way from the left face to the right face. */
  readonly share: number;
  readonly deviationMm: number;
  /** The move of the path whose kerf lies nearest to that place. */
  readonly move: number;
}

/**
 * Sweeps the wire through one plane: the kerf is all that lies within half its width of the wire's polygon. The core is as planned when each
 * point of its outline lies just at the kerf's edge: nearer, and the wire has cut into it; farther, and foam stays on it.
 * @param wire the wire's points in this plane
 */
export function deviationAt(wire: Polyline, core: ExpectedCore, share: number): PlaneDeviation {
  const outline = between(core.outline.left, core.outline.right, share);
  const walls = between(core.walls.left, core.walls.right, share);
  const half = core.halfKerfLeftMm + share * (core.halfKerfRightMm - core.halfKerfLeftMm);
  const mouths = core.mouths.map(({ left, right, part }) => ({ line: between(left, right, share), part }));
  const nearest = nearestOn(wire, half);
  let worst: PlaneDeviation = { share, deviationMm: 0, move: 0 };
  const check = (x: number, y: number) => {
    const { distance, move } = nearest(x, y);
    const deviationMm = Math.abs(distance - half);
    if (deviationMm > worst.deviationMm) worst = { share, deviationMm, move };
  };
  for (let i = 0; i < outline.x.length; i++) {
    const [x, part] = [at(outline.x, i), at(core.part, i)];
    if (mouths.some((of) => of.part === part && inMouth(of.line, x, half / 8))) continue;
    check(x, at(outline.y, i));
  }
  for (let i = 0; i < walls.x.length; i++) check(at(walls.x, i), at(walls.y, i));
  return worst;
}

/** How far beyond half the kerf the search for the nearest wire looks first, mm. */
const REACH = 0.1;

/** A search for the wire's nearest segment, by strips along x. Farther than the strips' reach it searches all. */
function nearestOn(
  wire: Polyline,
  half: number,
): (x: number, y: number) => { distance: number; move: number } {
  const { x, y } = wire;
  const reach = half + REACH;
  let [low, high] = [Infinity, -Infinity];
  for (const value of x) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const width = Math.max(reach, (high - low) / 400);
  const strips: number[][] = Array.from({ length: Math.floor((high - low) / width) + 1 }, () => []);
  const strip = (value: number) =>
    Math.min(strips.length - 1, Math.max(0, Math.floor((value - low) / width)));
  for (let i = 1; i < x.length; i++) {
    const [a, b] = [at(x, i - 1), at(x, i)];
    for (let s = strip(Math.min(a, b) - reach); s <= strip(Math.max(a, b) + reach); s++) strips[s]?.push(i);
  }
  const search = (px: number, py: number, moves: readonly number[]) => {
    let [least, move] = [Infinity, 0];
    let square = Infinity;
    for (const i of moves) {
      const [ax, ay, bx, by] = [at(x, i - 1), at(y, i - 1), at(x, i), at(y, i)];
      if (py - Math.max(ay, by) > least || Math.min(ay, by) - py > least) continue;
      const d = squareDistance(px, py, ax, ay, bx, by);
      if (d < square) {
        [square, move] = [d, i];
        least = Math.sqrt(d);
      }
    }
    return { distance: least, move };
  };
  return (px, py) => {
    const near = search(px, py, strips[strip(px)] ?? []);
    if (near.distance <= reach) return near;
    return search(
      px,
      py,
      Array.from({ length: x.length - 1 }, (_, i) => i + 1),
    );
  };
}
