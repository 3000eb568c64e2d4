import { type Outline } from '../shapes/outline.ts';
import { shapeError } from '../shapes/error.ts';
import { type Contour, contourAt } from './contour.ts';

export { largestChordalError } from './chordal-error.ts';
export { TOLERANCE_FRACTION, sampleToTolerance } from './tolerance.ts';

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
