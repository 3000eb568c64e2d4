import { expect, test, vi } from 'vitest';
import { type FlowPoint } from '#geometry/flow/flow-point.ts';
import { anglesOf, sweep, sweepAll } from '#geometry/flow/sweep.ts';
import { prepared } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const section = prepared('2412', 100);

test('points come one by one, upwards from 0 and then downwards, and in order of angle at the end', () => {
  const steps = sweep(section, { reynolds: 1e6 }, { fromDeg: -2, toDeg: 3, stepDeg: 1 });
  const order: number[] = [];
  let result: FlowPoint[] = [];
  for (;;) {
    const step = steps.next();
    if (step.done) {
      result = step.value;
      break;
    }
    order.push(step.value.alphaDeg);
  }
  expect(order).toEqual([0, 1, 2, 3, -1, -2]);
  expect(result.map(({ alphaDeg }) => alphaDeg)).toEqual([-2, -1, 0, 1, 2, 3]);
  expect(result.every(({ converged }) => converged)).toBe(true);
});

test('a sweep can be left at any point', () => {
  const seen: number[] = [];
  for (const point of sweep(section, { reynolds: 1e6 }, { fromDeg: 0, toDeg: 10, stepDeg: 1 })) {
    seen.push(point.alphaDeg);
    if (seen.length === 2) break;
  }
  expect(seen).toEqual([0, 1]);
});

test('the curve ends three degrees beyond the stall', () => {
  const points = sweepAll(section, { reynolds: 5e5 }, { fromDeg: 4, toDeg: 26, stepDeg: 2 });
  const top = points.reduce((best, point) =>
    point.converged && (!best.converged || point.cl > best.cl) ? point : best,
  );
  expect(top.alphaDeg).toBeGreaterThan(10);
  expect(points.at(-1)!.alphaDeg - top.alphaDeg).toBeGreaterThanOrEqual(3);
  expect(points.at(-1)!.alphaDeg - top.alphaDeg).toBeLessThan(10);
});

test('angles meet 0 and both ends; nonsense is refused by name', () => {
  expect(anglesOf({ fromDeg: -0.3, toDeg: 0.3, stepDeg: 0.1 })).toEqual([-0.3, -0.2, -0.1, 0, 0.1, 0.2, 0.3]);
  expect(anglesOf({ fromDeg: 2, toDeg: 2, stepDeg: 1 })).toEqual([2]);
  expect(() => anglesOf({ fromDeg: -40, toDeg: 2, stepDeg: 1 })).toThrow(/fromDeg/);
  expect(() => anglesOf({ fromDeg: 3, toDeg: 2, stepDeg: 1 })).toThrow(/toDeg/);
  expect(() => anglesOf({ fromDeg: 0, toDeg: 2, stepDeg: 0 })).toThrow(/stepDeg/);
});
