import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { withCamber, withThickness, withTrailingEdgeGap } from '#geometry/contour/adjust.ts';
import { measure } from '#geometry/contour/measures.ts';
import { type AnyShape } from '#geometry/contour/to-cst.ts';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { type Shape, checkShape, outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, cstShapes, naca4 } from '#tests/geometry/shapes/samples.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

const points = pointsOf(outlineOf(naca4('2412')), 60);
const measured: AnyShape = { kind: 'measured', x: points.map(({ x }) => x), y: points.map(({ y }) => y) };
const measures = (shape: Shape) => measure(outlineOf(checkShape(shape)));
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const mean = (shape: CstShape, x: number) =>
  (ordinateAt(shape, 'upper', x) + ordinateAt(shape, 'lower', x)) / 2;

describe('thickness scaled to a value', () => {
  test('a free form has it exactly and keeps its mean line', () => {
    fc.assert(
      fc.property(cstShapes(), between(0.06, 0.3), (shape, wanted) => {
        fc.pre(shape.trailingEdgeGap === 0);
        const { shape: found, residual } = withThickness(shape, wanted);
        expect(residual).toBe(0);
        expect(Math.abs(measures(found).maxThickness - wanted)).toBeLessThan(1e-9);
        for (const x of [0.05, 0.3, 0.8]) {
          expect(Math.abs(mean(found as CstShape, x) - mean(shape, x))).toBeLessThan(1e-14);
        }
      }),
      { numRuns: 25 },
    );
  });

  test('a 4-digit section stays one, a measured contour is fitted', () => {
    expect(withThickness(naca4('2412'), 0.15)).toEqual({ shape: naca4('2415'), residual: 0 });
    const { shape, residual } = withThickness(measured, 0.15);
    expect(Math.abs(measures(shape).maxThickness - 0.15)).toBeLessThan(1e-9);
    expect(residual).toBeGreaterThan(0);
    expect(residual).toBeLessThan(2e-4);
  });

  test('the gap scales with it; its own thickness changes nothing', () => {
    const { maxThickness, trailingEdgeGap } = measures(FREE_FORM);
    const doubled = withThickness({ ...FREE_FORM, trailingEdgeGap: 0.02 }, 0.1).shape as CstShape;
    expect(doubled.trailingEdgeGap).toBeLessThan(0.02);
    expect(
      Math.abs(measures(withThickness(FREE_FORM, maxThickness).shape).trailingEdgeGap - trailingEdgeGap),
    ).toBeLessThan(1e-15);
  });

  test('refused out of range', () => {
    expect(() => withThickness(naca4('2412'), 0)).toThrow('thickness must be above 0 % of chord');
    expect(() => withThickness(naca4('2412'), 0.5)).toThrow(
      'maxThickness must be between 1 % and 40 % of chord',
    );
    expect(() => withThickness(FREE_FORM, NaN)).toThrow('thickness');
  });
});

describe('camber scaled to a value', () => {
  test('a free form has it exactly and keeps its thickness', () => {
    fc.assert(
      fc.property(cstShapes(), between(-0.03, 0.05), (shape, wanted) => {
        const before = measures(shape);
        fc.pre(Math.abs(before.maxCamber) > 0.01 && Math.abs(wanted) > 1e-3);
        const found = (() => {
          try {
            return withCamber(shape, wanted);
          } catch {
            return null;
          }
        })();
        fc.pre(found !== null);
        const after = measures(found!.shape);
        expect(Math.abs(after.maxCamber - wanted)).toBeLessThan(1e-9);
        expect(Math.abs(after.maxThickness - before.maxThickness)).toBeLessThan(1e-9);
      }),
      { numRuns: 25 },
    );
  });

  test('a 4-digit section stays one, a measured contour is fitted, 0 makes symmetric', () => {
    expect(withCamber(naca4('2412'), 0.04)).toEqual({ shape: naca4('4412'), residual: 0 });
    expect(Math.abs(measures(withCamber(measured, 0.03).shape).maxCamber - 0.03)).toBeLessThan(1e-9);
    const flat = withCamber(FREE_FORM, 0).shape as CstShape;
    flat.upper.forEach((weight, i) => expect(Math.abs(weight + flat.lower[i]!)).toBeLessThan(1e-15));
  });

  test('refused without camber', () => {
    for (const shape of [naca4('0012'), { ...FREE_FORM, lower: FREE_FORM.upper.map((w) => -w) }]) {
      expect(() => withCamber(shape, 0.02)).toThrow('no camber that could be scaled');
      expect(withCamber(shape, 0).residual).toBe(0);
    }
    expect(() => withCamber(naca4('2412'), -0.02)).toThrow('maxCamber');
    expect(() => withCamber(FREE_FORM, Infinity)).toThrow('camber must be a number');
  });
});

describe('trailing edge opened or closed', () => {
  test('to a gap in mm at a chord, a free form exactly, its placement counted', () => {
    fc.assert(
      fc.property(between(0, 5), between(100, 400), (gapMm, chordMm) => {
        const { shape, residual } = withTrailingEdgeGap(FREE_FORM, gapMm, chordMm);
        expect(residual).toBe(0);
        expect(Math.abs(measures(shape).trailingEdgeGap * chordMm - gapMm)).toBeLessThan(1e-9);
      }),
      { numRuns: 20 },
    );
  });

  test('a 4-digit section stays one for its own two edges, and is fitted for others', () => {
    const open = naca4('2412', 'open');
    expect(withTrailingEdgeGap(open, 0, 200)).toEqual({ shape: naca4('2412'), residual: 0 });
    expect(withTrailingEdgeGap(naca4('2412'), 0.021 * 0.12 * 200, 200).shape).toEqual(open);
    const { shape, residual } = withTrailingEdgeGap(open, 1.5, 200);
    expect(shape.kind).toBe('cst');
    expect(residual).toBeLessThan(1.5e-4);
    expect(Math.abs(measures(shape).trailingEdgeGap * 200 - 1.5)).toBeLessThan(1e-9);
  });

  test('surfaces move by a wedge: nothing at the nose, half the change at the edge', () => {
    const { shape } = withTrailingEdgeGap(
      { ...FREE_FORM, trailingEdgeGap: 0 },
      4,
      200 / FREE_FORM.placement!.scale,
    );
    for (const x of [0, 0.25, 1]) {
      const change =
        ordinateAt(shape as CstShape, 'upper', x) -
        ordinateAt({ ...FREE_FORM, trailingEdgeGap: 0 }, 'upper', x);
      expect(Math.abs(change - 0.01 * x)).toBeLessThan(1e-9);
    }
  });

  test('refused out of range', () => {
    expect(() => withTrailingEdgeGap(FREE_FORM, 11, 200)).toThrow(
      'gapMm must be between 0 and 10 mm, 5 % of the chord',
    );
    expect(() => withTrailingEdgeGap(FREE_FORM, -1, 200)).toThrow('gapMm');
    expect(() => withTrailingEdgeGap(FREE_FORM, 1, 0)).toThrow('chordMm must be above 0');
  });
});
