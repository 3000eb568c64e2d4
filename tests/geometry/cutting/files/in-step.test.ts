import { expect, test } from 'vitest';
import { type Polyline, polylineOf } from '#geometry/cutting/arrays.ts';
import { type Core } from '#geometry/cutting/core.ts';
import { pairsInStep, pick } from '#geometry/cutting/files/in-step.ts';

const line = (...points: readonly (readonly [number, number])[]): Polyline =>
  polylineOf(points.map(([x, y]) => ({ x, y })));

function coreOf(root: Polyline, tip: Polyline): Core {
  return { root: { core: root }, tip: { core: tip } } as unknown as Core;
}

test('a pair goes only when both of its points stand where those before it stand', () => {
  const root = line([10, 0], [10, 0], [10, 0], [0, 5], [0, 5], [3, -4]);
  const tip = line([8, 0], [8, 0], [8, 1], [0, 4], [0, 3], [2, -3]);
  // The second pair repeats the first at both ends; the third and the fifth differ at the tip.
  expect(pairsInStep(coreOf(root, tip))).toEqual([0, 2, 3, 4, 5]);
});

test('differences that five decimals do not show count as none, larger ones do', () => {
  const tip = line([0, 0], [0, 0], [0, 0], [0, 9]);
  const root = line([1, 0], [1.000004, 0], [1.00002, 0], [0, 9]);
  expect(pairsInStep(coreOf(root, tip))).toEqual([0, 2, 3]);
});

test('the end of a closed outline that comes back to its beginning is not written twice', () => {
  const closed = line([10, 0], [0, 5], [3, -4], [10, 0], [10, 0]);
  expect(pairsInStep(coreOf(closed, closed))).toEqual([0, 1, 2]);
  const open = line([9, 0], [0, 5], [3, -4], [8, 0], [8, 0]);
  expect(pairsInStep(coreOf(closed, open))).toEqual([0, 1, 2, 3]);
});

test('chosen points keep their order', () => {
  expect(pick(line([1, 2], [3, 4], [5, 6]), [2, 0])).toEqual(line([5, 6], [1, 2]));
});
