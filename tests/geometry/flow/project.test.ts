import { expect, test, vi } from 'vitest';
import { edgeStress, project } from '#geometry/flow/project.ts';
import { LAMINAR, TURBULENT } from '#geometry/flow/station.ts';
import { prepared, started } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const section = prepared('2412', 120);
const lines = (size: number) => new Float64Array(size).fill(80);

test('a layer on its equations is left as it is', () => {
  const { coupled, layer, outer } = started(section, 2, { reynolds: 1e6 });
  coupled.iterate(outer);
  project(coupled.march, lines(outer.size));
  const before = [layer.theta.slice(), layer.dstar.slice(), layer.ue.slice()];
  project(coupled.march, lines(outer.size));
  [layer.theta, layer.dstar, layer.ue].forEach((now, k) => {
    now.forEach((value, i) => expect(Math.abs(value / before[k]![i]! - 1)).toBeLessThan(1e-6));
  });
  expect(coupled.march.failures).toBe(0);
});

test('a disturbed layer is brought onto its equations', () => {
  const { coupled, layer, outer } = started(section, 2, { reynolds: 1e6 });
  coupled.iterate(outer);
  for (let i = 5; i < 50; i++) layer.dstar[i]! *= 1 + 0.05 * Math.sin(i);
  project(coupled.march, lines(outer.size));
  const once = layer.theta.slice();
  project(coupled.march, lines(outer.size));
  layer.theta.forEach((value, i) => expect(Math.abs(value / once[i]! - 1)).toBeLessThan(1e-6));
});

test('a trip moves transition at once, and without one it moves back', () => {
  const { coupled, layer, outer } = started(section, 0, { reynolds: 1e6 });
  coupled.iterate(outer);
  const free = layer.upper.transitionS;
  expect(free).toBeGreaterThan(0.4);
  layer.upper.tripS = 0.2;
  project(coupled.march, lines(outer.size));
  expect(layer.upper.transitionS).toBeCloseTo(0.2, 12);
  expect(layer.upper.tripped).toBe(true);
  layer.upper.tripS = Infinity;
  project(coupled.march, lines(outer.size));
  expect(layer.upper.transitionS).toBeGreaterThan(0.4);
  expect(layer.regime[30]).toBe(LAMINAR);
});

test('the wake begins with the thicknesses of both sides and a stress between theirs', () => {
  const { coupled, layer, outer } = started(section, 3, { reynolds: 1e6, tripUpper: 0.1, tripLower: 0.1 });
  coupled.iterate(outer);
  const w = layer.panels.nodes;
  expect(layer.theta[w]).toBeCloseTo(layer.theta[0]! + layer.theta[w - 1]!, 12);
  expect(layer.dstar[w]).toBeCloseTo(layer.dstar[0]! + layer.dstar[w - 1]!, 12);
  const stresses = [layer.c[0]!, layer.c[w - 1]!].sort((a, b) => a - b);
  expect(layer.c[w]!).toBeGreaterThanOrEqual(stresses[0]!);
  expect(layer.c[w]!).toBeLessThanOrEqual(stresses[1]!);
  expect(edgeStress(coupled.march, layer.upper)).toMatchObject({ value: layer.c[0]!, c: 1 });
});

test('a side that is laminar to its edge enters the wake with the stress of a start', () => {
  const { coupled, layer, outer } = started(prepared('0012', 120), 10, { reynolds: 5e5 });
  coupled.iterate(outer);
  expect(layer.regime[layer.lower.last]).toBe(LAMINAR);
  expect(layer.regime[layer.upper.last]).toBe(TURBULENT);
  const stress = edgeStress(coupled.march, layer.lower);
  expect(stress.value).toBeGreaterThan(0);
  expect(stress.c).toBe(0);
});
