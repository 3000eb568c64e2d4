import { expect, test } from 'vitest';
import { criticalPressure, karmanTsien } from '#geometry/flow/compressibility.ts';
import { ShapeError } from '#geometry/shapes/error.ts';

test('without a Mach number nothing changes, and small pressures follow Prandtl and Glauert', () => {
  expect(karmanTsien(-1.3, 0)).toBe(-1.3);
  expect(karmanTsien(-1e-6, 0.5) / -1e-6).toBeCloseTo(1 / Math.sqrt(0.75), 5);
});

test('Kármán–Tsien at M 0.5: −1 becomes −1.2515 by hand', () => {
  // β = 0.8660254; 0.25 / (2 · 1.8660254) = 0.0669873; −1 / (0.8660254 − 0.0669873)
  expect(karmanTsien(-1, 0.5)).toBeCloseTo(-1.251503, 5);
});

test('critical pressure from isentropic tables (NACA Report 1135: p/p₀ 0.84302 and 0.93947, sonic 0.52828)', () => {
  expect(criticalPressure(0.5)).toBeCloseTo((0.52828 / 0.84302 - 1) / (0.7 * 0.25), 3);
  expect(criticalPressure(0.3)).toBeCloseTo((0.52828 / 0.93947 - 1) / (0.7 * 0.09), 3);
});

test('Mach numbers beyond the range are refused', () => {
  expect(() => karmanTsien(-1, 0.6)).toThrow(ShapeError);
  expect(() => karmanTsien(-1, NaN)).toThrow(/mach/);
  expect(() => criticalPressure(0)).toThrow(/mach/);
});
