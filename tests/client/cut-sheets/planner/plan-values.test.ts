// @vitest-environment node
import { expect, test } from 'vitest';
import {
  draftValues,
  readPlan,
  sameValues,
  valueAt,
  valuesOf,
  withValue,
} from '#client/cut-sheets/planner/plan-values.ts';
import { PLAN } from './samples.ts';

test('a plan goes through the form unchanged', () => {
  expect(readPlan(valuesOf(PLAN))).toEqual({ plan: PLAN, errors: new Map() });
});

test('text that is no number is refused at its own path and stays what it is', () => {
  const values = withValue(valuesOf(PLAN), 'features.0.rootDepthMm', '2 mmm');
  const read = readPlan(values);
  expect(read.plan).toBeNull();
  expect([...read.errors]).toEqual([
    ['features.0.rootDepthMm', 'The slot’s depth at the root must be between 0.2 and 300 mm.'],
  ]);
  expect(valueAt(values, 'features.0.rootDepthMm')).toBe('2 mmm');
});

test('each refusal names its field', () => {
  let values = withValue(valuesOf(PLAN), 'panel.spanMm', 0);
  values = withValue(values, 'quantity', 0);
  values = withValue(values, 'stock', { leadingEdgeStation: 0.5, trailingEdgeStation: 0.52 });
  expect([...readPlan(values).errors.keys()].sort()).toEqual([
    'panel.spanMm',
    'quantity',
    'stock.trailingEdgeStation',
  ]);
});

test('setting a value leaves the values before as they were', () => {
  const before = valuesOf(PLAN);
  const after = withValue(before, 'panel.tip.chordMm', 90);
  expect(valueAt(before, 'panel.tip.chordMm')).toBe(180);
  expect(valueAt(after, 'panel.tip.chordMm')).toBe(90);
  expect(() => withValue(before, 'ribs.stations.count', 3)).toThrow(RangeError);
});

test('a draft is opened with what is wrong in it, but only when it is a plan', () => {
  const wrong = withValue(valuesOf(PLAN), 'panel.spanMm', 'long');
  expect(draftValues({ values: { ...wrong } })).toEqual(wrong);
  expect(draftValues({ values: { panel: 3 } })).toBeNull();
  expect(draftValues({ values: { ...wrong, features: [{ kind: 'door' }] } })).toBeNull();
});

test('the same values in another order are the same', () => {
  expect(sameValues({ a: 1, b: [1, { c: null }] }, { b: [1, { c: null }], a: 1 })).toBe(true);
  expect(sameValues({ a: 1 }, { a: 1, b: undefined })).toBe(false);
  expect(sameValues([1, 2], { 0: 1, 1: 2 })).toBe(false);
  expect(sameValues({ a: '1' }, { a: 1 })).toBe(false);
});
