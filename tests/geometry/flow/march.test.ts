import { expect, test, vi } from 'vitest';
import { Interval } from '#geometry/flow/interval.ts';
import { PER_NODE, PER_UNKNOWN } from '#geometry/flow/march.ts';
import { Station, TURBULENT } from '#geometry/flow/station.ts';
import { prepared, started } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const make = () => {
  const { coupled, layer } = started(prepared('2412', 120), 3, { reynolds: 1e6, tripUpper: 0.1 });
  return { march: coupled.march, layer };
};
/** A turbulent node on the upper side and the one before it. */
const NODE = 25;
const residuals = (layer: ReturnType<typeof make>['layer']) => {
  const stations = [NODE + 1, NODE].map((i) => {
    const station = new Station();
    station.set(
      TURBULENT,
      layer.s[i]!,
      layer.theta[i]!,
      layer.dstar[i]!,
      layer.ue[i]!,
      layer.c[i]!,
      layer.nu,
      0,
    );
    return station;
  });
  const interval = new Interval();
  interval.between(stations[0]!, stations[1]!);
  return interval.residual;
};

test.each([
  ['speed', 0],
  ['shape', 1.7],
  ['line', 60],
] as const)('a station solved with its %s held satisfies its equations and that relation', (kind, value) => {
  const { march, layer } = make();
  march.load(march.before, NODE + 1, TURBULENT);
  layer.dstar[NODE]! *= 1.02;
  const [ue, m] = [layer.ue[NODE]!, layer.massDefect(NODE)];
  expect(march.solve(NODE, TURBULENT, null, { kind, value })).toBe(true);
  residuals(layer).forEach((residual) => expect(Math.abs(residual)).toBeLessThan(1e-6));
  if (kind === 'speed') expect(layer.ue[NODE]).toBe(ue);
  if (kind === 'shape') expect(layer.dstar[NODE]! / layer.theta[NODE]!).toBeCloseTo(value, 10);
  if (kind === 'line') expect(layer.ue[NODE]! - ue).toBeCloseTo(value * (layer.massDefect(NODE) - m), 10);
});

test('the answers of a node are the derivatives of its solution', () => {
  const { march, layer } = make();
  const solve = () => {
    march.load(march.before, NODE + 1, TURBULENT);
    march.solve(NODE, TURBULENT, null, { kind: 'line', value: 60 });
    return [layer.theta[NODE]!, layer.c[NODE]!, layer.ue[NODE]!, layer.massDefect(NODE)];
  };
  solve();
  const answers = march.answers.slice(NODE * PER_NODE, (NODE + 1) * PER_NODE);
  // The mass defect upstream stays: δ* and ue there are untouched.
  const step = 2e-3 * layer.theta[NODE + 1]!;
  layer.theta[NODE + 1]! += step;
  const above = solve();
  layer.theta[NODE + 1]! -= 2 * step;
  const below = solve();
  const slope = (k: number) => (above[k]! - below[k]!) / (2 * step);
  [0, 1, 2].forEach((k) => {
    const at = k * PER_UNKNOWN;
    expect(slope(k) / (answers[at + 1]! + answers[at + 5]! * slope(3))).toBeCloseTo(1, 1);
  });
});

test('a station that cannot be solved keeps its state and is counted', () => {
  const { march, layer } = make();
  march.load(march.before, NODE + 1, TURBULENT);
  const before = [layer.theta[NODE], layer.ue[NODE]];
  // No layer that grew so far can be that thin.
  layer.dstar[NODE] = NaN;
  const failures = march.failures;
  expect(march.solve(NODE, TURBULENT, null, { kind: 'speed', value: 0 })).toBe(false);
  expect(march.failures).toBe(failures + 1);
  expect([layer.theta[NODE], layer.ue[NODE]]).toEqual(before);
});
