import { type Point } from '../point.ts';
import { type Outline, type SurfaceCurve } from '../shapes/outline.ts';
import { type Contour, contourPoints } from './contour.ts';

/** Outline points looked at for each segment of the contour, and at least on each surface. */
const POINTS_PER_SEGMENT = 24;
const LEAST_POINTS = 1000;

/**
 * Largest distance from the exact outline to the segments of a contour that follows it, in fractions of chord: the chordal error, checked
 * on its own by dense sampling of the outline (24 points a segment, a parabola through each high point) and not by the rule that
 * placed the vertices. The trailing-edge face is straight and has no error.
 */
export function largestChordalError(outline: Outline, contour: Contour): number {
  const points = contourPoints(contour);
  const upper = points.slice(0, contour.noseIndex + 1).reverse();
  const lower = points.slice(contour.noseIndex);
  const [first] = points;
  if (contour.sharp && first) lower.push(first);
  return Math.max(surfaceError(outline.upper, upper), surfaceError(outline.lower, lower));
}

/** @param vertices from nose to trailing edge */
function surfaceError(surface: SurfaceCurve, vertices: readonly Point[]): number {
  const count = Math.max(LEAST_POINTS, POINTS_PER_SEGMENT * (vertices.length - 1));
  const last = vertices.length - 2;
  let segment = 0;
  let largest = 0;
  let [before, middle] = [0, 0];
  for (let i = 0; i <= count; i++) {
    const point = surface.at(i / count);
    let distance = segmentDistance(vertices, segment, point);
    while (segment < last) {
      const next = segmentDistance(vertices, segment + 1, point);
      if (next > distance) break;
      distance = next;
      segment++;
    }
    largest = Math.max(largest, distance);
    if (i >= 2 && middle > before && middle > distance) {
      const bend = before - 2 * middle + distance;
      const t = (i - 1 + (before - distance) / (2 * bend)) / count;
      const peak = surface.at(t);
      const here = segmentDistance(vertices, segment, peak);
      const previous = segment > 0 ? segmentDistance(vertices, segment - 1, peak) : here;
      largest = Math.max(largest, Math.min(here, previous));
    }
    [before, middle] = [middle, distance];
  }
  return largest;
}

function segmentDistance(vertices: readonly Point[], segment: number, point: Point): number {
  const a = vertices[segment];
  const b = vertices[segment + 1];
  if (!a || !b) return Infinity;
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const [px, py] = [point.x - a.x, point.y - a.y];
  const squared = dx * dx + dy * dy;
  const share = squared === 0 ? 0 : Math.min(1, Math.max(0, (px * dx + py * dy) / squared));
  const [ex, ey] = [px - share * dx, py - share * dy];
  return Math.sqrt(ex * ex + ey * ey);
}
