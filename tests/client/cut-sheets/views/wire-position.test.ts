// @vitest-environment node
import { expect, test } from 'vitest';
import { type CutModel } from '#client/cut-sheets/views/plan-model.ts';
import { partTimes, pointAt, positionAt, secondsOfLine } from '#client/cut-sheets/views/wire-position.ts';

const line = (x: readonly number[], y: readonly number[]) => ({
  x: Float64Array.from(x),
  y: Float64Array.from(y),
});

/** Home, 10 s of travel with 5 s of warming up, 20 s of lead, 40 s of cut at the right half as fast. */
const left = line([0, 100, 100, 100], [0, 0, 40, 120]);
const right = line([0, 100, 100, 100], [0, 0, 20, 60]);
const CUT: CutModel = {
  kinds: ['travel', 'travel', 'lead', 'cut'],
  labels: [null, 'Travel to the trailing edge', 'Lead in', 'Upper surface'],
  left,
  right,
  leftTower: left,
  rightTower: right,
  arrives: Float64Array.of(0, 10, 35, 75),
  leaves: Float64Array.of(0, 15, 35, 75),
  lineOfNode: Int32Array.of(0, 5, 8, 10),
  lines: [],
  totalSeconds: 75,
  melt: {
    slowerEnd: 'tip',
    ratio: 2,
    largestRatio: 2,
    largestAtStation: 0,
    longestStandS: 0,
    standsAtStation: 0,
  },
  largestDeviationMm: 0,
};

test.each([
  [0, { node: 0, line: 0, kind: 'travel', waits: false }],
  [5, { node: 1, share: 0.5, line: 5, kind: 'travel', part: 'Travel to the trailing edge' }],
  [12, { node: 1, share: 1, waits: true, leftFeed: 0 }],
  [25, { node: 2, share: 0.5, line: 8, kind: 'lead', part: 'Lead in', leftFeed: 120, rightFeed: 60 }],
  [55, { node: 3, share: 0.5, line: 10, kind: 'cut', part: 'Upper surface', leftFeed: 120, rightFeed: 60 }],
  [75, { node: 3, share: 1 }],
  [1000, { node: 3, share: 1, seconds: 75 }],
  [-3, { node: 0, seconds: 0 }],
])('at %d s', (seconds, expected) => {
  expect(positionAt(CUT, seconds)).toMatchObject(expected);
});

test('the wire lies between its nodes', () => {
  expect(pointAt(CUT.left, positionAt(CUT, 55))).toEqual({ x: 100, y: 80 });
  expect(pointAt(CUT.right, positionAt(CUT, 0))).toEqual({ x: 0, y: 0 });
});

test('a line of the program is found by its number', () => {
  expect(secondsOfLine(CUT, 8)).toBe(35);
  expect(secondsOfLine(CUT, 9)).toBeNull();
});

test('parts begin where the wire leaves the one before', () => {
  expect(partTimes(CUT)).toEqual([0, 10, 35]);
});
