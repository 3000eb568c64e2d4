import { expect, test } from 'vitest';
import { curveFigures } from '#geometry/flow/curve-figures.ts';
import { type FlowPoint } from '#geometry/flow/flow-point.ts';

const EVENTS = {
  transition: 0.5,
  forced: false,
  laminarSeparation: null,
  reattachment: null,
  turbulentSeparation: null,
};

/** A made-up curve: cl = 0.1 (α + 2) up to a parabola with its top at 12.5°, drag a parabola round cl 0.4. */
function curve(change: (point: FlowPoint) => FlowPoint = (point) => point): FlowPoint[] {
  return Array.from({ length: 22 }, (_, i) => {
    const alphaDeg = i - 5;
    const straight = 0.1 * (alphaDeg + 2);
    const cl = alphaDeg < 10 ? straight : 1.3 - 0.016 * (alphaDeg - 12.5) ** 2;
    const cd = 0.006 + 0.01 * (cl - 0.4) ** 2;
    return change({ converged: true, alphaDeg, cl, cd, cdFriction: cd, cdPressure: 0, cm: -0.05, lowestCp: -1, upper: EVENTS, lower: EVENTS, iterations: 5 }); // prettier-ignore
  });
}

test('figures of a curve whose figures are known', () => {
  const figures = curveFigures(curve());
  expect(figures.zeroLiftDeg).toBeCloseTo(-2, 12);
  expect(figures.zeroLiftMoment).toBeCloseTo(-0.05, 12);
  expect(figures.slopePerDeg).toBeCloseTo(0.1, 2);
  expect(figures.maxLift?.alphaDeg).toBeCloseTo(12.5, 9);
  expect(figures.maxLift?.cl).toBeCloseTo(1.3, 9);
  expect(figures.stall).toBe('gentle');
  expect(figures.leastDrag).toEqual({ alphaDeg: 2, cl: 0.4, cd: 0.006 });
  // 20 % more drag at cl 0.4 ± 0.346; the nearest points within are 0.1 apart.
  expect(figures.lowDrag?.from).toBeCloseTo(0.1, 9);
  expect(figures.lowDrag?.to).toBeCloseTo(0.7, 9);
  // d(cl/cd) = 0 at cl² = 0.4² + 0.6; the nearest point is at cl 0.9.
  expect(figures.bestRatio?.cl).toBeCloseTo(0.9, 9);
});

test('lift that breaks down at once is an abrupt stall', () => {
  const broken = curve((point) => (point.converged && point.alphaDeg >= 14 ? { ...point, cl: 0.9 } : point));
  expect(curveFigures(broken).stall).toBe('abrupt');
});

test('nothing is read across points that did not converge', () => {
  const failed = (angles: readonly number[]) =>
    curveFigures(curve((point) => (angles.includes(point.alphaDeg) ? { converged: false, alphaDeg: point.alphaDeg, iterations: 90 } : point))); // prettier-ignore
  expect(failed([13]).maxLift).toBeNull();
  expect(failed([14]).stall).toBeNull();
  expect(failed([-2, -1]).zeroLiftDeg).toBeNull();
  expect(failed([4]).lowDrag?.to).toBeCloseTo(0.5, 9);
});

test('a curve that still rises at its end has no highest lift', () => {
  const figures = curveFigures(curve().slice(0, 12));
  expect([figures.maxLift, figures.stall]).toEqual([null, null]);
  expect(curveFigures([])).toMatchObject({
    bestRatio: null,
    leastDrag: null,
    slopePerDeg: null,
    lowDrag: null,
  });
});
