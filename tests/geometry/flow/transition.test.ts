import { expect, test } from 'vitest';
import { Amplification, criticalExponent, criticalLogR } from '#geometry/flow/transition.ts';
import { GROWTH_FITS } from '#tests/reference/flow-similarity.ts';
import { difference, expectSlope } from './slopes.ts';

test.each(GROWTH_FITS)('the published envelope at H = %d', (h, perR, critical, l, m) => {
  expect(Math.abs(10 ** criticalLogR(h) - critical)).toBeLessThan(0.051);
  // Far above the critical value: dn/ds θ = dn/dRθ (m + 1) l / 2.
  expect(new Amplification().at(h, 3 * critical, 0.001).rate * 0.001).toBeCloseTo(
    (perR * (m + 1) * l) / 2,
    5,
  );
});

test('flat plate: n reaches 9 at Rx = 2.87e6, near the 2.8e6 of Schubauer & Skramstad (NACA Report 909)', () => {
  // Blasius layer with ν = 1, ue = 1: θ = 0.66411 √x.
  const growth = new Amplification();
  let [n, x] = [0, 0];
  const step = 500;
  while (n < 9) {
    const theta = 0.66411 * Math.sqrt(x + step / 2);
    n += step * growth.at(2.591, theta, theta).rate;
    x += step;
  }
  expect(x).toBeGreaterThan(2.8e6);
  expect(x).toBeLessThan(2.95e6);
});

test('no growth below the critical Reynolds number', () => {
  expect(new Amplification().at(2.591, 100, 0.001).rate).toBe(0);
});

test.each([
  [2.5, 690],
  [2.6, 600],
  [3.5, 48],
  [6, 200],
])('slopes at H = %d, Rθ = %d', (h, r) => {
  const growth = new Amplification().at(h, r, 0.001);
  const { rateH, rateR, rateT } = growth;
  expectSlope(
    rateH,
    difference((x) => growth.at(x, r, 0.001).rate, h),
    0.1,
  );
  expectSlope(
    rateR,
    difference((x) => growth.at(h, x, 0.001).rate, r),
    1e-3,
  );
  expectSlope(
    rateT,
    difference((x) => growth.at(h, r, x).rate, 0.001),
    1,
  );
});

test('Mack’s relation: 0.07 % of turbulence gives N = 9.0, 1 % gives 2.6', () => {
  expect(criticalExponent(0.0007)).toBeCloseTo(9, 1);
  expect(criticalExponent(0.01)).toBeCloseTo(2.62, 2);
  expect(() => criticalExponent(0.05)).toThrow(/turbulence/);
});
