import fc from 'fast-check';
import { expect, test } from 'vitest';
import { at, polylineOf } from '#geometry/cutting/arrays.ts';
import { planCore } from '#geometry/cutting/planner.ts';
import { benchOf, checkBench, fromTowers, toTowers } from '#geometry/cutting/towers.ts';
import { PLAN, planWith } from './plans.ts';

const BENCH = { leftFaceMm: 50, rightFaceMm: 650, towerDistanceMm: 750 };

test('worked by hand: towers at 0 and 750 mm, root face at 50 mm, tip face at 650 mm', () => {
  const root = polylineOf([
    { x: 0, y: 0 },
    { x: 75, y: 15 },
    { x: 250, y: 0 },
  ]);
  const tip = polylineOf([
    { x: 30, y: 2 },
    { x: 84, y: 12.8 },
    { x: 210, y: -1.5 },
  ]);
  const { left, right } = toTowers(BENCH, root, tip);
  // Left, z = 0: factor (0 − 50) / (650 − 50) = −1/12.
  //   (0, 0) − (30, 2)/12 = (−2.5, −0.166667)
  //   (75, 15) − (9, −2.2)/12 = (74.25, 15.183333)
  //   (250, 0) − (−40, −1.5)/12 = (253.333333, 0.125)
  const leftWanted = [
    [-2.5, -1 / 6],
    [74.25, 15 + 2.2 / 12],
    [250 + 40 / 12, 0.125],
  ];
  // Right, z = 750: factor (750 − 50) / 600 = 7/6.
  //   (30, 2)·7/6 = (35, 2.333333)
  //   (75, 15) + (9, −2.2)·7/6 = (85.5, 12.433333)
  //   (250, 0) + (−40, −1.5)·7/6 = (203.333333, −1.75)
  const rightWanted = [
    [35, 14 / 6],
    [85.5, 15 - (2.2 * 7) / 6],
    [250 - 280 / 6, -1.75],
  ];
  leftWanted.forEach(([x, y], i) => {
    expect(Math.hypot(at(left.x, i) - x!, at(left.y, i) - y!)).toBeLessThan(1e-9);
  });
  rightWanted.forEach(([x, y], i) => {
    expect(Math.hypot(at(right.x, i) - x!, at(right.y, i) - y!)).toBeLessThan(1e-9);
  });
});

test('points on the towers and both faces are collinear within 1e-9 of the tower distance', () => {
  const coordinate = fc.double({ min: -500, max: 500, noNaN: true });
  const point = fc.record({ x: coordinate, y: coordinate });
  fc.assert(
    fc.property(point, point, fc.double({ min: 60, max: 700, noNaN: true }), (a, b, rightFaceMm) => {
      const bench = { ...BENCH, rightFaceMm };
      const towers = toTowers(bench, polylineOf([a]), polylineOf([b]));
      for (const [z, wanted] of [
        [50, a],
        [rightFaceMm, b],
      ] as const) {
        const back = fromTowers(bench, towers, z);
        const away = Math.hypot(at(back.x, 0) - wanted.x, at(back.y, 0) - wanted.y);
        const size = Math.max(
          1,
          ...[towers.left, towers.right].flatMap(({ x, y }) => [Math.abs(x[0]!), Math.abs(y[0]!)]),
        );
        expect(away / size).toBeLessThan(1e-9);
      }
    }),
    { numRuns: 300, seed: 9 },
  );
});

test('every node of a whole plan lies on its ruling at the towers', () => {
  const { path } = planCore(PLAN, { sheetName: 's', versionNumber: 1, checksum: 'c', part: 'core' }).core!
    .cut!;
  const bench = benchOf(PLAN);
  const towers = toTowers(bench, path.left, path.right);
  const left = fromTowers(bench, towers, bench.leftFaceMm);
  left.x.forEach((x, i) => expect(Math.abs(x - at(path.left.x, i))).toBeLessThan(1e-9 * 900));
});

test('towers closer than the panel, and a panel beside them, are findings with their field', () => {
  expect(checkBench(PLAN)).toEqual([]);
  expect(checkBench(planWith({ machine: { towerDistanceMm: 500 } }))).toMatchObject([
    { severity: 'error', code: 'towers-too-close', path: 'machine.towerDistanceMm' },
  ]);
  expect(checkBench(planWith({ machine: { blockFromLeftMm: 400 } }))).toMatchObject([
    { severity: 'error', code: 'outside-towers', path: 'machine.blockFromLeftMm' },
  ]);
});
