import { expect, test } from 'vitest';
import { alongWall } from '#geometry/cutting/walls.ts';

test('points divide a wall evenly, its ends left out', () => {
  expect(alongWall({ x: 0, y: 8 }, { x: 4, y: 0 }, 3)).toEqual([
    { x: 1, y: 6 },
    { x: 2, y: 4 },
    { x: 3, y: 2 },
  ]);
  expect(alongWall({ x: 0, y: 8 }, { x: 4, y: 0 }, 0)).toEqual([]);
});
