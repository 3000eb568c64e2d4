import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { convexCurvature, radiiOf } from '#geometry/contour/curvature.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, UNIT, naca4, shapes } from '#tests/geometry/shapes/samples.ts';

describe('curvature', () => {
  test('of a circle is one over its radius, positive on both sides', () => {
    const point = (angle: number, turn: number) => ({
      x: 0,
      y: 0,
      dx: -2 * turn * Math.sin(angle),
      dy: 2 * turn * Math.cos(angle),
      ddx: -2 * Math.cos(angle),
      ddy: -2 * Math.sin(angle),
    });
    expect(convexCurvature(point(1, 1), 1)).toBeCloseTo(0.5, 15);
    expect(convexCurvature(point(1, -1), -1)).toBeCloseTo(0.5, 15);
  });
});

describe('nose radii', () => {
  test('of a symmetric 4-digit section: (5 · 0.2969 t)²/2', () => {
    const { noseRadius, noseRadiusUpper, noseRadiusLower } = radiiOf(naca4Outline(naca4('0012')));
    expect(noseRadius).toBeCloseTo((5 * 0.2969 * 0.12) ** 2 / 2, 15);
    expect([noseRadiusUpper, noseRadiusLower]).toEqual([noseRadius, noseRadius]);
  });

  test('of a free form: A₀²/2 on each side, the smaller for the nose, which is also the smallest convex radius', () => {
    const radii = radiiOf(cstOutline({ ...FREE_FORM, placement: undefined }));
    expect(radii.noseRadiusUpper).toBeCloseTo(0.02, 14);
    expect(radii.noseRadiusLower).toBeCloseTo(0.01125, 14);
    expect(radii.noseRadius).toBe(radii.noseRadiusLower);
    expect(radii.smallestConvexRadius).toEqual({ radius: expect.closeTo(0.01125, 12), at: { x: 0, y: 0 } });
  });

  test('a pointed nose has radius 0', () => {
    for (const shape of [
      { ...UNIT, n1: 0.75 },
      { ...UNIT, n1: 1 },
      { ...UNIT, upper: [0, 1, 1], lower: [0, -1, -1] },
    ]) {
      const radii = radiiOf(cstOutline(shape));
      expect([radii.noseRadius, radii.smallestConvexRadius]).toEqual([0, { radius: 0, at: { x: 0, y: 0 } }]);
    }
  });
});

describe('smallest radii', () => {
  test('a symmetric 4-digit section is tightest just behind its nose, where sqrt(x) and x of its polynomial add up, and nowhere hollow', () => {
    // With y = k (a₀ s + a₁ s²), x = s²: the radius is |P'|³ / (2 k a₀), |P'|² = 4 s² + k² (a₀ + 2 a₁ s)²; the higher terms are of no weight here.
    const [k, a0, a1] = [5 * 0.12, 0.2969, -0.126];
    const s = (-k * k * a0 * a1) / (2 + 2 * k * k * a1 * a1);
    const radius = (4 * s * s + (k * (a0 + 2 * a1 * s)) ** 2) ** 1.5 / (2 * k * a0);
    const { noseRadius, smallestConvexRadius, smallestConcaveRadius } = radiiOf(naca4Outline(naca4('0012')));
    expect(smallestConvexRadius.radius).toBeLessThan(0.995 * noseRadius);
    expect(Math.abs(smallestConvexRadius.radius - radius)).toBeLessThan(1e-6);
    expect(Math.abs(smallestConvexRadius.at.x - s * s)).toBeLessThan(1e-5);
    expect(smallestConcaveRadius).toBeNull();
  });

  test('the hollow belly of 4412 lies at its camber position, that of 6409 is tighter', () => {
    const hollow = radiiOf(naca4Outline(naca4('4412'))).smallestConcaveRadius!;
    expect(Math.abs(hollow.at.x - 0.4)).toBeLessThan(0.001);
    expect(hollow.radius).toBeGreaterThan(1);
    expect(radiiOf(naca4Outline(naca4('6409'))).smallestConcaveRadius!.radius).toBeLessThan(hollow.radius);
  });

  test('a rounded trailing edge counts with its radius A_n²/2', () => {
    const shape = { ...UNIT, n2: 0.5, upper: [1, 0.7, 0.2], lower: [-1, -0.7, -0.2] };
    const { smallestConvexRadius } = radiiOf(cstOutline(shape));
    expect(smallestConvexRadius.radius).toBeCloseTo(0.02, 4);
    expect(smallestConvexRadius.at.x).toBeGreaterThan(0.99);
  });

  test('no point of a dense scan is tighter', () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const outline = outlineOf(shape);
        const { smallestConvexRadius: convex, smallestConcaveRadius: hollow } = radiiOf(outline);
        const bound = 1 / convex.radius;
        for (let i = 1; i < 500; i++) {
          const t = i / 500;
          for (const sense of [-1, 1] as const) {
            const curvature = convexCurvature(
              (sense < 0 ? outline.upper : outline.lower).derivatives(t),
              sense,
            );
            expect(curvature).toBeLessThan(bound * 1.001 + 1e-6);
            expect(-curvature).toBeLessThan((hollow === null ? 1e-5 : 1.001 / hollow.radius) + 1e-6);
          }
        }
      }),
      { numRuns: 60 },
    );
  });
});
