import { expect, test } from 'vitest';
import { LaminarClosure, STAGNATION_H, STAGNATION_LAMBDA } from '#geometry/flow/laminar.ts';
import { LAMINAR_FITS, SIMILAR_FLOWS } from '#tests/reference/flow-similarity.ts';
import { difference, expectSlope } from './slopes.ts';

const closure = () => new LaminarClosure();

test.each(LAMINAR_FITS)('the published fits at H = %d', (h, hs, rFriction, rDissipation) => {
  const { hs: found, cf, di } = closure().at(h, 100);
  expect(found).toBeCloseTo(hs, 4);
  expect(cf * 100).toBeCloseTo(rFriction, 4);
  expect((di * 100 * found) / 2).toBeCloseTo(rDissipation, 4);
});

test.each(SIMILAR_FLOWS)(
  'Falkner–Skan β = $beta within 0.3 % in H*, 0.011 in friction, 0.6 % in dissipation',
  (exact) => {
    const { hs, cf, di } = closure().at(exact.shapeFactor, 100);
    expect(Math.abs(hs / exact.energyFactor - 1)).toBeLessThan(0.003);
    expect(Math.abs(cf * 100 - exact.rFriction)).toBeLessThan(0.011);
    expect(Math.abs((di * 50 * hs) / exact.rDissipation - 1)).toBeLessThan(0.006);
  },
);

test('stagnation flow: both integral equations hold with constant θ and H', () => {
  const { cf, di, hs } = closure().at(STAGNATION_H, 1);
  // θ' = 0: (2 + H) λ = Rθ cf/2;  H*' = 0: H* (1 − H) λ = Rθ (2 CD − H* cf/2)
  expect((2 + STAGNATION_H) * STAGNATION_LAMBDA).toBeCloseTo(cf, 4);
  expect(hs * (1 - STAGNATION_H) * STAGNATION_LAMBDA).toBeCloseTo(hs * (di - cf), 4);
});

test.each([2.1, 2.6, 3.9, 4.5, 7, 9])('slopes at H = %d', (h) => {
  const k = closure().at(h, 300);
  const { hsH, cfH, cfR, diH, diR } = k;
  expectSlope(
    hsH,
    difference((x) => k.at(x, 300).hs, h),
  );
  expectSlope(
    cfH,
    difference((x) => k.at(x, 300).cf, h),
    1e-3,
  );
  expectSlope(
    diH,
    difference((x) => k.at(x, 300).di, h),
    1e-3,
  );
  expectSlope(
    cfR,
    difference((x) => k.at(h, x).cf, 300),
    1e-5,
  );
  expectSlope(
    diR,
    difference((x) => k.at(h, x).di, 300),
    1e-5,
  );
});
