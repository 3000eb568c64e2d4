import { expect, test, vi } from 'vitest';
import { prepared, started } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

test.each([
  ['0012', 0, 1e6],
  ['4412', 4, 1e5],
  ['0008', 8, 3e6],
  ['6418', -4, 2e5],
] as const)(
  '%s at %d° and Re %d: a layer everywhere, thickening downstream, its shape within bounds',
  (digits, alphaDeg, reynolds) => {
    const { layer, outer } = started(prepared(digits, 120), alphaDeg, { reynolds });
    for (let i = 0; i < outer.size; i++) {
      const h = layer.dstar[i]! / layer.theta[i]!;
      expect(layer.theta[i]!).toBeGreaterThan(0);
      expect(h).toBeGreaterThan(1);
      expect(h).toBeLessThan(8);
      expect(layer.ue[i]!).toBeGreaterThan(0);
    }
    for (const side of [layer.upper, layer.lower]) {
      expect(layer.theta[side.last]!).toBeGreaterThan(5 * layer.theta[side.first]!);
    }
  },
);

test('near the stagnation point the layer is that of Hiemenz’s flow: θ = 0.29234 / √a of the speed a s', () => {
  const { layer } = started(prepared('0012', 160), 0, { reynolds: 1e6 });
  const exact = 0.29234 * Math.sqrt(layer.nu / layer.stagnationSlope);
  expect(Math.abs(layer.theta[layer.upper.first]! / exact - 1)).toBeLessThan(0.02);
});
