import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitPoints } from '#geometry/contour/fit-points.ts';
import { exportFile, parseExportOptions } from '#geometry/formats/export.ts';
import { readCoordinates } from '#geometry/imports/coordinates.ts';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, cstShapes, naca4 } from '#tests/geometry/shapes/samples.ts';
import { bytesOf, pointsOf } from '#tests/geometry/imports/files.ts';
import { MARSH } from '#tests/geometry/formats/identity-example.ts';

const contour = (shape: Parameters<typeof outlineOf>[0], pointsPerSurface = 50) => {
  const points = pointsOf(outlineOf(shape), pointsPerSurface);
  return { x: points.map(({ x }) => x), y: points.map(({ y }) => y) };
};
const { placement: _, ...onSheet } = FREE_FORM;
const orders = (shape: CstShape) => ({ upper: shape.upper.length - 1, lower: shape.lower.length - 1 });

describe('fit of points', () => {
  test('a free form on the sheet’s chord is found again weight by weight', () => {
    const { shape, met, largest, outside } = fitPoints(contour(onSheet), { order: orders(onSheet) });
    expect(shape.placement).toBeUndefined();
    for (const surface of ['upper', 'lower'] as const) {
      shape[surface].forEach((weight, i) =>
        expect(Math.abs(weight - onSheet[surface][i]!)).toBeLessThan(1e-9),
      );
    }
    expect(Math.abs(largest.deviation)).toBeLessThan(1e-12);
    expect([met, outside]).toEqual([true, []]);
  });

  test('fit(import(export(shape))) lies within 1e-6 of chord, in six decimals and in mm', () => {
    fc.assert(
      fc.property(cstShapes(), fc.constantFrom(undefined, 250), (shape, chordMm) => {
        fc.pre(shape.upper[0]! - shape.lower[0]! > 0.1 && shape.upper.length < 9 && shape.lower.length < 9);
        const options = parseExportOptions('dat', { points: 60, ...(chordMm ? { chordMm } : {}) });
        const text = exportFile('dat', shape, MARSH, options).text;
        const read = readCoordinates(bytesOf(text), 'marsh.dat');
        // A section that reaches ahead of its own nose point is not imported on its own chord.
        fc.pre(Math.abs(read.x[59]!) < 1e-5 && Math.abs(read.y[59]!) < 1e-5 && Math.min(...read.x) > -1e-6);
        expect(Math.abs(fitPoints(read, { order: orders(shape) }).largest.deviation)).toBeLessThan(1e-6);
      }),
      { numRuns: 12 },
    );
  });

  test('the automatic order is the lowest of each surface that meets the tolerance', () => {
    for (const digits of ['0012', '2412', '6412']) {
      const points = contour(naca4(digits), 80);
      const { shape, met } = fitPoints(points, { order: 'auto' });
      expect(met).toBe(true);
      const { upper, lower } = orders(shape);
      for (const lowered of [
        { upper: upper - 1, lower },
        { upper, lower: lower - 1 },
      ]) {
        if (Math.min(lowered.upper, lowered.lower) < 2) continue;
        expect(fitPoints(points, { order: lowered }).met).toBe(false);
      }
    }
  });

  test('a cambered 4-digit nose is followed on its longest chord', () => {
    const { shape, largest, met } = fitPoints(contour(naca4('4412'), 80), { order: { upper: 8, lower: 8 } });
    expect(Math.abs(shape.placement!.rotationDeg + 0.1768)).toBeLessThan(2e-3);
    expect(met).toBe(true);
    expect(Math.abs(largest.deviation)).toBeLessThan(3e-4);
  });

  test('a 4-digit match is offered beside the fit', () => {
    expect(fitPoints(contour(naca4('2412')), { order: 'auto' }).fourDigit!.designation).toBe('NACA 2412');
    expect(fitPoints(contour(onSheet), { order: 'auto' }).fourDigit).toBe(null);
  });
});

describe('points out of tolerance', () => {
  const bumped = () => {
    const { x, y } = contour(onSheet);
    return { x, y: y.map((value, i) => (i === 20 ? value + 0.003 : value)) };
  };

  test('are named, with the largest deviation and its place', () => {
    const fit = fitPoints(bumped(), { order: { upper: 6, lower: 4 } });
    expect(fit.met).toBe(false);
    expect(fit.outside).toContain(20);
    expect(fit.largest).toMatchObject({ index: 20, surface: 'upper', within: false, excluded: false });
    expect(fit.largest.deviation).toBeLessThan(-1e-3);
    expect(fit.verdict).toMatch(
      /^Out of the usual tolerance .* 1 of 99 points\. Largest deviation 0\.\d+ % of chord inside/,
    );
  });

  test('can be left out: the fit then follows the others, and says so', () => {
    const fit = fitPoints(bumped(), { order: { upper: 6, lower: 4 }, excluded: [20] });
    expect(fit.met).toBe(true);
    expect(Math.abs(fit.largest.deviation)).toBeLessThan(1e-9);
    expect(fit.residuals[20]).toMatchObject({ excluded: true, within: false });
    expect(fit.verdict).toMatch(/^Within .* 1 point left out\.$/);
  });
});

describe('refused', () => {
  const issue = (call: () => unknown) => {
    try {
      call();
    } catch (error) {
      if (error instanceof ShapeError) return error.issues[0]!;
      throw error;
    }
    return null;
  };

  test('orders out of range or beyond the points', () => {
    const points = contour(onSheet, 6);
    expect(issue(() => fitPoints(points, { order: { upper: 1, lower: 4 } }))).toEqual({
      path: 'order.upper',
      message: 'the order must be a whole number between 2 and 12',
    });
    expect(issue(() => fitPoints(points, { order: { upper: 3, lower: 5 } }))).toEqual({
      path: 'order.lower',
      message: 'the lower surface has 4 points between its ends, too few for order 5',
    });
  });

  test('too many points left out', () => {
    const points = contour(onSheet, 20);
    const excluded = points.x.map((_, i) => i);
    expect(issue(() => fitPoints(points, { order: 'auto', excluded }))!.message).toContain(
      'too few for a fit',
    );
  });

  test('a trailing edge that is too open for a free form', () => {
    const { x, y } = contour(onSheet);
    const open = { x, y: y.map((value, i) => value + (i < 50 ? 0.04 : -0.04) * x[i]!) };
    expect(issue(() => fitPoints(open, { order: 'auto' }))!.path).toBe('trailingEdgeGap');
  });
});
