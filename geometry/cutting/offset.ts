import { type Polyline, at } from './arrays.ts';
import { type Crossing, crossingsOf } from './crossings.ts';
import { type Face } from './panel.ts';

/** A contour moved in step: point k belongs to point k of the contour it was made from. */
export interface OffsetLine extends Polyline {
  /** Distance from the contour that each point was given, positive outwards, mm. */
  readonly distance: Float64Array;
  /** 1 where a point lay in a loop and now stands at the loop's crossing. */
  readonly collapsed: Uint8Array;
  /** Where both surfaces cross at the trailing edge and the offset contour ends; null when it reaches its own corners. */
  readonly tail: Tail | null;
}

/** The crossing of both surfaces at the trailing edge. */
export interface Tail {
  readonly x: number;
  readonly y: number;
  /** The points next to the crossing that stay. */
  readonly upper: number;
  readonly lower: number;
}

/** Loops taken out one after another; more than this and the contour is given up. */
const MOST_LOOPS = 60;
/** Share of the offset contour that may run against the contour before it counts as turned inside out. */
const TURNED = 0.01;

/**
 * Moves a contour in step: each point along its normal by `outwards` less its skin allowance, loops collapsed into their crossing, so that
 * the number of points stays. Outward corners are round.
 * @param outwards mm: half the kerf for the wire's path, 0 for the core
 * @param pinned points that take a known place instead
 * @returns null when nothing is left between the skins
 */
export function offsetInStep(face: Face, outwards: number, pinned?: Pinned): OffsetLine | null {
  const distance = face.skin.map((skin) => outwards - skin);
  const x = face.x.map((value, i) => value + at(distance, i) * at(face.nx, i));
  const y = face.y.map((value, i) => value + at(distance, i) * at(face.ny, i));
  for (const i of pinned?.points ?? []) {
    x[i] = pinned?.x ?? NaN;
    y[i] = pinned?.y ?? NaN;
  }
  const cleared = withoutLoops({ x, y });
  if (!cleared || runsBackward(face, cleared)) return null;
  if (!pinned) return { ...cleared, distance };
  const { collapsed } = cleared;
  for (const i of pinned.points) collapsed[i] = 1;
  const [upper, lower] = [collapsed.indexOf(0), collapsed.lastIndexOf(0)];
  return { ...cleared, distance, collapsed, tail: { x: pinned.x, y: pinned.y, upper, lower } };
}

/** Points that are to stand at a known place: the tail, once it is known where the surfaces meet. */
export interface Pinned {
  readonly points: readonly number[];
  readonly x: number;
  readonly y: number;
}

interface Cleared extends Polyline {
  readonly collapsed: Uint8Array;
  readonly tail: Tail | null;
}

/** A closed polyline without its loops, in the same number of points; null when it cannot be cleared. */
export function withoutLoops(line: Polyline): Cleared | null {
  const x = line.x.slice();
  const y = line.y.slice();
  const collapsed = new Uint8Array(x.length);
  let tail: Cleared['tail'] = null;
  for (let round = 0; round <= MOST_LOOPS; round++) {
    const loop = largestLoop({ x, y }, crossingsOf({ x, y }));
    if (!loop) return { x, y, collapsed, tail };
    const { crossing, inner } = loop;
    for (let i = 0; i < x.length; i++) {
      const inside = i > crossing.first && i <= crossing.second;
      if (inside !== inner) continue;
      x[i] = crossing.x;
      y[i] = crossing.y;
      collapsed[i] = 1;
    }
    if (!inner) tail = { x: crossing.x, y: crossing.y, upper: crossing.first + 1, lower: crossing.second };
  }
  return null;
}

interface Loop {
  readonly crossing: Crossing;
  /** True when the loop is the part between the two segments, false when it is the rest. */
  readonly inner: boolean;
  readonly points: number;
}

/** Of the parts that each crossing cuts off, the longest. The part with the smaller signed area is the loop: loops of an offset turn backward. */
function largestLoop({ x, y }: Polyline, crossings: readonly Crossing[]): Loop | null {
  if (crossings.length === 0) return null;
  const count = x.length;
  const sums = new Float64Array(count + 1);
  for (let i = 0; i < count; i++) {
    const k = (i + 1) % count;
    sums[i + 1] = at(sums, i) + at(x, i) * at(y, k) - at(x, k) * at(y, i);
  }
  let largest: Loop | null = null;
  for (const crossing of crossings) {
    const { first, second, x: cx, y: cy } = crossing;
    const inside =
      cx * at(y, first + 1) -
      at(x, first + 1) * cy +
      at(sums, second) -
      at(sums, first + 1) +
      at(x, second) * cy -
      cx * at(y, second);
    const inner = inside < at(sums, count) - inside;
    const points = inner ? second - first : count - second + first;
    if (!largest || points > largest.points) largest = { crossing, inner, points };
  }
  return largest;
}

/** True when the moved contour runs against the one it came from: the offset was deeper than the section. */
function runsBackward(face: Polyline, moved: Cleared): boolean {
  let forward = 0;
  let backward = 0;
  for (let i = 0; i + 1 < face.x.length; i++) {
    const dx = at(moved.x, i + 1) - at(moved.x, i);
    const dy = at(moved.y, i + 1) - at(moved.y, i);
    const along = dx * (at(face.x, i + 1) - at(face.x, i)) + dy * (at(face.y, i + 1) - at(face.y, i));
    if (along >= 0) forward += Math.hypot(dx, dy);
    else if (at(moved.collapsed, i) === 0 || at(moved.collapsed, i + 1) === 0) backward += Math.hypot(dx, dy);
  }
  return backward > TURNED * (forward + backward) || forward === 0;
}
