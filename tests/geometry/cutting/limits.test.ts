import { expect, test } from 'vitest';
import { polylineOf } from '#geometry/cutting/arrays.ts';
import { type ExpectedCore } from '#geometry/cutting/expected-core.ts';
import { limitBreaches } from '#geometry/cutting/limits.ts';
import { type ReadMove } from '#geometry/cutting/read-program.ts';
import { PLAN } from './plans.ts';

/** Travel 600 by 300 mm at 1200 mm/min; a block of 260 by 60 mm stands at 60 / 20; the foam's limit is 300 mm/min. */
const move = (line: number, x: number, y: number, seconds: number): ReadMove => ({
  line,
  leftX: x,
  leftY: y,
  rightX: x,
  rightY: y,
  seconds,
});
const breaches = (moves: readonly ReadMove[], cores: readonly ExpectedCore[] = []) => {
  const face = polylineOf(moves.map(({ leftX, leftY }) => ({ x: leftX, y: leftY })));
  return limitBreaches(PLAN, moves, { left: face, right: face }, cores);
};
const named = (moves: readonly ReadMove[], cores: readonly ExpectedCore[] = []) =>
  breaches(moves, cores).map(({ code, path, at }) => [code, path, at?.line]);
const home = move(0, 0, 0, 0);

test('moves within travel, feeds and outside the block breach nothing', () => {
  expect(named([home, move(1, 0, 300, 60), move(2, 600, 300, 60)])).toEqual([]);
});

test('travel is overstepped on either axis of either tower, each with its field and line', () => {
  expect(named([home, { ...move(7, 0, 0, 60), rightX: 600.1 }])).toEqual([
    ['outside-travel', 'machine.travelXMm', 7],
  ]);
  expect(named([home, { ...move(7, 0, 0, 60), leftY: -0.1 }])).toEqual([
    ['outside-travel', 'machine.travelYMm', 7],
  ]);
});

test('an axis at 1200 mm/min is as fast as it may be', () => {
  expect(named([home, move(1, 0, 100, 5)])).toEqual([]);
  expect(named([home, move(1, 0, 100, 4.99)])).toEqual([['axis-too-fast', 'machine.maxFeedMmMin', 1]]);
});

test('the wire is held to the foam’s limit in the foam alone', () => {
  const cutting = (y: number, seconds: number) => [home, move(1, 0, y, 60), move(2, 100, y, seconds)];
  expect(named(cutting(50, 20))).toEqual([]);
  expect(named(cutting(50, 19.9))).toEqual([['wire-too-fast', 'material.maxFeedMmMin', 2]]);
  // Under the block, along its underside and over it.
  for (const y of [10, 20, 80, 90]) expect(named(cutting(y, 6))).toEqual([]);
});

test('a core that sticks out of the block is named where the wire cuts it there', () => {
  const line = polylineOf([
    { x: 100, y: 90 },
    { x: 80, y: 90 },
    { x: 80, y: 70 },
    { x: 100, y: 70 },
  ]);
  const core: ExpectedCore = {
    outline: { left: line, right: line },
    part: new Uint8Array(4),
    mouths: [],
    walls: { left: polylineOf([]), right: polylineOf([]) },
    halfKerfLeftMm: 0.5,
    halfKerfRightMm: 0.5,
  };
  const moves = [home, move(1, 0, 90.5, 60), move(2, 90, 90.5, 60), move(3, 90, 75, 60)];
  // The block ends at 80 mm: at 90.5 mm the kerf is 10 mm outside it.
  expect(named(moves, [core])).toEqual([
    ['outside-block', 'block', 2],
    ['outside-block', 'block', 2],
  ]);
  expect(breaches(moves, [core])[0]!.message).toContain('10 mm outside the block at the left face');
});

test('twelve breaches of a kind are listed, the others counted', () => {
  const moves = [home, ...Array.from({ length: 20 }, (_, i) => move(i + 1, 0, 301 + i, 60))];
  const found = breaches(moves);
  // Both towers each time.
  expect(found).toHaveLength(13);
  expect(found.at(-1)!.message).toBe('28 further lines do the same as line 6.');
});
