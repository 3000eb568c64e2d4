import { expect, test } from 'vitest';
import { polylineOf } from '#geometry/cutting/arrays.ts';
import { packRibs } from '#geometry/cutting/packing.ts';

const rib = (number: number, width: number, height: number, x = 0, y = 0) => ({
  number,
  outlines: [
    polylineOf([
      { x, y },
      { x: x + width, y },
      { x: x + width, y: y + height },
      { x, y: y + height },
    ]),
  ],
  areaMm2: width * height,
});
const SHEET = { widthMm: 100, heightMm: 60, borderMm: 5, spacingMm: 2 };

test('a rib is moved inside the border wherever it lay before', () => {
  const { places, sheets } = packRibs([rib(1, 80, 40, -33, 700)], SHEET);
  expect(sheets).toBe(1);
  expect(places).toEqual([{ number: 1, sheet: 0, turned: false, dx: 38, dy: -695 }]);
});

test('a rib that only fits turned is turned: (x, y) goes to (−y, x)', () => {
  const { places } = packRibs([rib(1, 40, 85)], SHEET);
  // Its left lower corner comes to the right lower one of a box from (5, 5) to (90, 45).
  expect(places).toEqual([{ number: 1, sheet: 0, turned: true, dx: 90, dy: 5 }]);
});

test('what has no room goes on the next sheet, what fits on none is named', () => {
  const { places, sheets, tooLarge } = packRibs([rib(1, 80, 40), rib(2, 80, 40), rib(3, 95, 5)], SHEET);
  expect(sheets).toBe(2);
  expect(places.map(({ number, sheet }) => [number, sheet])).toEqual([
    [1, 0],
    [2, 1],
  ]);
  expect(tooLarge).toEqual([3]);
});

test('the yield counts packed ribs over whole sheets, and is 0 without any', () => {
  expect(packRibs([rib(1, 60, 50)], SHEET).yield).toBeCloseTo(0.5, 12);
  expect(packRibs([rib(1, 300, 5)], SHEET)).toEqual({ sheets: 0, places: [], tooLarge: [1], yield: 0 });
  expect(packRibs([], SHEET).yield).toBe(0);
});

test('places come in the order of the ribs’ numbers, the same each time', () => {
  const ribs = [rib(3, 20, 10), rib(1, 90, 10), rib(2, 50, 30)];
  const layout = packRibs(ribs, SHEET);
  expect(layout.places.map(({ number }) => number)).toEqual([1, 2, 3]);
  expect(packRibs(ribs, SHEET)).toEqual(layout);
});
