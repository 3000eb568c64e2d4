import { type Point } from '#geometry/point.ts';
import { type Contour } from '#geometry/contour/contour.ts';
import { measure, type Measures } from '#geometry/contour/measures.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { outlineFor } from './section-points.ts';

/** Everything that is drawn of a shape, computed once for each shape. Lengths in fractions of chord. */
export interface SectionDrawing {
  readonly shape: Shape;
  readonly outline: Outline;
  readonly contour: Contour;
  readonly measures: Measures;
  /** Points of the mean camber line from nose to trailing edge. */
  readonly camber: readonly Point[];
}

/** Points on each surface: the chordal error stays below a tenth of a pixel up to a chord of about 4000 pixels. */
const POINTS_PER_SURFACE = 160;
const CAMBER_POINTS = 41;

const kept = new WeakMap<Shape, SectionDrawing>();

/** Samples and measures a shape; shapes are immutable, so the result is kept as long as the shape is. */
export function drawSection(shape: Shape): SectionDrawing {
  const known = kept.get(shape);
  if (known) return known;
  const outline = outlineFor(shape);
  const drawing: SectionDrawing = {
    shape,
    outline,
    contour: sampleCosine(outline, POINTS_PER_SURFACE),
    measures: measure(outline),
    camber: Array.from({ length: CAMBER_POINTS }, (_, i) => outline.meanLine(i / (CAMBER_POINTS - 1))),
  };
  kept.set(shape, drawing);
  return drawing;
}
