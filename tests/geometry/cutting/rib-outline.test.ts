import { expect, test } from 'vitest';
import { areaOf, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { splitByStrips, tabOf, withChanges, withoutDoubles } from '#geometry/cutting/rib-outline.ts';
import { crossingsByHand } from './measuring.ts';

/** A lens from the trailing edge at (100, 0) over the top to the nose and back below. */
const LENS = polylineOf(
  Array.from({ length: 80 }, (_, i) => ({
    x: 50 + 50 * Math.cos((2 * Math.PI * i) / 80),
    y: 10 * Math.sin((2 * Math.PI * i) / 80),
  })),
);

test('a tab takes the place of the lower surface down to the board', () => {
  const tab = tabOf(LENS, 40, 10, -20)!;
  const outline = withChanges(LENS, [tab]);
  expect(boxOf(outline)).toEqual({ ...boxOf(LENS), minY: -20 });
  expect(crossingsByHand(outline)).toBe(0);
  // A rectangle of 10 mm from the surface at about −9.8 mm to −20 mm.
  expect(areaOf(outline) - areaOf(LENS)).toBeCloseTo(10 * 10.2, -1);
  expect(tabOf(LENS, 100, 10, -20)).toBeNull();
});

test('two tabs stand in the order of the outline, however they are given', () => {
  const tabs = [tabOf(LENS, 70, 6, -20)!, tabOf(LENS, 30, 6, -20)!];
  expect(withChanges(LENS, tabs)).toEqual(withChanges(LENS, tabs.slice().reverse()));
  expect(crossingsByHand(withChanges(LENS, tabs))).toBe(0);
});

test('strips divide an outline into pieces whose areas add up', () => {
  const pieces = splitByStrips(LENS, [
    { fore: 60, aft: 62 },
    { fore: 30, aft: 31 },
  ]);
  expect(pieces.map((piece) => [boxOf(piece).minX, boxOf(piece).maxX])).toEqual([
    [0, 30],
    [31, 60],
    [62, 100],
  ]);
  const strips = splitByStrips(LENS, [
    { fore: -1, aft: 30 },
    { fore: 31, aft: 60 },
    { fore: 62, aft: 101 },
  ]);
  const sum = [...pieces, ...strips].reduce((total, piece) => total + areaOf(piece), 0);
  expect(sum).toBeCloseTo(areaOf(LENS), 9);
  expect(splitByStrips(LENS, [])).toHaveLength(1);
});

test('points that stand twice are dropped, the last on the first as well', () => {
  const doubled = polylineOf([
    { x: 0, y: 0 },
    { x: 1, y: 0 },
    { x: 1, y: 0 },
    { x: 0, y: 1 },
    { x: 0, y: 0 },
  ]);
  expect(withoutDoubles(doubled).x).toHaveLength(3);
});
