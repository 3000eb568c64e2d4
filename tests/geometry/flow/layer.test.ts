import { expect, test } from 'vitest';
import { checkConditions } from '#geometry/flow/conditions.ts';
import { Layer } from '#geometry/flow/layer.ts';
import { prepared } from './prepared.ts';

const section = prepared('2412', 100, 'open');
const { panels } = section.system;
const outer = section.at(0.07);
const fresh = (trips = {}) => {
  const layer = new Layer(panels, outer.size, checkConditions({ reynolds: 5e5, ...trips }));
  layer.startFrom(outer.inviscid);
  return layer;
};

test('the stagnation point lies below the nose, and arc lengths grow from it both ways', () => {
  const layer = fresh();
  expect(layer.upper.first).toBeGreaterThan(50);
  expect(layer.lower.first).toBe(layer.upper.first + 1);
  expect([layer.sign(0), layer.sign(100), layer.sign(101)]).toEqual([1, -1, 1]);
  for (let i = layer.upper.first; i > 0; i--) expect(layer.s[i - 1]!).toBeGreaterThan(layer.s[i]!);
  const whole = panels.length.reduce((sum, l) => sum + l, 0);
  expect(layer.s[0]! + layer.s[100]!).toBeCloseTo(whole, 12);
});

test('trips lie at their stations', () => {
  const layer = fresh({ tripUpper: 0.3, tripLower: 0.6 });
  const station = (s: number, step: 1 | -1) => {
    let i = step === -1 ? layer.upper.first : layer.lower.first;
    while (layer.s[i + step]! < s) i += step;
    const share = (s - layer.s[i]!) / (layer.s[i + step]! - layer.s[i]!);
    return panels.x[i]! + share * (panels.x[i + step]! - panels.x[i]!);
  };
  expect(station(layer.upper.tripS, -1)).toBeCloseTo(0.3, 9);
  expect(station(layer.lower.tripS, 1)).toBeCloseTo(0.6, 9);
  expect(fresh().upper.tripS).toBe(Infinity);
});

test('dead air fills the gap of a blunt edge and closes within two and a half gaps', () => {
  const layer = fresh();
  layer.measureWake(outer);
  expect(layer.deadAir[panels.nodes]).toBeCloseTo(panels.edge.gap, 12);
  expect(layer.deadAir[outer.size - 1]).toBe(0);
  expect(layer.massDefect(panels.nodes)).toBeCloseTo(layer.ue[panels.nodes]! * panels.edge.gap, 12);
});

test('the stagnation point moves where speeds turn negative, but not for a trifle', () => {
  const layer = fresh();
  const { first } = layer.upper;
  const signed = layer.ue.slice();
  signed[first] = -0.001 * signed[first - 1]!;
  layer.takeSpeeds(signed.slice());
  expect(layer.upper.first).toBe(first);
  signed[first] = -0.1;
  layer.takeSpeeds(signed.slice());
  expect([layer.upper.first, layer.lower.first]).toEqual([first - 1, first]);
  expect(layer.ue[first]).toBeCloseTo(0.1, 12);
});

test('a copy goes on from the same state', () => {
  const [a, b] = [fresh(), fresh()];
  a.theta.fill(0.001);
  a.upper.transitionS = 0.4;
  b.copyFrom(a);
  expect(b.theta).toEqual(a.theta);
  expect(b.upper).toEqual(a.upper);
});

test('shape factors are kept above 1', () => {
  const layer = fresh();
  layer.theta.fill(0.001);
  layer.dstar.fill(0.0005);
  layer.keepShape();
  expect(layer.dstar[10]).toBeCloseTo(0.00102, 12);
  expect(layer.dstar[outer.size - 1]).toBeGreaterThan(0.001);
});
