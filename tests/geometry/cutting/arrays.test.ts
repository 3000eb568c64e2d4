import { expect, test } from 'vitest';
import { areaOf, at, between, boxOf, polylineOf, segmentDistance } from '#geometry/cutting/arrays.ts';

const SQUARE = polylineOf([
  { x: 0, y: 0 },
  { x: 2, y: 0 },
  { x: 2, y: 2 },
  { x: 0, y: 2 },
]);

test('a value that is not there is a mistake, not NaN', () => {
  expect(at([4, 5], 1)).toBe(5);
  expect(() => at([4, 5], 2)).toThrow(RangeError);
  expect(() => at(new Float64Array(1), -1)).toThrow(RangeError);
});

test('area has the sign of the turn, box encloses', () => {
  expect(areaOf(SQUARE)).toBe(4);
  expect(areaOf({ x: SQUARE.x.slice().reverse(), y: SQUARE.y.slice().reverse() })).toBe(-4);
  expect(boxOf(SQUARE, polylineOf([{ x: -1, y: 5 }]))).toEqual({ minX: -1, maxX: 2, minY: 0, maxY: 5 });
});

test('between runs on straight beyond both ends', () => {
  const far = polylineOf([{ x: 10, y: 4 }]);
  const near = polylineOf([{ x: 0, y: 0 }]);
  expect(between(near, far, 0.5)).toEqual(polylineOf([{ x: 5, y: 2 }]));
  expect(between(near, far, -0.1)).toEqual(polylineOf([{ x: -1, y: -0.4 }]));
});

test('distance from a segment: beside it, beyond its end, and from one without length', () => {
  expect(segmentDistance(1, 3, 0, 0, 2, 0)).toBe(3);
  expect(segmentDistance(5, 4, 0, 0, 2, 0)).toBe(5);
  expect(segmentDistance(3, 4, 0, 0, 0, 0)).toBe(5);
});
