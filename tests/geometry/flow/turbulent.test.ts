import { expect, test } from 'vitest';
import { TurbulentClosure } from '#geometry/flow/turbulent.ts';
import { TURBULENT_FITS } from '#tests/reference/flow-similarity.ts';
import { difference, expectSlope } from './slopes.ts';

const closure = () => new TurbulentClosure();

test.each(TURBULENT_FITS)('the published relations at H = %d, Rθ = %d', (h, r, hs, cf, _us, ct, cd) => {
  const k = closure().at(h!, r!, Math.sqrt(ct!), false);
  expect(k.hs).toBeCloseTo(hs!, 5);
  expect(2 * k.cf).toBeCloseTo(cf!, 6);
  expect(k.ceq ** 2).toBeCloseTo(ct!, 6);
  expect((k.di * k.hs) / 2).toBeCloseTo(cd!, 5);
});

test('Swafford’s law lies within 3 % of Kármán and Schoenherr’s local friction on the plate', () => {
  // cf at Rθ 2118.8 and 5234.1 with the shape factors of a plate.
  expect(Math.abs((2 * closure().at(1.383, 2118.8, 0.03, false).cf) / 0.003591 - 1)).toBeLessThan(0.03);
  expect(Math.abs((2 * closure().at(1.3444, 5234.1, 0.03, false).cf) / 0.002974 - 1)).toBeLessThan(0.03);
});

test('the wake has no wall and dissipates in both halves', () => {
  const body = closure().at(1.6, 2000, 0.05, false);
  const wake = closure().at(1.6, 2000, 0.05, true);
  expect(wake.cf).toBe(0);
  expect(wake.di).toBeGreaterThan(1.9 * (body.di - (2 * body.cf * 0.5) / body.hs));
});

test.each([
  [1.4, 1500, false],
  [2.2, 350, false],
  [3.4, 900, false],
  [5, 5000, false],
  [1.2, 3000, true],
  [2.6, 150, false],
] as const)('slopes at H = %d, Rθ = %d, wake %s', (h, r, wake) => {
  const k = closure().at(h, r, 0.06, wake);
  const { hsH, hsR, cfH, cfR, diH, diR, diC, ceqH, ceqR } = k;
  expectSlope(
    hsH,
    difference((x) => k.at(x, r, 0.06, wake).hs, h),
  );
  expectSlope(
    hsR,
    difference((x) => k.at(h, x, 0.06, wake).hs, r),
    1e-3,
  );
  expectSlope(
    cfH,
    difference((x) => k.at(x, r, 0.06, wake).cf, h),
    1e-3,
  );
  expectSlope(
    cfR,
    difference((x) => k.at(h, x, 0.06, wake).cf, r),
    1e-6,
  );
  expectSlope(
    diH,
    difference((x) => k.at(x, r, 0.06, wake).di, h),
    1e-3,
  );
  expectSlope(
    diR,
    difference((x) => k.at(h, x, 0.06, wake).di, r),
    1e-6,
  );
  expectSlope(
    diC,
    difference((x) => k.at(h, r, x, wake).di, 0.06),
    1e-2,
  );
  expectSlope(
    ceqH,
    difference((x) => k.at(x, r, 0.06, wake).ceq, h),
    1e-2,
  );
  expectSlope(
    ceqR,
    difference((x) => k.at(h, x, 0.06, wake).ceq, r),
    1e-5,
  );
});
