import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { contourPoints } from '#geometry/contour/contour.ts';
import { POINTS_PER_SURFACE, sampleCosine } from '#geometry/contour/sampling.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { UNIT, cstShapes, deepFrozen, naca4, shapes } from '#tests/geometry/shapes/samples.ts';

const counts = fc.integer({ min: POINTS_PER_SURFACE.min, max: 300 });

describe('cosine sampling', () => {
  test('stations of a free form are the cosine spacing', () => {
    const { x, noseIndex } = sampleCosine(cstOutline(UNIT), 11);
    for (let i = 0; i <= 10; i++) {
      expect(Math.abs(x[noseIndex - i]! - (1 - Math.cos((Math.PI * i) / 10)) / 2)).toBeLessThan(1e-15);
    }
  });

  test('counts nose and trailing edge; the sharp end once, the blunt end twice', () => {
    const sharp = sampleCosine(naca4Outline(naca4('2412', 'closed')), 50);
    expect([sharp.x.length, sharp.noseIndex, sharp.x[0], sharp.y[0]]).toEqual([98, 49, 1, 0]);
    const blunt = sampleCosine(naca4Outline(naca4('2412', 'open')), 50);
    expect([blunt.x.length, blunt.noseIndex]).toEqual([99, 49]);
    expect(Math.hypot(blunt.x[0]! - blunt.x[98]!, blunt.y[0]! - blunt.y[98]!)).toBeCloseTo(0.00252, 15);
  });

  test('no point stands twice, every point is finite, and the way is counter-clockwise', () => {
    fc.assert(
      fc.property(fc.oneof(shapes, cstShapes('any')), counts, (shape, count) => {
        const points = contourPoints(sampleCosine(outlineOf(deepFrozen(shape)), count));
        expect(points.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y))).toBe(true);
        expect(new Set(points.map(({ x, y }) => `${x} ${y}`)).size).toBe(points.length);
        const area = points.reduce((sum, a, i) => {
          const b = points[(i + 1) % points.length]!;
          return sum + a.x * b.y - b.x * a.y;
        }, 0);
        expect(area).toBeGreaterThan(0);
      }),
    );
  });

  test('a symmetric section has a symmetric contour', () => {
    const { x, y, noseIndex } = sampleCosine(naca4Outline(naca4('0015', 'open')), 80);
    for (let i = 0; i <= noseIndex; i++) {
      expect([x[noseIndex - i], y[noseIndex - i]]).toEqual([x[noseIndex + i], 0 - y[noseIndex + i]!]);
    }
  });

  test('stations run one way along each surface of a section without camber', () => {
    fc.assert(
      fc.property(cstShapes('any'), counts, (shape, count) => {
        const { x, noseIndex } = sampleCosine(cstOutline(shape), count);
        for (let i = 1; i < x.length; i++) {
          if (i <= noseIndex) expect(x[i]!).toBeLessThan(x[i - 1]!);
          else expect(x[i]!).toBeGreaterThan(x[i - 1]!);
        }
      }),
    );
  });

  test('refuses a count out of range', () => {
    for (const count of [4, 2001, 10.5, NaN, Infinity]) {
      expect(() => sampleCosine(cstOutline(UNIT), count)).toThrow(ShapeError);
    }
    expect(sampleCosine(cstOutline(UNIT), POINTS_PER_SURFACE.max).x).toHaveLength(3998);
  });
});
