import { expect, test } from 'vitest';
import { polylineOf } from '#geometry/cutting/arrays.ts';
import { lighteningHoles, roomsAlong } from '#geometry/cutting/lightening.ts';

const BAR = polylineOf([
  { x: 0, y: 0 },
  { x: 91, y: 0 },
  { x: 91, y: 20 },
  { x: 0, y: 20 },
]);
const RULES = { most: 9, minimumWebMm: 3, smallestDiameterMm: 6 };

test('a bar of 20 mm with a web of 3 mm takes holes of 14 mm, 3 mm apart', () => {
  const holes = lighteningHoles(BAR, BAR, [], RULES).sort((a, b) => a.x - b.x);
  expect(Math.max(...holes.map(({ radius }) => radius))).toBeCloseTo(7, 9);
  expect(holes.every(({ y }) => y === 10)).toBe(true);
  holes.slice(1).forEach((hole, i) => {
    expect(hole.x - holes[i]!.x - hole.radius - holes[i]!.radius).toBeGreaterThanOrEqual(3 - 1e-9);
  });
  expect(holes.length).toBeGreaterThanOrEqual(3);
});

test('holes stay clear of what is there, and none comes where it would be too small', () => {
  const tube = { x: 45.5, y: 10, radius: 8 };
  for (const { x, radius } of lighteningHoles(BAR, BAR, [tube], RULES)) {
    expect(Math.abs(x - 45.5)).toBeGreaterThanOrEqual(8 + 3 + radius - 1e-9);
  }
  expect(lighteningHoles(BAR, BAR, [], { ...RULES, smallestDiameterMm: 15 })).toEqual([]);
  expect(lighteningHoles(BAR, BAR, [], { ...RULES, most: 2 })).toHaveLength(2);
});

test('there is no room outside an outline that a notch has eaten into', () => {
  const notched = polylineOf([
    { x: 91, y: 0 },
    { x: 91, y: 20 },
    { x: 60, y: 20 },
    { x: 60, y: 5 },
    { x: 30, y: 5 },
    { x: 30, y: 20 },
    { x: 0, y: 20 },
    { x: 0, y: 0 },
  ]);
  for (const { x, radius } of roomsAlong(notched, BAR)) {
    if (x > 30 && x < 60) expect(radius).toBe(0);
    else expect(radius).toBeLessThanOrEqual(10);
  }
});
