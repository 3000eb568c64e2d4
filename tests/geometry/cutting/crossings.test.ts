import fc from 'fast-check';
import { expect, test } from 'vitest';
import { polylineOf } from '#geometry/cutting/arrays.ts';
import { crossingsOf } from '#geometry/cutting/crossings.ts';
import { crossingsByHand } from './measuring.ts';

test('a bow tie crosses itself once, in its middle', () => {
  const line = polylineOf([
    { x: 0, y: 0 },
    { x: 2, y: 2 },
    { x: 2, y: 0 },
    { x: 0, y: 2 },
  ]);
  expect(crossingsOf(line)).toEqual([{ first: 0, second: 2, firstShare: 0.5, secondShare: 0.5, x: 1, y: 1 }]);
});

test('a square, a point, a line there and back, and a common corner do not', () => {
  const square = [
    { x: 0, y: 0 },
    { x: 1, y: 0 },
    { x: 1, y: 1 },
    { x: 0, y: 1 },
  ];
  expect(crossingsOf(polylineOf(square))).toEqual([]);
  expect(crossingsOf(polylineOf([{ x: 3, y: 3 }]))).toEqual([]);
  expect(crossingsOf(polylineOf([...square, { x: 0, y: 0 }, { x: -1, y: 0 }, { x: -1, y: -1 }]))).toEqual([]);
  const upright = [0, 1, 2].map((y) => ({ x: 5, y }));
  expect(crossingsOf(polylineOf(upright))).toEqual([]);
});

test('finds what trying every pair of segments finds', () => {
  const point = fc.record({
    x: fc.double({ min: -10, max: 10, noNaN: true }),
    y: fc.double({ min: -10, max: 10, noNaN: true }),
  });
  fc.assert(
    fc.property(fc.array(point, { minLength: 3, maxLength: 24 }), (points) => {
      const line = polylineOf(points);
      const found = crossingsOf(line);
      expect(found.length).toBeGreaterThanOrEqual(crossingsByHand(line));
      for (const { first, second, x, y } of found) {
        expect(Math.abs(first - second)).toBeGreaterThan(1);
        expect(Number.isFinite(x + y)).toBe(true);
      }
    }),
    { numRuns: 300, seed: 8 },
  );
});
