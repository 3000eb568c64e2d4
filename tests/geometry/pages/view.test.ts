import { expect, test } from 'vitest';
import { scaleFor, scaleText, viewOf } from '#geometry/pages/view.ts';

const EXTENT = { minX: -10, maxX: 90, minY: 0, maxY: 20 };

test('the largest scale of ISO 5455 that fits', () => {
  expect(scaleFor(EXTENT, { width: 100, height: 20 })).toBe(1);
  expect(scaleFor(EXTENT, { width: 99, height: 20 })).toBe(1 / 2);
  expect(scaleFor(EXTENT, { width: 1000, height: 99 })).toBe(2);
  expect(scaleFor(EXTENT, { width: 1000, height: 1000 }, 1)).toBe(1);
  expect(scaleFor(EXTENT, { width: 0.01, height: 20 })).toBeGreaterThan(0);
});

test('scales are written as the standard writes them', () => {
  expect([5, 1, 1 / 5, 1 / 200].map(scaleText)).toEqual(['5 : 1', '1 : 1', '1 : 5', '1 : 200']);
});

test('the middle of the extent stands in the middle of the room, y turned round', () => {
  const { toPage } = viewOf(EXTENT, { x: 0, y: 0, width: 200, height: 100 }, 2);
  expect(toPage({ x: 40, y: 10 })).toEqual({ x: 100, y: 50 });
  expect(toPage({ x: 50, y: 15 })).toEqual({ x: 120, y: 40 });
});
