import { expect, test } from 'vitest';
import { deviationOf } from '#geometry/contour/deviation.ts';
import { fitCst } from '#geometry/contour/fitting.ts';
import { fitClosely, outlineOfAny, toCst } from '#geometry/contour/to-cst.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { type MeasuredShape } from '#geometry/shapes/measured.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

const points = pointsOf(outlineOf(naca4('2412')), 60);
const measured: MeasuredShape = {
  kind: 'measured',
  x: points.map(({ x }) => x),
  y: points.map(({ y }) => y),
};

test('a free form stays itself, others are fitted with their residual', () => {
  expect(toCst(FREE_FORM)).toEqual({ shape: FREE_FORM, residual: 0 });
  for (const shape of [naca4('2412'), measured]) {
    const { shape: found, residual } = toCst(shape);
    expect(residual).toBeGreaterThan(0);
    expect(residual).toBeLessThan(2e-4);
    const { largest } = deviationOf(outlineOfAny(shape), cstOutline(found), 'sheet');
    expect(Math.abs(largest.deviation)).toBeLessThan(1.1 * residual);
  }
});

test('the order is no higher than it must be for 0.01 % of chord', () => {
  const source = outlineOf(naca4('2412'));
  const order = fitClosely(source).shape.upper.length - 1;
  expect(order).toBeGreaterThan(6);
  expect(fitCst(source, { orderUpper: order, orderLower: order }).residual.largest).toBeLessThanOrEqual(1e-4);
  const lower = fitCst(source, { orderUpper: order - 1, orderLower: order - 1 });
  expect(lower.residual.largest).toBeGreaterThan(1e-4);
  expect(
    fitClosely(cstOutline({ ...FREE_FORM, lower: FREE_FORM.upper.map((w) => -w) })).shape.upper,
  ).toHaveLength(7);
});

test('what no free form can be is refused', () => {
  const wide = points.map(({ x, y }, i) => ({ x, y: y + (i < 60 ? 0.04 : -0.04) * x }));
  const open: MeasuredShape = { kind: 'measured', x: wide.map(({ x }) => x), y: wide.map(({ y }) => y) };
  expect(() => toCst(open)).toThrow(ShapeError);
});
