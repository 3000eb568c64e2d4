import { expect, test } from 'vitest';
import { text } from '#geometry/pages/marks.ts';
import { occupied } from '#geometry/pages/occupied.ts';
import { fits, isInside, touches } from '#geometry/pages/templates/inside.ts';

/** An L: 40 wide and 20 high, its upper right part missing. */
const CORNER = [
  { x: 0, y: 0 },
  { x: 10, y: 0 },
  { x: 10, y: 12 },
  { x: 40, y: 12 },
  { x: 40, y: 20 },
  { x: 0, y: 20 },
];

test('a point is inside or outside of a corner', () => {
  expect(isInside({ x: 5, y: 5 }, CORNER)).toBe(true);
  expect(isInside({ x: 30, y: 15 }, CORNER)).toBe(true);
  expect(isInside({ x: 30, y: 5 }, CORNER)).toBe(false);
  expect(isInside({ x: 0, y: 0 }, [])).toBe(false);
});

test('a text fits where all of it is inside and nothing stands yet', () => {
  const room = occupied();
  const words = text({ x: 12, y: 18 }, 'tip v3', 2.5);
  expect(fits(words, CORNER, room)).toBe(true);
  expect(fits({ ...words, at: { x: 12, y: 13 } }, CORNER, room)).toBe(false);
  expect(fits({ ...words, at: { x: 30, y: 18 } }, CORNER, room)).toBe(false);
  room.take({ x: 15, y: 15, width: 2, height: 2 });
  expect(fits(words, CORNER, room)).toBe(false);
});

test('a box touches where any part of its grid is inside', () => {
  expect(touches({ x: 12, y: 2, width: 20, height: 8 }, CORNER)).toBe(false);
  expect(touches({ x: 12, y: 2, width: 20, height: 12 }, CORNER)).toBe(true);
});
