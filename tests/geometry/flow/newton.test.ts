import { expect, test, vi } from 'vitest';
import { NewtonSystem } from '#geometry/flow/newton.ts';
import { project } from '#geometry/flow/project.ts';
import { prepared, started } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const section = prepared('4412', 120);

/** A converged layer whose angle is then changed a little: the mismatch that Newton's method has to remove. */
function disturbed(alphaDeg: number, reynolds: number, trip = 1) {
  const { coupled, layer, outer } = started(section, alphaDeg, {
    reynolds,
    tripUpper: trip,
    tripLower: trip,
  });
  expect(coupled.iterate(outer).converged).toBe(true);
  const next = section.at(((alphaDeg + 0.002) * Math.PI) / 180);
  const lines = new Float64Array(outer.size).fill(80);
  project(coupled.march, lines);
  return { march: coupled.march, layer, next, lines, newton: new NewtonSystem(coupled.march) };
}

test.each([
  [2, 1e6, 0.1],
  [5, 2e5, 1],
])(
  'one step at %d° and Re %d, trip at %d, removes 97 per cent of a small mismatch: the system is the derivative of the equations',
  (alphaDeg, reynolds, trip) => {
    const { march, layer, next, lines, newton } = disturbed(alphaDeg, reynolds, trip);
    const mismatch = new Float64Array(next.size);
    const before = newton.mismatch(next, mismatch);
    expect(newton.solve(next, mismatch, true)).toBe(true);
    expect(newton.largestStep()).toBe(1);
    const { theta, dstar, c, ue } = newton.change;
    const n = layer.panels.nodes;
    for (let i = 0; i < next.size; i++) {
      layer.theta[i]! += theta[i]!;
      layer.dstar[i]! += dstar[i]!;
      if (layer.regime[i] !== 0) layer.c[i]! += c[i]!;
      layer.ue[i]! += ue[i]!;
    }
    layer.measure();
    layer.measureWake(next);
    project(march, lines);
    expect(newton.mismatch(next, mismatch)).toBeLessThan(before / 30);
    expect(layer.s[n]).toBeGreaterThan(0.9);
  },
);

test('the step is cut where a thickness would fall by more than half', () => {
  const { layer, newton, next } = disturbed(2, 1e6);
  const mismatch = new Float64Array(next.size);
  newton.mismatch(next, mismatch);
  newton.solve(next, mismatch, true);
  newton.change.theta[10] = -2 * layer.theta[10]!;
  expect(newton.largestStep()).toBeCloseTo(0.25, 12);
  newton.change.theta[10] = NaN;
  expect(newton.largestStep()).toBeNaN();
});

test('with the factors of the last step the speeds still follow the outer flow', () => {
  const { layer, newton, next } = disturbed(2, 1e6);
  const mismatch = new Float64Array(next.size);
  newton.mismatch(next, mismatch);
  newton.solve(next, mismatch, true);
  const fresh = newton.change.ue.slice();
  newton.solve(next, mismatch, false);
  const largest = Math.max(...fresh.map(Math.abs));
  for (let i = 3; i < layer.panels.nodes - 3; i++) {
    expect(Math.abs(newton.change.ue[i]! - fresh[i]!)).toBeLessThan(0.1 * largest);
  }
  expect(newton.change.theta.slice(0, next.size).every((value) => value === 0)).toBe(true);
});
