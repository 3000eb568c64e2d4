import { expect, test } from 'vitest';
import { isWithin, occupied, overlaps } from '#geometry/pages/occupied.ts';

const BOX = { x: 0, y: 0, width: 10, height: 4 };

test('boxes that only touch do not overlap, unless a gap is asked for', () => {
  const beside = { ...BOX, x: 10 };
  expect(overlaps(BOX, beside)).toBe(false);
  expect(overlaps(BOX, beside, 0.5)).toBe(true);
  expect(overlaps(BOX, { ...BOX, x: 9.9 })).toBe(true);
});

test('a box lies within itself and not within one that is smaller on any side', () => {
  expect(isWithin(BOX, BOX)).toBe(true);
  expect(isWithin(BOX, { ...BOX, width: 9 })).toBe(false);
  expect(isWithin(BOX, { ...BOX, y: 0.1 })).toBe(false);
});

test('what is taken is not free', () => {
  const room = occupied();
  expect(room.isFree(BOX)).toBe(true);
  room.take(BOX);
  expect(room.isFree({ ...BOX, x: 10.2 })).toBe(false);
  expect(room.isFree({ ...BOX, x: 10.2 }, 0.1)).toBe(true);
});
