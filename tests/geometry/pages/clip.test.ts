import fc from 'fast-check';
import { expect, test } from 'vitest';
import { clippedLine } from '#geometry/pages/clip.ts';

const RECT = { x: 0, y: 0, width: 10, height: 6 };

test('a line through the rectangle is cut at its border', () => {
  const pieces = clippedLine(
    [
      { x: -5, y: 3 },
      { x: 20, y: 3 },
    ],
    false,
    RECT,
  );
  expect(pieces).toEqual([
    [
      { x: 0, y: 3 },
      { x: 10, y: 3 },
    ],
  ]);
});

test('a line that leaves and comes back is two pieces; one inside stays whole and is closed', () => {
  const zigzag = [
    { x: 1, y: 1 },
    { x: 1, y: 9 },
    { x: 5, y: 9 },
    { x: 5, y: 1 },
  ];
  expect(clippedLine(zigzag, false, RECT)).toHaveLength(2);
  const square = [
    { x: 1, y: 1 },
    { x: 3, y: 1 },
    { x: 3, y: 3 },
  ];
  expect(clippedLine(square, true, RECT)).toEqual([[...square, square[0]]]);
  expect(clippedLine(square, false, { ...RECT, x: 50 })).toEqual([]);
  expect(clippedLine([], true, RECT)).toEqual([]);
});

test('rectangles side by side share a line out without loss', () => {
  const point = fc.record({
    x: fc.double({ min: -20, max: 40, noNaN: true }),
    y: fc.double({ min: -20, max: 40, noNaN: true }),
  });
  const length = (pieces: readonly (readonly { x: number; y: number }[])[]) =>
    pieces
      .flatMap((piece) => piece.slice(1).map((to, i) => Math.hypot(to.x - piece[i]!.x, to.y - piece[i]!.y)))
      .reduce((sum, of) => sum + of, 0);
  fc.assert(
    fc.property(fc.array(point, { minLength: 2, maxLength: 8 }), (points) => {
      const whole = length(clippedLine(points, true, { x: -30, y: -30, width: 80, height: 80 }));
      const parts = [-30, 10].flatMap((x) =>
        [-30, 10].map((y) => length(clippedLine(points, true, { x, y, width: 40, height: 40 }))),
      );
      const border = points.some(({ x, y }) => x === 10 || y === 10);
      fc.pre(!border);
      expect(parts.reduce((sum, of) => sum + of, 0)).toBeCloseTo(whole, 6);
    }),
    { numRuns: 40 },
  );
});
