import fc from 'fast-check';
import { expect, test } from 'vitest';
import { OVERLAP_MM, rowLetters, tilingOf } from '#geometry/pages/templates/tiles.ts';

const WINDOW = { width: 268, height: 136 };

test('one page holds what fits, in its middle', () => {
  const { tiles, joins } = tilingOf({ minX: 0, maxX: 200, minY: -20, maxY: 20 }, WINDOW);
  expect(tiles).toEqual([{ row: 0, column: 0, name: 'A1', minX: -34, maxX: 234, minY: -68, maxY: 68 }]);
  expect(joins).toEqual({ x: [], y: [] });
});

test('rows count from the top and columns from the left', () => {
  const { rows, columns, tiles, joins } = tilingOf({ minX: 0, maxX: 500, minY: 0, maxY: 200 }, WINDOW);
  expect([rows, columns]).toEqual([2, 2]);
  expect(tiles.map(({ name }) => name)).toEqual(['A1', 'A2', 'B1', 'B2']);
  expect(tiles[0]!.minY).toBeGreaterThan(tiles[2]!.minY);
  expect(tiles[0]!.maxX - tiles[1]!.minX).toBeCloseTo(OVERLAP_MM, 9);
  expect(joins.x[0]).toBeCloseTo((tiles[0]!.maxX + tiles[1]!.minX) / 2, 9);
  expect(joins.y[0]).toBeCloseTo((tiles[0]!.minY + tiles[2]!.maxY) / 2, 9);
});

test('every content is covered by as few tiles as hold it', () => {
  const size = fc.double({ min: 5, max: 5000, noNaN: true });
  fc.assert(
    fc.property(size, size, (width, height) => {
      const content = { minX: -width / 3, maxX: (2 * width) / 3, minY: -height, maxY: 0 };
      const { tiles, rows, columns } = tilingOf(content, WINDOW);
      expect(tiles).toHaveLength(rows * columns);
      expect(Math.min(...tiles.map((of) => of.minX))).toBeLessThanOrEqual(content.minX + 1e-6);
      expect(Math.max(...tiles.map((of) => of.maxX))).toBeGreaterThanOrEqual(content.maxX - 1e-6);
      expect(Math.min(...tiles.map((of) => of.minY))).toBeLessThanOrEqual(content.minY + 1e-6);
      expect(Math.max(...tiles.map((of) => of.maxY))).toBeGreaterThanOrEqual(content.maxY - 1e-6);
      const held = (count: number, window: number) => count * (window - OVERLAP_MM) + OVERLAP_MM;
      if (columns > 1) expect(held(columns - 1, WINDOW.width)).toBeLessThan(width + 1e-6);
      if (rows > 1) expect(held(rows - 1, WINDOW.height)).toBeLessThan(height + 1e-6);
    }),
    { numRuns: 40 },
  );
});

test('more than 26 rows have two letters', () => {
  expect([0, 25, 26, 51, 52].map(rowLetters)).toEqual(['A', 'Z', 'AA', 'AZ', 'BA']);
});
