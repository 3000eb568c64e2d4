import { expect, test } from 'vitest';
import { Growth, NO_CHANGE } from '#geometry/flow/growth.ts';
import { LAMINAR, Station } from '#geometry/flow/station.ts';
import { prepared, started } from './prepared.ts';
import { difference, expectSlope } from './slopes.ts';

/** Upper side: nodes fall downstream; 40, 41, 42 stand 0.02 apart. */
function make(rates: readonly [before: number, last: number], n: number) {
  const { layer } = started(prepared('0012', 100), 0, { reynolds: 1e6 });
  const growth = new Growth(layer);
  [layer.s[42], layer.s[41], layer.s[40]] = [0.3, 0.32, 0.34];
  growth.rates[42 * 4] = rates[0];
  growth.rates[41 * 4] = rates[1];
  layer.c[41] = n;
  layer.upper.tripS = Infinity;
  return { layer, growth, change: { ...NO_CHANGE } };
}

test('n grows by rate and curvature: 5 + 40 · 0.02 + ½ · 500 · 0.02²', () => {
  const { layer, growth, change } = make([30, 40], 5);
  expect(growth.turns(layer.upper, change, 40)).toBe(false);
  expect(layer.c[40]).toBeCloseTo(5.9, 12);
  expect(growth.answers[80]).toBeCloseTo(0.03, 12);
  expect(growth.answers[81]).toBeCloseTo(-0.01, 12);
});

test('growth neither falls off nor runs away within an interval', () => {
  const falling = make([80, 40], 5);
  falling.growth.turns(falling.layer.upper, falling.change, 40);
  expect(falling.layer.c[40]).toBeCloseTo(5.8, 12);
  const rising = make([1, 40], 5);
  rising.growth.turns(rising.layer.upper, rising.change, 40);
  expect(rising.layer.c[40]).toBeCloseTo(5 + 0.8 + 0.5 * 39 * 0.02, 12);
  const sudden = make([0, 40], 5);
  sudden.layer.s[42] = 0.319;
  sudden.growth.turns(sudden.layer.upper, sudden.change, 40);
  expect(sudden.layer.c[40]).toBeCloseTo(5 + 2 * 0.8, 12);
});

test('waves that do not grow just short of 9 gain half a unit per chord, and nothing below 4.5', () => {
  const near = make([0, 0], 8.1);
  near.growth.turns(near.layer.upper, near.change, 40);
  expect(near.layer.c[40]).toBeCloseTo(8.1 + 0.5 * 0.8 * 0.02, 12);
  expect([near.growth.answers[80], near.growth.answers[81]]).toEqual([0, 0]);
  const far = make([0, 0], 4);
  far.growth.turns(far.layer.upper, far.change, 40);
  expect(far.layer.c[40]).toBe(4);
});

test('the layer turns where n reaches 9, and the place answers to n and the rates', () => {
  const at = (before: number, last: number, n: number) => {
    const { layer, growth, change } = make([before, last], n);
    expect(growth.turns(layer.upper, change, 40)).toBe(true);
    return { ...change, s: layer.upper.transitionS };
  };
  const found = at(30, 40, 8.5);
  expect(found.node).toBe(40);
  const x = found.xi * 0.02;
  expect(8.5 + 40 * x + 250 * x * x).toBeCloseTo(9, 10);
  expect(found.s).toBeCloseTo(0.32 + x, 12);
  expectSlope(
    found.byN,
    difference((n) => at(30, 40, n).xi, 8.5),
  );
  expectSlope(
    found.byRate,
    difference((f) => at(30, f, 8.5).xi, 40),
    0.01,
  );
  expectSlope(
    found.byRateBefore,
    difference((f) => at(f, 40, 8.5).xi, 30),
    0.01,
  );
});

test('a trip ahead of that turns it there, and answers to nothing', () => {
  const { layer, growth, change } = make([30, 40], 8.5);
  layer.upper.tripS = 0.325;
  expect(growth.turns(layer.upper, change, 40)).toBe(true);
  expect(layer.upper.tripped).toBe(true);
  expect(change.node).toBe(40);
  expect(change.xi).toBeCloseTo(0.25, 9);
  expect([change.byN, change.byRate, change.byRateBefore].every((slope) => slope === 0)).toBe(true);
});

test('the slopes of a rate are those against θ, δ* and ue', () => {
  const { growth } = make([0, 0], 0);
  const state = [0.0006, 0.0018, 1.1] as const;
  const rate = (x: readonly number[]) => {
    const station = new Station();
    station.set(LAMINAR, 0.3, x[0]!, x[1]!, x[2]!, 0, 1e-6, 0);
    growth.rate(40, station);
    return growth.rates[160]!;
  };
  rate(state);
  const found = growth.rates.slice(161, 164);
  state.forEach((value, k) => {
    const wanted = difference((y) => rate(state.map((own, i) => (i === k ? y : own))), value);
    expectSlope(found[k]!, wanted, 1);
  });
});
