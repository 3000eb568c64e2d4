import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { matchFourDigits } from '#geometry/contour/four-digit-match.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

const contour = (outline: Outline, pointsPerSurface = 50) => {
  const points = pointsOf(outline, pointsPerSurface);
  return { x: points.map(({ x }) => x), y: points.map(({ y }) => y) };
};

describe('a 4-digit section in points', () => {
  test.each(['0012', '2412', '4415', '6409', '0006'])(
    '%s is found by its digits, open and closed',
    (digits) => {
      for (const edge of ['open', 'closed'] as const) {
        const match = matchFourDigits(contour(outlineOf(naca4(digits, edge))))!;
        expect(match.shape).toEqual(naca4(digits, edge));
        expect(match.designation).toBe(`NACA ${digits}`);
        expect(Math.abs(match.largest.deviation)).toBeLessThan(1e-5);
        expect(Math.abs(match.rotationDeg)).toBeLessThan(1e-3);
      }
    },
  );

  test('coarse points are enough', () => {
    expect(matchFourDigits(contour(outlineOf(naca4('2412')), 10))!.designation).toBe('NACA 2412');
  });

  test('points turned onto their longest chord are found as well', () => {
    const [c, s] = [Math.cos(0.0031), Math.sin(0.0031)];
    const { x, y } = contour(outlineOf(naca4('4412')));
    const nose = { x: -0.0003, y: 0.003086 };
    const turned = {
      x: x.map((value, i) => (c * (value - nose.x) - s * (y[i]! - nose.y)) / 1.0003),
      y: y.map((value, i) => (s * (x[i]! - nose.x) + c * (value - nose.y)) / 1.0003),
    };
    const match = matchFourDigits(turned)!;
    expect(match.designation).toBe('NACA 4412');
    expect(Math.abs(match.rotationDeg - (0.0031 * 180) / Math.PI)).toBeLessThan(2e-3);
  });

  test('values between digits are found when no digits are near', () => {
    const between = { ...naca4('2412'), maxCamber: 0.0247, maxCamberPosition: 0.44, maxThickness: 0.1253 };
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 0.03, noNaN: true }), (maxCamber) => {
        const match = matchFourDigits(contour(outlineOf({ ...between, maxCamber })))!;
        expect(match.designation).toBe(null);
        expect(Math.abs(match.shape.maxCamber - maxCamber)).toBeLessThan(1e-4);
        expect(Math.abs(match.shape.maxThickness - between.maxThickness)).toBeLessThan(1e-4);
        expect(Math.abs(match.shape.maxCamberPosition - between.maxCamberPosition)).toBeLessThan(2e-3);
      }),
      { numRuns: 6 },
    );
  });

  test('no match for a free form, but for one that an excluded point spoils', () => {
    expect(matchFourDigits(contour(cstOutline(FREE_FORM)))).toBe(null);
    const { x, y } = contour(outlineOf(naca4('2412')));
    const spoiled = { x, y: y.map((value, i) => (i === 20 ? value + 0.004 : value)) };
    expect(matchFourDigits(spoiled)).toBe(null);
    expect(matchFourDigits(spoiled, [20])!.designation).toBe('NACA 2412');
  });
});
