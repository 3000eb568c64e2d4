import { describe, expect, test } from 'vitest';
import {
  SHEET_CHORD,
  largestOf,
  longestChordOf,
  pointsOnChord,
  residualsOf,
  shareOf,
} from '#geometry/contour/point-residuals.ts';
import { trueChordOf } from '#geometry/contour/loop.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

const outline = outlineOf(naca4('4412'));
const contour = (shift: (x: number, y: number) => number = () => 0) => {
  const points = pointsOf(outline, 60);
  return { x: points.map(({ x }) => x), y: points.map(({ x, y }) => y + shift(x, y)) };
};
const place = (points: ReturnType<typeof contour>) => (i: number) => ({ x: points.x[i]!, y: points.y[i]! });
const residuals = (points: ReturnType<typeof contour>, excluded: readonly number[] = []) =>
  residualsOf(outline, pointsOnChord(points, SHEET_CHORD), place(points), new Set(excluded));

test('points are parted at the foremost, wherever the chord lies', () => {
  const points = pointsOnChord(contour(), longestChordOf(contour()));
  expect(points.filter(({ surface }) => surface === 'upper')).toHaveLength(60 - 1);
  expect(points.every(({ x }) => x > -1e-9)).toBe(true);
  const [found, exact] = [longestChordOf(contour()), trueChordOf(outline)];
  expect(Math.abs(found.rotationDeg - exact.rotationDeg)).toBeLessThan(1e-3);
});

describe('residuals', () => {
  test('points of the outline itself have none', () => {
    expect(Math.abs(largestOf(residuals(contour()), 'size')!.deviation)).toBeLessThan(1e-12);
  });

  test('a point pushed out has a negative one: the outline lies inside it', () => {
    const found = residuals(contour((x) => (x > 0.4 && x < 0.6 ? 1e-3 : 0)));
    const upper = found.find(
      ({ surface, station }) => surface === 'upper' && Math.abs(station - 0.5) < 0.02,
    )!;
    const lower = found.find(
      ({ surface, station }) => surface === 'lower' && Math.abs(station - 0.5) < 0.02,
    )!;
    expect(Math.abs(upper.deviation + 1e-3)).toBeLessThan(1e-5);
    expect(Math.abs(lower.deviation - 1e-3)).toBeLessThan(1e-5);
    expect([upper.within, upper.allowed]).toEqual([false, 8e-4]);
  });

  test('the largest by size and by share, excluded points left out', () => {
    const points = contour((x, y) =>
      y > 0 && x > 0.48 && x < 0.52 ? 9e-4 : x > 0.05 && x < 0.06 ? 6e-4 : 0,
    );
    const found = residuals(points);
    expect(largestOf(found, 'size')!.station).toBeGreaterThan(0.4);
    expect(largestOf(found, 'share')!.station).toBeLessThan(0.1);
    expect(shareOf(found)).toBeGreaterThan(1.2);
    const outside = found.filter(({ within }) => !within).map(({ index }) => index);
    expect(shareOf(residuals(points, outside))).toBeLessThan(1);
    expect(largestOf([], 'size')).toBeUndefined();
  });
});
