import { type Point } from '../point.ts';
import { type CurvePoint, type Outline } from '../shapes/outline.ts';
import { safeguardedRoot } from './roots.ts';

/** The whole outline as one curve of w: −1 lower trailing edge, 0 where the surfaces meet, 1 upper trailing edge. */
export type Loop = (w: number) => CurvePoint;

export function loopOf({ upper, lower }: Outline): Loop {
  return (w) => {
    if (w >= 0) return upper.derivatives(w);
    const point = lower.derivatives(-w);
    return { ...point, dx: -point.dx, dy: -point.dy };
  };
}

/** The longest chord of an outline: from the middle of its trailing edge to the point farthest from there. */
export interface TrueChord {
  /** The point of the outline farthest from the middle of the trailing edge. */
  readonly nose: Point;
  /** Where it lies on the loop. */
  readonly noseW: number;
  /** Length of the chord. */
  readonly scale: number;
  /** Counter-clockwise from the sheet's chord. */
  readonly rotationDeg: number;
  /** Unit vector from nose to trailing edge. */
  readonly along: Point;
}

const SCAN = 128;
const T_TOLERANCE = 1e-13;

/** The longest chord of an outline. A cambered 4-digit section's lies a little ahead of and aslant to the sheet's. */
export function trueChordOf(source: Outline): TrueChord {
  const loop = loopOf(source);
  const [u, l] = [source.upper.at(1), source.lower.at(1)];
  const edge = { x: (u.x + l.x) / 2, y: (u.y + l.y) / 2 };
  const noseW = farthestFrom(edge, loop);
  const { x, y } = loop(noseW);
  const [dx, dy] = [edge.x - x, edge.y - y];
  const scale = Math.hypot(dx, dy);
  const rotationDeg = (Math.atan2(dy, dx) * 180) / Math.PI;
  return { nose: { x, y }, noseW, scale, rotationDeg, along: { x: dx / scale, y: dy / scale } };
}

/** w of the point farthest from the trailing edge: a scan, then the root of the distance's derivative. */
function farthestFrom(edge: Point, loop: Loop): number {
  let [best, largest] = [0, -1];
  for (let i = -SCAN; i <= SCAN; i++) {
    const { x, y } = loop(i / SCAN);
    const square = (x - edge.x) ** 2 + (y - edge.y) ** 2;
    if (square > largest) [best, largest] = [i / SCAN, square];
  }
  const evaluate = (w: number) => {
    const { x, y, dx, dy, ddx, ddy } = loop(w);
    const [rx, ry] = [x - edge.x, y - edge.y];
    return { value: rx * dx + ry * dy, slope: dx * dx + dy * dy + rx * ddx + ry * ddy };
  };
  const [before, after] = [Math.max(-1, best - 1 / SCAN), Math.min(1, best + 1 / SCAN)];
  if (evaluate(before).value <= 0 || evaluate(after).value >= 0) return best;
  return safeguardedRoot(evaluate, after, before, best, T_TOLERANCE);
}

/** A point of the sheet in the true chord's frame, in fractions of the true chord. */
export function onChord({ nose, scale, along }: TrueChord, point: Point): Point {
  const [dx, dy] = [point.x - nose.x, point.y - nose.y];
  return { x: (dx * along.x + dy * along.y) / scale, y: (dy * along.x - dx * along.y) / scale };
}

const NEWTON_STEPS = 8;

/** A point of a loop. */
export interface LoopPoint {
  readonly w: number;
  readonly distance: number;
}

/**
 * The point of a loop nearest to another point, found by Newton's method from a place near it; the best of the steps.
 * @param start w, −1 … 1
 */
export function nearestOn(loop: Loop, point: Point, start: number): LoopPoint {
  let w = start;
  let nearest = { w, distance: Infinity };
  for (let step = 0; step <= NEWTON_STEPS; step++) {
    const { x, y, dx, dy, ddx, ddy } = loop(w);
    const [rx, ry] = [x - point.x, y - point.y];
    const distance = Math.sqrt(rx * rx + ry * ry);
    if (distance < nearest.distance) nearest = { w, distance };
    const bend = dx * dx + dy * dy + rx * ddx + ry * ddy;
    if (!(bend > 0)) break;
    w = Math.min(1, Math.max(-1, w - (rx * dx + ry * dy) / bend));
  }
  return nearest;
}

/**
 * The unit normal of a loop, out of the section. At a trailing edge the tangent is that which leads there; a pointed nose has the
 * normal that points ahead.
 * @param w −1 … 1
 */
export function outwardNormal(loop: Loop, w: number): Point {
  const { dx, dy, ddx, ddy } = loop(w);
  const vanished = Math.hypot(dx, dy) < VANISHED;
  // Where a parameter ends with a vanishing derivative, P'(w) is about (w − end) P''(end).
  const [tx, ty] = vanished ? [-Math.sign(w) * ddx, -Math.sign(w) * ddy] : [dx, dy];
  const length = Math.hypot(tx, ty);
  return length === 0 ? { x: -1, y: 0 } : { x: -ty / length, y: tx / length };
}

const VANISHED = 1e-9;
