import { type Point } from '../point.ts';
import { type Outline } from '../shapes/outline.ts';

/**
 * The drawn outline as points: from the trailing edge of the upper surface round the nose to that of the lower, counter-clockwise.
 * Sharp: the common trailing-edge point stands once, at index 0, and the last segment closes onto it. Blunt: the first and last point
 * differ by the gap, and the closing segment is the trailing-edge face. No point stands twice.
 */
export interface Contour {
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Index of the nose point, where the surfaces meet. */
  readonly noseIndex: number;
  readonly sharp: boolean;
}

/** The box around something drawn. */
export interface Extents {
  readonly minX: number;
  readonly maxX: number;
  readonly minY: number;
  readonly maxY: number;
}

/** The contour enlarged from the origin, as to the chord in mm. @param factor finite and above 0 @throws RangeError otherwise */
export function scaleContour(contour: Contour, factor: number): Contour {
  if (!(factor > 0 && Number.isFinite(factor))) throw new RangeError(`factor must be above 0, not ${factor}`);
  return { ...contour, x: contour.x.map((x) => x * factor), y: contour.y.map((y) => y * factor) };
}

/** The box around the points of a contour (of the points, not of the curve between them). */
export function extents(contour: Contour): Extents {
  const box = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity };
  for (const x of contour.x) {
    if (x < box.minX) box.minX = x;
    if (x > box.maxX) box.maxX = x;
  }
  for (const y of contour.y) {
    if (y < box.minY) box.minY = y;
    if (y > box.maxY) box.maxY = y;
  }
  return box;
}

/** The points in order, as objects. */
export function contourPoints(contour: Contour): Point[] {
  return Array.from(contour.x, (x, i) => ({ x, y: contour.y[i] ?? 0 }));
}

/** The contour through the points at given parameters, each list ascending from 0 to 1. */
export function contourAt(outline: Outline, upper: ArrayLike<number>, lower: ArrayLike<number>): Contour {
  const noseIndex = upper.length - 1;
  const count = upper.length + lower.length - 1 - (outline.sharp ? 1 : 0);
  const x = new Float64Array(count);
  const y = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const onUpper = i <= noseIndex;
    const t = onUpper ? upper[noseIndex - i] : lower[i - noseIndex];
    const point = (onUpper ? outline.upper : outline.lower).at(t ?? 0);
    x[i] = point.x;
    y[i] = point.y;
  }
  return { x, y, noseIndex, sharp: outline.sharp };
}
