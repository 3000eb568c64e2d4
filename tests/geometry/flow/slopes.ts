import { expect } from 'vitest';

/** Central difference of a function of one number. */
export function difference(of: (x: number) => number, x: number): number {
  const step = 1e-6 * Math.max(Math.abs(x), 1e-6);
  return (of(x + step) - of(x - step)) / (2 * step);
}

/** Expects an analytic slope to agree with the difference to 1e-5 of itself or of the scale given. */
export function expectSlope(found: number, wanted: number, scale = 1): void {
  expect(Math.abs(found - wanted)).toBeLessThan(1e-5 * (Math.abs(wanted) + scale));
}
