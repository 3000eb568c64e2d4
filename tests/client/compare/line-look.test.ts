import { expect, test } from 'vitest';
import { dashOf, spread } from '#client/compare/line-look.ts';

test('six lines have six patterns', () => {
  expect(new Set([1, 2, 3, 4, 5, 6].map(dashOf)).size).toBe(6);
});

test('tags on one place are spread about it, in their order', () => {
  expect(spread([50, 50, 50], 10, 0, 100)).toEqual([40, 50, 60]);
  expect(spread([80, 20], 10, 0, 100)).toEqual([80, 20]);
});

test('tags at a limit stay within it and keep their distance', () => {
  expect(spread([2, 1, 30], 10, 0, 100)).toEqual([10, 0, 30]);
  expect(spread([99, 98], 10, 0, 100)).toEqual([100, 90]);
});
