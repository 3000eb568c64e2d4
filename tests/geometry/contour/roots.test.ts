import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { goldenMaximum, safeguardedRoot } from '#geometry/contour/roots.ts';

describe('safeguarded Newton', () => {
  test('finds a root from either side, and one at the first guess', () => {
    const square = (x: number) => ({ value: x * x - 2, slope: 2 * x });
    expect(Math.abs(safeguardedRoot(square, 0, 5, 4, 1e-14) - Math.SQRT2)).toBeLessThan(1e-14);
    expect(Math.abs(safeguardedRoot(square, 0, -5, -4, 1e-14) + Math.SQRT2)).toBeLessThan(1e-14);
    expect(safeguardedRoot((x) => ({ value: x - 1, slope: 1 }), 0, 2, 1, 1e-14)).toBe(1);
  });

  test('where Newton alone would run away, or has no slope at all', () => {
    const arctangent = (x: number) => ({ value: Math.atan(x - 3), slope: 1 / (1 + (x - 3) ** 2) });
    expect(Math.abs(safeguardedRoot(arctangent, -50, 100, 90, 1e-12) - 3)).toBeLessThan(1e-12);
    const step = (x: number) => ({ value: x < 0.3 ? -1 : 1, slope: 0 });
    expect(Math.abs(safeguardedRoot(step, 0, 1, 0.9, 1e-12) - 0.3)).toBeLessThan(1e-11);
    const flat = (x: number) => ({ value: x ** 9, slope: 9 * x ** 8 });
    expect(Math.abs(safeguardedRoot(flat, -1, 2, 2, 1e-10))).toBeLessThan(1e-8);
  });

  test('agrees with plain bisection on cubics', () => {
    const place = fc.double({ min: 0.05, max: 0.95, noNaN: true });
    fc.assert(
      fc.property(place, place, (root, start) => {
        const cubic = (x: number) => ({
          value: (x - root) * (x * x + 1),
          slope: x * x + 1 + 2 * x * (x - root),
        });
        expect(Math.abs(safeguardedRoot(cubic, 0, 1, start, 1e-14) - root)).toBeLessThan(1e-13);
      }),
    );
  });
});

describe('golden section', () => {
  test('finds the peak inside and at an end', () => {
    const { at, value } = goldenMaximum((x) => 2 - (x - 0.3) ** 2, 0, 1, 1e-9);
    expect(Math.abs(at - 0.3)).toBeLessThan(1e-7);
    expect(value).toBeCloseTo(2, 14);
    expect(goldenMaximum((x) => x, 0, 1, 1e-9).at).toBeCloseTo(1, 8);
    expect(Math.abs(goldenMaximum((x) => -((x - 0.7) ** 2), 0, 1, 0).at - 0.7)).toBeLessThan(1e-7);
    expect(goldenMaximum(Math.abs, 2, 2, 1e-9)).toEqual({ at: 2, value: 2 });
  });
});
