import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { camberAt, largestThicknessAndCamber, thicknessAt } from '#geometry/contour/thickness.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { halfThickness, naca4Outline } from '#geometry/shapes/naca4.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, UNIT, cstShapes, naca4, shapes } from '#tests/geometry/shapes/samples.ts';

describe('thickness and camber at a station', () => {
  test('of a symmetric section: twice the half-thickness, no camber', () => {
    const shape = naca4('0012', 'open');
    for (const station of [0, 1e-4, 0.1, 0.3, 0.7, 1]) {
      expect(
        Math.abs(thicknessAt(naca4Outline(shape), station) - 2 * halfThickness(shape, station)),
      ).toBeLessThan(1e-13);
      expect(Math.abs(camberAt(naca4Outline(shape), station))).toBeLessThan(1e-15);
    }
  });

  test('of a free form: difference and half sum of its ordinates', () => {
    fc.assert(
      fc.property(cstShapes(), fc.double({ min: 0, max: 1, noNaN: true }), (shape, station) => {
        const [u, l] = [ordinateAt(shape, 'upper', station), ordinateAt(shape, 'lower', station)];
        expect(Math.abs(thicknessAt(cstOutline(shape), station) - (u - l))).toBeLessThan(1e-11);
        expect(Math.abs(camberAt(cstOutline(shape), station) - (u + l) / 2)).toBeLessThan(1e-11);
      }),
    );
  });

  test('does not depend on where the shape is placed, but grows with its scale', () => {
    const plain = cstOutline({ ...FREE_FORM, placement: undefined });
    const placed = cstOutline(FREE_FORM);
    for (const station of [0.1, 0.5, 0.9]) {
      expect(thicknessAt(placed, station)).toBeCloseTo(1.0005 * thicknessAt(plain, station), 13);
      expect(camberAt(placed, station)).toBeCloseTo(1.0005 * camberAt(plain, station), 13);
    }
  });

  test('a station off the chord is refused', () => {
    for (const station of [-0.001, 1.001, NaN]) {
      expect(() => thicknessAt(cstOutline(UNIT), station)).toThrow(ShapeError);
      expect(() => camberAt(cstOutline(UNIT), station)).toThrow(
        'station must be between 0 % and 100 % of chord',
      );
    }
  });
});

describe('the largest', () => {
  test.each([
    ['open', 1.000288, 0.29983],
    ['closed', 1.000119, 0.29953],
  ] as const)('thickness of 0012, %s edge, as computed from the polynomial', (edge, factor, station) => {
    const found = largestThicknessAndCamber(naca4Outline(naca4('0012', edge)));
    expect(Math.abs(found.maxThickness - 0.12 * factor)).toBeLessThan(1e-7);
    expect(Math.abs(found.maxThicknessPosition - station)).toBeLessThan(1e-5);
    expect([found.maxCamber, found.maxCamberPosition]).toEqual([0, 0]);
  });

  test('of the unit shape: 2·sqrt(1/3)·2/3 at a third', () => {
    const found = largestThicknessAndCamber(cstOutline(UNIT));
    expect(Math.abs(found.maxThickness - (4 / 3) * Math.sqrt(1 / 3))).toBeLessThan(1e-14);
    expect(Math.abs(found.maxThicknessPosition - 1 / 3)).toBeLessThan(1e-9);
  });

  test('camber of the true outline is near the construction line, and negative for a section turned over', () => {
    const found = largestThicknessAndCamber(naca4Outline(naca4('2412')));
    expect(Math.abs(found.maxCamber - 0.02)).toBeLessThan(1e-6);
    expect(Math.abs(found.maxCamberPosition - 0.4)).toBeLessThan(0.003);
    const turned = {
      ...FREE_FORM,
      placement: undefined,
      upper: FREE_FORM.lower.map((w) => -w),
      lower: FREE_FORM.upper.map((w) => -w),
    };
    const plain = largestThicknessAndCamber(cstOutline({ ...FREE_FORM, placement: undefined }));
    const mirrored = largestThicknessAndCamber(cstOutline(turned));
    expect(mirrored.maxCamber).toBeCloseTo(-plain.maxCamber, 14);
    expect(mirrored.maxCamberPosition).toBeCloseTo(plain.maxCamberPosition, 10);
    expect(mirrored.maxThickness).toBeCloseTo(plain.maxThickness, 14);
  });

  test('no station of a dense scan has more, and the stated station has as much', () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const outline = outlineOf(shape);
        const found = largestThicknessAndCamber(outline);
        for (let i = 0; i <= 200; i++) {
          const station = (1 - Math.cos((Math.PI * i) / 200)) / 2;
          expect(thicknessAt(outline, station)).toBeLessThanOrEqual(found.maxThickness + 1e-9);
          expect(Math.abs(camberAt(outline, station))).toBeLessThanOrEqual(Math.abs(found.maxCamber) + 1e-9);
        }
        expect(Math.abs(thicknessAt(outline, found.maxThicknessPosition) - found.maxThickness)).toBeLessThan(
          1e-11,
        );
        expect(Math.abs(camberAt(outline, found.maxCamberPosition) - found.maxCamber)).toBeLessThan(1e-11);
      }),
      { numRuns: 60 },
    );
  });
});
