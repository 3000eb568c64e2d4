import { line } from 'd3-shape';
import { type Contour } from '#geometry/contour/contour.ts';

/** Maps a chord fraction to the unit of the drawing (px, or mm in print). */
type Axis = (value: number) => number;

/**
 * The closed path of a contour: upper trailing edge, nose, lower trailing edge, and back along the trailing edge.
 * `digits` are the decimals kept in the drawing's unit.
 */
export function contourPath(contour: Contour, toX: Axis, toY: Axis, digits = 2): string {
  const { x, y } = contour;
  const path = line<number>(
    (_, index) => toX(x[index] ?? 0),
    (_, index) => toY(y[index] ?? 0),
  ).digits(digits)(x);
  return path === null ? '' : `${path}Z`;
}
