import { type Point } from '../point.ts';
import { type CurvePoint, type Outline, type SurfaceCurve } from '../shapes/outline.ts';
import { type Extents } from './contour.ts';
import { type Radii, radiiOf } from './curvature.ts';
import { type AreaProperties, areaProperties } from './quadrature.ts';
import { safeguardedRoot } from './roots.ts';
import { type Extremes, largestThicknessAndCamber } from './thickness.ts';

export { camberAt, thicknessAt } from './thickness.ts';

/** What can be measured on a section. Lengths in fractions of chord; see the parts for each definition. */
export interface Measures extends Extremes, Radii, AreaProperties {
  /** Angle between the tangents of both surfaces at the trailing edge, degrees; negative when the surfaces open towards it. */
  readonly trailingEdgeAngleDeg: number;
  /** Distance between the ends of both surfaces. */
  readonly trailingEdgeGap: number;
  /** The box around the exact outline on the sheet; a cambered 4-digit nose reaches ahead of x = 0. */
  readonly extents: Extents;
}

/** Measures the true outline; no value is taken from the shape's parameters. The shape behind it is taken as valid. */
export function measure(outline: Outline): Measures {
  const [u, l] = [outline.upper.at(1), outline.lower.at(1)];
  return {
    ...largestThicknessAndCamber(outline),
    ...radiiOf(outline),
    ...areaProperties(outline),
    trailingEdgeAngleDeg: trailingEdgeAngleDeg(outline),
    trailingEdgeGap: Math.hypot(u.x - l.x, u.y - l.y),
    extents: extentsOf(outline),
  };
}

function trailingEdgeAngleDeg(outline: Outline): number {
  const u = endTangent(outline.upper);
  const l = endTangent(outline.lower);
  return (Math.atan2(u.x * l.y - u.y * l.x, u.x * l.x + u.y * l.y) * 180) / Math.PI;
}

/** Where t = 1 is a pointed end, P'(t) is about (t − 1) P''(1): the tangent leaves along −P''. */
function endTangent(surface: SurfaceCurve): Point {
  const { dx, dy, ddx, ddy } = surface.derivatives(1);
  return Math.hypot(dx, dy) > 1e-9 ? { x: dx, y: dy } : { x: -ddx, y: -ddy };
}

const STEPS = 64;
const T_TOLERANCE = 1e-12;

/** The box around the exact outline: a scan of each surface, then the root of the derivative beside the extreme points. */
export function extentsOf(outline: Outline): Extents {
  const box = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity };
  for (const surface of [outline.upper, outline.lower]) {
    const points = Array.from({ length: STEPS + 1 }, (_, i) => surface.derivatives(i / STEPS));
    box.minX = Math.min(box.minX, -furthest(surface, points, 'x', -1));
    box.maxX = Math.max(box.maxX, furthest(surface, points, 'x', 1));
    box.minY = Math.min(box.minY, -furthest(surface, points, 'y', -1));
    box.maxY = Math.max(box.maxY, furthest(surface, points, 'y', 1));
  }
  return box;
}

/** The largest value of ±x or ±y on a surface. */
function furthest(
  surface: SurfaceCurve,
  points: readonly CurvePoint[],
  axis: 'x' | 'y',
  sign: 1 | -1,
): number {
  let top = 0;
  const value = (i: number) => sign * (points[i]?.[axis] ?? -sign * Infinity);
  for (let i = 1; i <= STEPS; i++) if (value(i) > value(top)) top = i;
  let best = value(top);
  for (const i of [top - 1, top]) {
    const [from, to] = [points[i], points[i + 1]];
    if (!from || !to || !(sign * rate(from, axis) > 0 && sign * rate(to, axis) < 0)) continue;
    const root = safeguardedRoot(
      (t) => {
        const point = surface.derivatives(t);
        return { value: sign * rate(point, axis), slope: sign * (axis === 'x' ? point.ddx : point.ddy) };
      },
      (i + 1) / STEPS,
      i / STEPS,
      (i + 0.5) / STEPS,
      T_TOLERANCE,
    );
    best = Math.max(best, sign * surface.at(root)[axis]);
  }
  return best;
}

function rate(point: CurvePoint, axis: 'x' | 'y'): number {
  return axis === 'x' ? point.dx : point.dy;
}
