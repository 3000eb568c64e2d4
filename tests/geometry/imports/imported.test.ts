import { expect, test } from 'vitest';
import { type FoundChains, contourOf } from '#geometry/imports/imported.ts';
import { SHARP, largestShift, numbered, refusalOf } from './files.ts';

const chain = numbered(SHARP);
const found = (change: Partial<FoundChains>): FoundChains => ({
  name: 'Marsh',
  groups: [[chain]],
  unit: { mm: null, hundred: 'percent' },
  notes: ['read decimal commas'],
  divided: new Set(),
  joint: 1e-9,
  extras: false,
  ordered: true,
  ...change,
});

test('repairs are told in the order they are made', () => {
  const twice = chain.flatMap((point, i) => (i === 5 ? [point, point] : [point]));
  const swapped = twice.map((point, i) => (i === 11 ? twice[12]! : i === 12 ? twice[11]! : point));
  const scaled = swapped.map(({ x, y, line }) => ({ x: 250 * x, y: 250 * y, line })).reverse();
  const contour = contourOf(found({ groups: [[scaled]] }));
  expect(contour.repairs).toEqual([
    'read decimal commas',
    'removed 1 duplicate point',
    'exchanged 1 pair of reversed points',
    'reversed the direction of the points',
    'scaled from 250 mm chord',
  ]);
  expect(largestShift(contour, SHARP)).toBeLessThan(1e-14);
  expect([contour.name, Math.round(contour.sourceChordMm!)]).toEqual(['Marsh', 250]);
});

test('what was missing or began elsewhere is told', () => {
  expect(contourOf(found({ groups: [[chain.slice(0, -1)]] })).repairs).toContain(
    'added the missing trailing-edge point of one surface',
  );
  const nose = [...chain.slice(19), ...chain.slice(1, 20)];
  expect(contourOf(found({ groups: [[nose]] })).repairs).toContain('began the outline at its trailing edge');
  const surfaces = [chain.slice(0, 20).reverse(), chain.slice(19)];
  const joined = contourOf(found({ groups: [surfaces], notes: [] }));
  expect(joined.repairs).toEqual(['joined the surfaces: upper trailing edge, nose, lower trailing edge']);
  expect(largestShift(joined, SHARP)).toBe(0);
});

test('lines of different groups are not joined', () => {
  const surfaces = [chain.slice(0, 10), chain.slice(9)];
  expect(contourOf(found({ groups: [surfaces] })).x).toHaveLength(39);
  const chord = numbered([{ x: 0, y: 0 }, { x: 1, y: 0 }]); // prettier-ignore
  const contour = contourOf(found({ groups: [surfaces, [chord]], extras: true, ordered: false }));
  expect(contour.repairs).toContain('passed over 1 open line beside the outline');
});

test('divided lines are told only when they are part of the outline', () => {
  expect(contourOf(found({ divided: new Set([4, 99]) })).repairs).toContain(
    'divided 1 long straight line into short pieces',
  );
});

test('too few different points and too many are refused', () => {
  expect(refusalOf(() => contourOf(found({ groups: [[chain.slice(0, 9)]] }))).message).toBe(
    'The outline has 9 different points; 10 are needed.',
  );
  const same = Array.from({ length: 12 }, () => chain[0]!);
  expect(refusalOf(() => contourOf(found({ groups: [[same]] }))).code).toBe('no-outline');
  const many = Array.from({ length: 10_001 }, (_, i) => ({ x: i, y: 0, line: i }));
  expect(refusalOf(() => contourOf(found({ groups: [[many]] }))).code).toBe('too-many-points');
});
