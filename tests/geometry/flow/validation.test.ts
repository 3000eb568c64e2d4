import { expect, test, vi } from 'vitest';
import { errorTable, flowErrors } from './validation.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const rows = flowErrors();

/**
 * What misses its tolerance, why, and the error that must not be exceeded:
 * the highest lift of thin sections, because a stall at the nose is not seen (see stall-kind.ts); the angle of zero lift of the cambered
 * 44xx sections, which in the tunnel is half a degree nearer to 0 than even without viscosity; the slope near 0° at the lower Reynolds
 * numbers, as the pull of the curved wake is left out.
 */
const KNOWN_MISSES: Readonly<Record<string, number>> = {
  '0006: highest lift': 0.7,
  '4412: angle of zero lift': 0.45,
  '4418: angle of zero lift': 0.42,
  '0012 Re 1000000: lift slope per degree': 0.055,
  '0012 Re 2000000: lift slope per degree': 0.055,
};

test('errors against exact flows, conformal mapping and wind tunnels stay within the tolerances, but for what is known to miss', () => {
  console.log(errorTable(rows).join('\n'));
  expect(rows.length).toBeGreaterThan(50);
  expect(rows.filter(({ met }) => !met).map(({ what }) => what).sort()).toEqual(Object.keys(KNOWN_MISSES).sort()); // prettier-ignore
});

test.each(Object.entries(KNOWN_MISSES))('%s misses by no more than before', (what, bound) => {
  const row = rows.find((one) => one.what === what);
  expect(Math.abs(row!.error)).toBeLessThan(bound);
});
