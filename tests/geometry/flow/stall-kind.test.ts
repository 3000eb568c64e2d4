import { expect, test } from 'vitest';
import { expectedStall } from '#geometry/flow/stall-kind.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

test.each([
  ['0006', 'thin-airfoil'],
  ['0009', 'leading-edge'],
  ['0012', 'combined'],
  ['4415', 'trailing-edge'],
  ['0018', 'trailing-edge'],
] as const)('%s: %s stall (McCullough & Gault, NACA TN 2502, 1951)', (digits, kind) => {
  expect(expectedStall(outlineOf(naca4(digits))).kind).toBe(kind);
});

test('the ordinate is that of the upper surface at 1.25 % of chord: 1.894 % for 0012 (NACA Report 824)', () => {
  expect(expectedStall(outlineOf(naca4('0012', 'open'))).noseOrdinate).toBeCloseTo(0.01894, 4);
});
