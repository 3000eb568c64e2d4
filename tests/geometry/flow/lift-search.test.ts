import { expect, test } from 'vitest';
import { LiftSearch } from '#geometry/flow/lift-search.ts';

/** A made-up lift curve: 0.11 per degree, rounded off to its highest lift 1.21 at 14° and falling beyond. */
const lift = (alphaDeg: number) => {
  const straight = 0.11 * (alphaDeg + 2);
  return alphaDeg < 8 ? straight : 1.21 - ((0.11 * 6) / 72 + 0.0014) * (alphaDeg - 14) ** 2 + (alphaDeg < 14 ? 0 : -0.01 * (alphaDeg - 14)); // prettier-ignore
};

/** Angles looked at until the lift is within 2e-4, or null. */
function steps(target: number, fromDeg: number): number | null {
  const search = new LiftSearch(target);
  let alphaDeg: number | null = fromDeg;
  for (let step = 1; step < 40; step++) {
    const cl = lift(alphaDeg);
    if (Math.abs(cl - target) < 2e-4) return step;
    alphaDeg = search.next({ alphaDeg, cl });
    if (alphaDeg === null) return null;
  }
  return Infinity;
}

test.each([
  [0.5, 0],
  [0.5, 12],
  [-0.3, 4],
  [1.05, 0],
  [1.18, 6],
])('lift %d is found from %d° in at most a dozen angles', (target, fromDeg) => {
  expect(steps(target, fromDeg)).toBeLessThanOrEqual(12);
});

test('what the section does not reach is given up', () => {
  expect(steps(1.4, 4)).toBeNull();
});
