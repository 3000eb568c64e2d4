import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { arcError, inflectionsOf } from '#geometry/contour/arc-error.ts';
import { largestChordalError } from '#geometry/contour/chordal-error.ts';
import { contourPoints } from '#geometry/contour/contour.ts';
import { TOLERANCE_FRACTION, sampleToTolerance } from '#geometry/contour/tolerance.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { type SurfaceCurve } from '#geometry/shapes/outline.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, deepFrozen, naca4, shapes } from '#tests/geometry/shapes/samples.ts';

/** Fewest segments over a fine grid of candidate vertices, by the shortest path over all pairs: an oracle that makes no use of convexity. */
function fewestSegments(surface: SurfaceCurve, tolerance: number, grid: number): number {
  const turns = inflectionsOf(surface);
  const steps = new Array<number>(grid + 1).fill(Infinity);
  steps[0] = 0;
  for (let i = 0; i < grid; i++) {
    for (let j = i + 1; j <= grid; j++) {
      if (steps[i]! + 1 >= steps[j]!) continue;
      if (arcError(surface, i / grid, j / grid, turns) <= tolerance) steps[j] = steps[i]! + 1;
    }
  }
  return steps[grid]!;
}

describe('sampling to a tolerance', () => {
  test('holds it, and uses it, for every shape', () => {
    const tolerances = fc.double({ min: -5, max: -2, noNaN: true }).map((exponent) => 10 ** exponent);
    fc.assert(
      fc.property(shapes, tolerances, (shape, tolerance) => {
        const outline = outlineOf(deepFrozen(shape));
        const contour = sampleToTolerance(outline, tolerance);
        expect(largestChordalError(outline, contour)).toBeLessThanOrEqual(tolerance);
        if (tolerance < 1e-3) expect(largestChordalError(outline, contour)).toBeGreaterThan(0.9 * tolerance);
        const points = contourPoints(contour);
        expect(new Set(points.map(({ x, y }) => `${x} ${y}`)).size).toBe(points.length);
      }),
      { numRuns: 60 },
    );
  });

  test('divides an S-shaped surface that one segment would do for without leaving the tolerance', () => {
    const shape = {
      kind: 'naca4',
      maxCamber: 0.026519230037370993,
      maxCamberPosition: 0.4078479844712898,
      maxThickness: 0.04525602976073496,
      trailingEdge: 'open',
    } as const;
    const outline = outlineOf(shape);
    const contour = sampleToTolerance(outline, 0.0099);
    expect(contour.x.length).toBe(6);
    expect(largestChordalError(outline, contour)).toBeLessThanOrEqual(0.0099);
  });

  test.each([
    ['0012', naca4Outline(naca4('0012'))],
    ['2412 open', naca4Outline(naca4('2412', 'open'))],
    ['4412', naca4Outline(naca4('4412'))],
    ['a free form with inflections', cstOutline(FREE_FORM)],
  ])('%s: no choice of vertices on a fine grid has fewer', (_, outline) => {
    for (const tolerance of [1e-2, 1e-3, 3e-4]) {
      const contour = sampleToTolerance(outline, tolerance);
      const upper = contour.noseIndex;
      const lower = contour.x.length - 1 - contour.noseIndex + (contour.sharp ? 1 : 0);
      expect(upper).toBeLessThanOrEqual(fewestSegments(outline.upper, tolerance, 300));
      expect(lower).toBeLessThanOrEqual(fewestSegments(outline.lower, tolerance, 300));
    }
  });

  test('a smaller tolerance takes more points, about as one over its square root', () => {
    const count = (tolerance: number) => sampleToTolerance(cstOutline(FREE_FORM), tolerance).x.length;
    const [coarse, fine] = [count(1e-4), count(1e-6)];
    expect(fine / coarse).toBeGreaterThan(9);
    expect(fine / coarse).toBeLessThan(11);
  });

  test('keeps the nose and the trailing edge, exactly', () => {
    const outline = naca4Outline(naca4('2412', 'open'));
    const { x, y, noseIndex } = sampleToTolerance(outline, 1e-4);
    expect([x[noseIndex], y[noseIndex]]).toEqual([0, 0]);
    expect([x[0], y[0]]).toEqual(Object.values(outline.upper.at(1)));
    expect([x.at(-1), y.at(-1)]).toEqual(Object.values(outline.lower.at(1)));
  });

  test('even the coarsest tolerance leaves a vertex on each surface', () => {
    const contour = sampleToTolerance(naca4Outline(naca4('0006')), TOLERANCE_FRACTION.max);
    expect([contour.x.length, contour.noseIndex]).toEqual([4, 2]);
    expect([contour.y[1]! > 0.02, contour.y[3]! < -0.02]).toEqual([true, true]);
  });

  test('gives the same points every time', () => {
    const outline = cstOutline(FREE_FORM);
    expect(sampleToTolerance(outline, 1e-5)).toEqual(sampleToTolerance(outline, 1e-5));
  });

  test('refuses a tolerance out of range', () => {
    for (const tolerance of [0, -1, 0.2, 1e-9, NaN, Infinity]) {
      expect(() => sampleToTolerance(cstOutline(FREE_FORM), tolerance)).toThrow(ShapeError);
    }
  });
});
