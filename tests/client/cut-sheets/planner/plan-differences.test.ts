// @vitest-environment node
import { expect, test } from 'vitest';
import { differencesOf } from '#client/cut-sheets/planner/plan-differences.ts';
import { valuesOf, withValue } from '#client/cut-sheets/planner/plan-values.ts';
import { PLAN } from './samples.ts';

test('the same plan differs nowhere', () => {
  expect(differencesOf(PLAN, valuesOf(PLAN))).toEqual([]);
});

test('names each place that differs, with both values', () => {
  let yours = withValue(valuesOf(PLAN), 'panel.tip.chordMm', 150);
  yours = withValue(yours, 'features.0.surface', 'lower');
  yours = withValue(yours, 'block', null);
  yours = withValue(yours, 'panel.washoutDeg', '2 degrees');
  expect(differencesOf(PLAN, yours)).toEqual([
    { place: 'panel, tip, chord (mm)', theirs: '180', yours: '150' },
    { place: 'panel, washout (°)', theirs: '0', yours: '2 degrees' },
    { place: 'features, 1, surface', theirs: 'upper', yours: 'lower' },
    { place: 'block', theirs: 'given', yours: 'none' },
  ]);
});

test('a feature that only one of them has is one difference', () => {
  const yours = withValue(valuesOf(PLAN), 'features', []);
  expect(differencesOf(PLAN, yours)).toEqual([{ place: 'features, 1', theirs: 'given', yours: 'none' }]);
});

test('things are called by their names where these are known', () => {
  const yours = withValue(valuesOf(PLAN), 'materialId', 'other');
  const names = new Map([[String(PLAN.materialId), 'XPS 32']]);
  expect(differencesOf(PLAN, yours, names)).toEqual([
    { place: 'material', theirs: 'XPS 32', yours: 'other' },
  ]);
});
