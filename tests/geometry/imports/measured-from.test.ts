import { expect, test } from 'vitest';
import { toMeasured } from '#geometry/imports/measured-from.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { measuredSchema } from '#geometry/shapes/measured.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { OPEN, SHARP, pointsOf } from './files.ts';

const lists = (points: readonly { x: number; y: number }[]) => ({
  x: points.map(({ x }) => x),
  y: points.map(({ y }) => y),
});

test('up to 2000 points are all kept', () => {
  for (const points of [SHARP, OPEN]) {
    expect(toMeasured(lists(points))).toEqual({
      shape: { kind: 'measured', ...lists(points) },
      removed: 0,
      residual: 0,
    });
  }
});

test('of more, a choice is kept that lies within a millionth of chord of the others', () => {
  const points = lists([...pointsOf(outlineOf(naca4('2412')), 1600)]);
  const { shape, removed, residual } = toMeasured(points);
  expect(shape.x.length).toBeGreaterThan(1000);
  expect(shape.x.length).toBeLessThanOrEqual(2000);
  expect(removed).toBe(3199 - shape.x.length);
  expect(residual).toBeGreaterThan(0);
  expect(residual).toBeLessThan(1e-6);
  expect(measuredSchema.safeParse(shape).success).toBe(true);
  expect(shape.x).toContain(0);
  expect([shape.x[0], shape.x.at(-1)]).toEqual([points.x[0], points.x.at(-1)]);
});

test('points that only noise sets apart are thinned to the limit as well', () => {
  const points = pointsOf(outlineOf(naca4('0012')), 1500).map(({ x, y }, i) => ({
    x,
    y: x > 0.01 && x < 0.99 ? y + (i % 3) * 1e-7 : y,
  }));
  expect(toMeasured(lists(points)).shape.x.length).toBeLessThanOrEqual(2000);
});

test('points whose curve is no outline are refused with the point', () => {
  const crossed = SHARP.map(({ x, y }, i) => ({ x, y: i > 5 && i < 9 ? -0.2 : y }));
  expect(() => toMeasured(lists(crossed))).toThrow(ShapeError);
  expect(() => toMeasured(lists(SHARP.slice(0, 9)))).toThrow('10 to 2000 points');
});
