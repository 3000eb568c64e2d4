import { expect, test } from 'vitest';
import { TURBULENT, WAKE } from '#geometry/flow/station.ts';
import { Trial } from '#geometry/flow/trial.ts';
import { prepared, started } from './prepared.ts';

const { layer } = started(prepared('0012', 60), 2, { reynolds: 1e6 });
layer.theta[10] = 0.002;
layer.dstar[10] = 0.003;
layer.ue[10] = 1.1;
layer.c[10] = 0.05;

test.each([
  ['speed', 0],
  ['shape', 1.6],
  ['line', 40],
] as const)(
  '%s: a small step moves δ* and ue as its directions say, and keeps the relation',
  (kind, value) => {
    const trial = new Trial();
    trial.begin(layer, 10, TURBULENT, { kind, value });
    const { theta, dstar, ue, shapeT, shapeZ, speedZ } = trial;
    const [dt, dz] = [1e-8, 1e-8];
    trial.take(dt, 0, dz, trial.size(dt, 0, dz));
    expect((trial.dstar - dstar) / (shapeT * dt + shapeZ * dz)).toBeCloseTo(1, 4);
    if (kind === 'speed') expect(trial.ue).toBe(ue);
    else expect((trial.ue - ue) / (speedZ * dz)).toBeCloseTo(1, 4);
    if (kind === 'shape') expect(trial.dstar / trial.theta).toBeCloseTo(value, 12);
    if (kind === 'line') expect(trial.ue - ue).toBeCloseTo(value * (trial.ue * trial.dstar - ue * dstar), 14);
    expect(trial.theta).toBe(theta + dt);
  },
);

test('a large step is cut to three tenths of what changes most', () => {
  const trial = new Trial();
  trial.begin(layer, 10, TURBULENT, { kind: 'speed', value: 0 });
  const size = trial.size(0.002, 0.1, 0);
  expect(size).toBeCloseTo(2, 12);
  trial.take(0.002, 0.1, 0, size);
  expect(trial.c).toBeCloseTo(0.05 * 1.3, 12);
  expect(trial.theta).toBeCloseTo(0.002 * 1.15, 12);
});

test('the shape factor stays above its least, lower in the wake', () => {
  const trial = new Trial();
  trial.begin(layer, 10, TURBULENT, { kind: 'speed', value: 0 });
  trial.take(0, 0, -0.0025, 0.3);
  expect(trial.dstar).toBeCloseTo(1.02 * 0.002, 12);
  trial.begin(layer, 10, WAKE, { kind: 'speed', value: 0 });
  trial.take(0, 0, -0.0025, 0.3);
  expect(trial.dstar / 0.002).toBeCloseTo(1.000001, 9);
});
