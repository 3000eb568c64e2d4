import { expect, test, vi } from 'vitest';
import { prepared, started } from './prepared.ts';

// Whole flows are solved here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const section = prepared('2412');

test.each([
  [0, 1e6],
  [6, 1e6],
  [4, 1e5],
  [-3, 3e6],
])(
  'from nothing at %d° and Re %d: converged in at most fifteen steps, layer and outer flow agree',
  (alphaDeg, reynolds) => {
    const { coupled, layer, outer } = started(section, alphaDeg, { reynolds });
    const { converged, iterations } = coupled.iterate(outer);
    expect(converged).toBe(true);
    expect(iterations).toBeLessThanOrEqual(15);
    // The outer flow's speeds from the mass defects, against the layer's own.
    for (let i = 0; i < outer.size; i += 7) {
      let speed = outer.inviscid[i]!;
      for (let j = 0; j < outer.size; j++)
        speed += outer.influence[i * outer.size + j]! * layer.sign(j) * layer.massDefect(j);
      expect(Math.abs(layer.sign(i) * speed - layer.ue[i]!)).toBeLessThan(3e-4);
    }
  },
);

test('carried over to the next angle it needs few steps', () => {
  const { coupled, outer } = started(section, 3, { reynolds: 1e6 });
  coupled.iterate(outer);
  const next = section.at((4 * Math.PI) / 180);
  coupled.shift(outer.inviscid, next);
  const { converged, iterations } = coupled.iterate(next);
  expect(converged).toBe(true);
  expect(iterations).toBeLessThanOrEqual(9);
});

test('an impossible state is given up, not returned', () => {
  const { coupled, layer, outer } = started(section, 2, { reynolds: 1e6 });
  layer.theta.fill(NaN);
  expect(coupled.iterate(outer).converged).toBe(false);
});
