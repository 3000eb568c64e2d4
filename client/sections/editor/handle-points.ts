import { type Point } from '#geometry/point.ts';
import { weightStation } from '#geometry/shapes/cst.ts';
import { type Naca4Shape, thickestStation } from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { noseCircle, outlineFor, type NoseCircle, surfacePoint } from '#client/drawing/section-points.ts';
import { type HandleId, weightOf } from './handle-ids.ts';

/** Where the camber handle of a section without camber stands. */
export const RESTING_CAMBER_POSITION = 0.4;

/** Where a handle stands, in fractions of chord on the sheet; null when the shape has no such handle. */
export function handlePoint(shape: Shape, handle: HandleId): Point | null {
  const weight = weightOf(handle);
  if (weight) {
    if (shape.kind !== 'cst' || weight.index >= shape[weight.surface].length) return null;
    return surfacePoint(shape, weight.surface, weightStation(shape, weight.surface, weight.index));
  }
  switch (handle) {
    case 'nose':
      return nosePoint(noseCircle(shape));
    case 'edge':
      return outlineFor(shape).upper.at(1);
    case 'camber':
      return shape.kind === 'naca4' ? camberCrest(shape) : null;
    case 'thickness-upper':
      return shape.kind === 'naca4' ? surfacePoint(shape, 'upper', thickestStation(shape)) : null;
    case 'thickness-lower':
      return shape.kind === 'naca4' ? surfacePoint(shape, 'lower', thickestStation(shape)) : null;
    default:
      return null;
  }
}

function camberCrest(shape: Naca4Shape): Point {
  const placed = shape.maxCamber > 0 || shape.maxCamberPosition > 0;
  return { x: placed ? shape.maxCamberPosition : RESTING_CAMBER_POSITION, y: shape.maxCamber };
}

/** The nose handle stands at the far side of the nose circle. */
function nosePoint({ nose, radius, axis }: NoseCircle): Point {
  return { x: nose.x + 2 * radius * axis.x, y: nose.y + 2 * radius * axis.y };
}
