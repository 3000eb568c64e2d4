import { type Point } from '#geometry/point.ts';
import { type CstShape, noseRadiusOf } from '#geometry/shapes/cst.ts';
import { meanLine, naca4NoseRadius } from '#geometry/shapes/naca4.ts';
import { type Outline, parameterOf } from '#geometry/shapes/outline.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';

/** Radius and axis of the nose circle on the sheet: the circle touches the nose, and its centre lies on the axis. */
export interface NoseCircle {
  readonly nose: Point;
  readonly radius: number;
  /** Unit vector from the nose to the centre. */
  readonly axis: Point;
}

const outlines = new WeakMap<Shape, Outline>();

/** The outline of a shape, made once for each shape: shapes are immutable. */
export function outlineFor(shape: Shape): Outline {
  const known = outlines.get(shape);
  if (known) return known;
  const outline = outlineOf(shape);
  outlines.set(shape, outline);
  return outline;
}

/** The point of a surface at a construction station, 0 … 1. */
export function surfacePoint(shape: Shape, surface: 'upper' | 'lower', station: number): Point {
  return outlineFor(shape)[surface].at(parameterOf(station));
}

/**
 * The nose circle: of a 4-digit section on the line of the mean line's slope at the nose (NACA Report 824); of a free-form
 * section on its own chord line, with the mean of both surfaces' radii.
 */
export function noseCircle(shape: Shape): NoseCircle {
  if (shape.kind === 'naca4') {
    const { slope } = meanLine(shape, 0);
    const length = Math.hypot(1, slope);
    return {
      nose: { x: 0, y: 0 },
      radius: naca4NoseRadius(shape.maxThickness),
      axis: { x: 1 / length, y: slope / length },
    };
  }
  return {
    nose: outlineFor(shape).upper.at(0),
    radius: meanNoseRadius(shape) * scaleOf(shape),
    axis: chordAxis(shape),
  };
}

/** Mean of the nose radii of both surfaces, in fractions of the shape's own chord. */
export function meanNoseRadius(shape: CstShape): number {
  return (noseRadiusOf(shape, 'upper') + noseRadiusOf(shape, 'lower')) / 2;
}

/** Length of the shape's own chord on the sheet. */
export function scaleOf(shape: CstShape): number {
  return shape.placement?.scale ?? 1;
}

/** Direction of the shape's own chord on the sheet. */
function chordAxis(shape: CstShape): Point {
  const angle = ((shape.placement?.rotationDeg ?? 0) * Math.PI) / 180;
  return { x: Math.cos(angle), y: Math.sin(angle) };
}

/** Ends of the trailing edge on the sheet, upper first. */
export function edgePoints(shape: Shape): readonly [Point, Point] {
  const outline = outlineFor(shape);
  return [outline.upper.at(1), outline.lower.at(1)];
}
