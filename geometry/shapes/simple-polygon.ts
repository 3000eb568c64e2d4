/** Two sides of a polygon, by the index of the vertex each begins at. */
export type SidePair = readonly [number, number];

/** A side with its ends in the order of x, then y. */
interface Side {
  readonly index: number;
  readonly lx: number;
  readonly ly: number;
  readonly rx: number;
  readonly ry: number;
}

/**
 * Two sides of a closed polygon that cross or touch, or null when it is simple. Neighbouring sides share their vertex and count only
 * when one runs back along the other.
 *
 * By a sweep along x that keeps the sides it cuts in order of height and compares neighbours in that order only: Shamos & Hoey,
 * Geometric intersection problems (1976). The work grows as n log n whatever the polygon.
 * @param x,y the vertices, each once; the last is joined to the first
 */
export function crossingSides(x: ArrayLike<number>, y: ArrayLike<number>): SidePair | null {
  const sides = Array.from({ length: x.length }, (_, i) => sideOf(x, y, i));
  const count = sides.length;
  const cut: Side[] = [];
  const meet = (a: Side | undefined, b: Side | undefined): SidePair | null =>
    a && b && sidesMeet(a, b, count) ? [a.index, b.index] : null;
  for (const { side, enters } of eventsOf(sides)) {
    if (enters) {
      const at = placeFor(cut, side, count);
      if (typeof at !== 'number') return at;
      const found = meet(cut[at - 1], side) ?? meet(side, cut[at]);
      if (found) return found;
      cut.splice(at, 0, side);
    } else {
      const at = placeOf(cut, side);
      cut.splice(at, 1);
      const found = meet(cut[at - 1], cut[at]);
      if (found) return found;
    }
  }
  return null;
}

function sideOf(x: ArrayLike<number>, y: ArrayLike<number>, index: number): Side {
  const next = (index + 1) % x.length;
  const [ax, ay, bx, by] = [x[index] ?? 0, y[index] ?? 0, x[next] ?? 0, y[next] ?? 0];
  return ax < bx || (ax === bx && ay <= by)
    ? { index, lx: ax, ly: ay, rx: bx, ry: by }
    : { index, lx: bx, ly: by, rx: ax, ry: ay };
}

interface SweepEvent {
  readonly side: Side;
  readonly enters: boolean;
}

/** In the order of x; at one x sides enter before others leave, so that those that only touch there are compared. */
function eventsOf(sides: readonly Side[]): SweepEvent[] {
  const events = sides.flatMap((side): SweepEvent[] => [
    { side, enters: true },
    { side, enters: false },
  ]);
  const at = ({ side, enters }: SweepEvent) => (enters ? side.lx : side.rx);
  const height = ({ side, enters }: SweepEvent) => (enters ? side.ly : side.ry);
  return events.sort((a, b) => at(a) - at(b) || Number(b.enters) - Number(a.enters) || height(a) - height(b));
}

/** Twice the area of the triangle of a side and a point: positive when the point lies above the side. */
function above({ lx, ly, rx, ry }: Side, x: number, y: number): number {
  return (rx - lx) * (y - ly) - (ry - ly) * (x - lx);
}

/** Where a side enters the order, or the side that its left end touches. */
function placeFor(cut: readonly Side[], side: Side, count: number): number | SidePair {
  let [low, high] = [0, cut.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    const other = cut[middle];
    if (!other) break;
    const height = heightAt(other, side.lx, side.ly);
    if (height === 0 && !neighbours(side, other, count)) return [other.index, side.index];
    const order = height === 0 ? above(other, side.rx, side.ry) : height;
    if (order < 0) high = middle;
    else low = middle + 1;
  }
  return low;
}

/** The sign of a point's height above a side that the sweep cuts at this x; 0 on it. */
function heightAt(side: Side, x: number, y: number): number {
  if (side.lx < side.rx) return above(side, x, y);
  return y < side.ly ? -1 : y > side.ry ? 1 : 0;
}

/** Where a side stands in the order: by its right end, or by looking at all when rounding has moved it. */
function placeOf(cut: readonly Side[], side: Side): number {
  let [low, high] = [0, cut.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    const other = cut[middle];
    if (!other || other === side) return middle;
    if (heightAt(other, side.rx, side.ry) < 0) high = middle;
    else low = middle + 1;
  }
  for (const near of [low - 1, low, low - 2, low + 1]) if (cut[near] === side) return near;
  return cut.indexOf(side);
}

function neighbours(a: Side, b: Side, count: number): boolean {
  const apart = Math.abs(a.index - b.index);
  return apart === 1 || apart === count - 1;
}

function sidesMeet(a: Side, b: Side, count: number): boolean {
  if (neighbours(a, b, count)) return runsBack(a, b);
  const [b1, b2] = [above(a, b.lx, b.ly), above(a, b.rx, b.ry)];
  const [a1, a2] = [above(b, a.lx, a.ly), above(b, a.rx, a.ry)];
  if (b1 * b2 > 0 || a1 * a2 > 0) return false;
  const overlap =
    a.lx <= b.rx &&
    b.lx <= a.rx &&
    Math.min(a.ly, a.ry) <= Math.max(b.ly, b.ry) &&
    Math.min(b.ly, b.ry) <= Math.max(a.ly, a.ry);
  return overlap;
}

/** Whether two sides with a common end leave it in the same direction. */
function runsBack(a: Side, b: Side): boolean {
  const sameLeft = a.lx === b.lx && a.ly === b.ly;
  const sameRight = a.rx === b.rx && a.ry === b.ry;
  if (!sameLeft && !sameRight) return false;
  return above(a, b.lx, b.ly) === 0 && above(a, b.rx, b.ry) === 0;
}
