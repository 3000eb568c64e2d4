import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { blendOutlines, blendShapes, blendToThickness } from '#geometry/contour/blend.ts';
import { deviationOf } from '#geometry/contour/deviation.ts';
import { measure } from '#geometry/contour/measures.ts';
import { type AnyShape, outlineOfAny } from '#geometry/contour/to-cst.ts';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { checkShape, outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, cstShapes, naca4 } from '#tests/geometry/shapes/samples.ts';
import { expectDerivatives } from '#tests/geometry/shapes/curves.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

const points = pointsOf(outlineOf(naca4('2412')), 60);
const measured: AnyShape = { kind: 'measured', x: points.map(({ x }) => x), y: points.map(({ y }) => y) };
const { placement: _, ...onSheet } = FREE_FORM;
const OTHER: CstShape = {
  ...onSheet,
  upper: [0.15, 0.2, 0.15, 0.2],
  lower: [-0.1, -0.12, -0.1],
  trailingEdgeGap: 0,
};

describe('shapes between two others', () => {
  test('the ends are the shapes themselves', () => {
    expect(blendShapes(naca4('2412'), OTHER, 0)).toEqual({ shape: naca4('2412'), residual: 0, ratio: 0 });
    expect(blendShapes(naca4('2412'), OTHER, 1)).toEqual({ shape: OTHER, residual: 0, ratio: 1 });
    expect(blendShapes(measured, OTHER, 0).shape.kind).toBe('cst');
  });

  test('4-digit sections give the one with the values between; a symmetric one takes the other’s camber position', () => {
    expect(blendShapes(naca4('2412'), naca4('4416'), 0.5)).toEqual({
      shape: naca4('3414'),
      residual: 0,
      ratio: 0.5,
    });
    expect(blendShapes(naca4('0012'), naca4('4412'), 0.25).shape).toMatchObject({
      maxCamber: 0.01,
      maxCamberPosition: 0.4,
    });
  });

  test('free forms of different orders blend exactly, point by point', () => {
    fc.assert(
      fc.property(cstShapes(), cstShapes(), fc.double({ min: 0, max: 1, noNaN: true }), (a, b, ratio) => {
        const { shape, residual } = blendShapes(a, b, ratio);
        expect(residual).toBe(0);
        const [p, q, r] = [a, b, shape].map(outlineOf);
        for (const t of [0.1, 0.4, 0.7, 1]) {
          for (const surface of ['upper', 'lower'] as const) {
            const y = (1 - ratio) * p![surface].at(t).y + ratio * q![surface].at(t).y;
            expect(Math.abs(r![surface].at(t).y - y)).toBeLessThan(1e-14);
          }
        }
      }),
      { numRuns: 30 },
    );
  });

  test('a placement is blended with no placement as the sheet’s chord', () => {
    const { shape } = blendShapes(FREE_FORM, OTHER, 0.5);
    const { x, y, rotationDeg, scale } = (shape as CstShape).placement!;
    expect([x, y, rotationDeg]).toEqual([-0.0005, 0.0015, -0.2]);
    expect(Math.abs(scale - 1.00025)).toBeLessThan(1e-15);
  });

  test('other pairs are fitted, and the residual says how closely', () => {
    for (const [a, b] of [[naca4('2412'), OTHER], [measured, naca4('0012')], [naca4('2412'), naca4('2412', 'open')], [OTHER, { ...OTHER, n2: 1.1 }]] as const) {
      const { shape, residual } = blendShapes(a, b, 0.4);
      expect(checkShape(shape)).toEqual(shape);
      expect(residual).toBeLessThan(2e-4);
      const wanted = blendOutlines(outlineOfAny(a), outlineOfAny(b), 0.4);
      const { largest } = deviationOf(wanted, outlineOf(shape), 'sheet');
      expect(Math.abs(largest.deviation)).toBeLessThan(1.2 * residual + 1e-9);
    }
  }); // prettier-ignore

  test('a ratio out of range is refused', () => {
    for (const ratio of [-0.1, 1.1, NaN]) {
      expect(() => blendShapes(OTHER, OTHER, ratio)).toThrow('ratio must be between 0 and 1');
    }
  });
});

test('an outline between two has their breaks, derivatives and mean line', () => {
  const outline = blendOutlines(outlineOf(naca4('2412')), outlineOf(naca4('4612')), 0.3);
  expect(outline.upper.breaks).toHaveLength(2);
  expectDerivatives(outline.upper, [0.2, 0.4, 0.9]);
  expect(outline.sharp).toBe(true);
  expect(outline.meanLine(0.5).x).toBe(0.5);
});

describe('the ratio that gives a thickness', () => {
  test.each([
    ['4-digit', naca4('2412'), naca4('4420'), 0.15],
    ['free forms', OTHER, onSheet, 0.13],
    ['of different kinds', naca4('0010'), OTHER, 0.105],
  ] as const)('%s', (_, a, b, wanted) => {
    const found = blendToThickness(a, b, wanted);
    const thickness =
      found.shape.kind === 'naca4' ? found.shape.maxThickness : measure(outlineOf(found.shape)).maxThickness;
    expect(Math.abs(thickness - wanted)).toBeLessThan(1e-9 + 2 * found.residual);
    expect(found.ratio).toBeGreaterThan(0);
    expect(found.ratio).toBeLessThan(1);
  });

  test('a thickness that neither reaches is refused with the range', () => {
    expect(() => blendToThickness(naca4('2412'), naca4('2415'), 0.2)).toThrow(
      'between 12 % and 15 % of chord',
    );
    expect(blendToThickness(naca4('2412'), naca4('4412'), 0.12).ratio).toBe(0);
  });
});
