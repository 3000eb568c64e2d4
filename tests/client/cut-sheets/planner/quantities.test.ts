// @vitest-environment node
import { expect, test } from 'vitest';
import {
  formatList,
  formatQuantity,
  type PlanQuantity,
  readList,
  readQuantity,
  stepQuantity,
} from '#client/cut-sheets/planner/quantities.ts';
import { type Units } from '#client/app/units.ts';

const form = (as: PlanQuantity, decimals = 1, units: Units = 'mm') => ({ as, decimals, units, chordMm: 200 });

test.each([
  ['length', '3 mm', 3],
  ['length', '12 + 0.4', 12.4],
  ['length', '0.25 in', 6.35],
  ['station', '30', 0.3],
  ['station', '50 mm', 0.25],
  ['angle', '2.5°', 2.5],
  ['seconds', '3 s', 3],
  ['whole', ' 60 ', 60],
  ['number', '2 * 1.1', 2.2],
] as const)('%s: %s is read', (as, text, value) => {
  expect(readQuantity(text, form(as)).value).toBeCloseTo(value, 12);
});

test.each([
  ['length', '30 %'],
  ['length', '2 mmm'],
  ['whole', '2.5'],
  ['number', ''],
  ['seconds', 'soon'],
] as const)('%s: %s is refused with a sentence', (as, text) => {
  expect(readQuantity(text, form(as)).error).toMatch(/\.$/);
});

test('a person of inches types inches and reads inches', () => {
  expect(readQuantity('1', form('length', 1, 'inch')).value).toBe(25.4);
  expect(formatQuantity(25.4, form('length', 1, 'inch'))).toBe('1.00 in');
});

test('an arrow steps by the last shown decimal, on its grid', () => {
  expect(stepQuantity(220, 1, form('length'))).toBe(220.1);
  expect(stepQuantity(0.3, -10, form('station'))).toBe(0.29);
  expect(stepQuantity(25.4, 1, form('length', 1, 'inch'))).toBeCloseTo(25.654, 12);
});

test('a list has one unit at its end', () => {
  expect(readList('15 30; 50, 70 %', form('station'))).toEqual({ values: [0.15, 0.3, 0.5, 0.7] });
  expect(readList('10 20 mm', form('length', 1, 'inch'))).toEqual({ values: [10, 20] });
  expect(readList('1 2', form('length', 1, 'inch'))).toEqual({ values: [25.4, 50.8] });
  expect(readList('10 mm 20 mm', form('length'))).toHaveProperty('error');
  expect(formatList([0.15, 0.3], form('station'))).toBe('15.0  30.0 %');
});

test('a list reads back as it was written', () => {
  const values = [0, 75.5, 600];
  expect(readList(formatList(values, form('length')), form('length'))).toEqual({ values });
});
