/** The value at an index that must exist. @throws RangeError when it does not */
export function at(values: ArrayLike<number>, index: number): number {
  const value = values[index];
  if (value === undefined) throw new RangeError(`no value at ${index} of ${values.length}`);
  return value;
}

/** Points of one face in order, as parallel arrays, in mm. */
export interface Polyline {
  readonly x: Float64Array;
  readonly y: Float64Array;
}

/** The points between two polylines in step: `share` 0 gives the first, 1 the second, beyond them the straight continuation. */
export function between(from: Polyline, to: Polyline, share: number): Polyline {
  return {
    x: from.x.map((x, i) => x + share * (at(to.x, i) - x)),
    y: from.y.map((y, i) => y + share * (at(to.y, i) - y)),
  };
}

/** The signed area of a closed polyline, positive counter-clockwise, in mm². */
export function areaOf({ x, y }: Polyline): number {
  let twice = 0;
  for (let i = 0, k = x.length - 1; i < x.length; k = i++) {
    twice += at(x, k) * at(y, i) - at(x, i) * at(y, k);
  }
  return twice / 2;
}

/** The box around a polyline, in mm. */
export interface Box {
  readonly minX: number;
  readonly maxX: number;
  readonly minY: number;
  readonly maxY: number;
}

/** The box around the points of one or several polylines. */
export function boxOf(...lines: readonly Polyline[]): Box {
  const box = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity };
  for (const { x, y } of lines) {
    for (const value of x) {
      if (value < box.minX) box.minX = value;
      if (value > box.maxX) box.maxX = value;
    }
    for (const value of y) {
      if (value < box.minY) box.minY = value;
      if (value > box.maxY) box.maxY = value;
    }
  }
  return box;
}

/** A polyline through given points. */
export function polylineOf(points: readonly { readonly x: number; readonly y: number }[]): Polyline {
  return { x: Float64Array.from(points, (p) => p.x), y: Float64Array.from(points, (p) => p.y) };
}

/** The distance of (px, py) from the segment between two points. */
export function segmentDistance(
  px: number,
  py: number,
  ax: number,
  ay: number,
  bx: number,
  by: number,
): number {
  return Math.sqrt(squareDistance(px, py, ax, ay, bx, by));
}

/** The square of the distance of (px, py) from the segment between two points. */
export function squareDistance(
  px: number,
  py: number,
  ax: number,
  ay: number,
  bx: number,
  by: number,
): number {
  const dx = bx - ax;
  const dy = by - ay;
  const square = dx * dx + dy * dy;
  const share = square > 0 ? Math.min(1, Math.max(0, ((px - ax) * dx + (py - ay) * dy) / square)) : 0;
  const [x, y] = [px - ax - share * dx, py - ay - share * dy];
  return x * x + y * y;
}
