import { type Outline } from '../shapes/outline.ts';
import { shapeError } from '../shapes/error.ts';
import { type Contour } from './contour.ts';

/** Fewest and most points on a surface, nose and trailing edge counted. */
export const POINTS_PER_SURFACE = { min: 5, max: 2000 } as const;

/**
 * Samples both surfaces at equal steps of t, which is the cosine spacing: dense at nose and trailing edge.
 * @param pointsPerSurface 5 … 2000, nose and trailing edge counted
 * @throws ShapeError when the count is out of range
 */
export function sampleCosine(outline: Outline, pointsPerSurface: number): Contour {
  const { min, max } = POINTS_PER_SURFACE;
  if (!Number.isInteger(pointsPerSurface) || pointsPerSurface < min || pointsPerSurface > max) {
    throw shapeError('pointsPerSurface', `pointsPerSurface must be a whole number between ${min} and ${max}`);
  }
  const parameters = Float64Array.from({ length: pointsPerSurface }, (_, i) => i / (pointsPerSurface - 1));
  return contourAt(outline, parameters, parameters);
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
