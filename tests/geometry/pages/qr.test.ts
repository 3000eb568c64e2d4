import { expect, test } from 'vitest';
import { QUIET_MODULES, qrMarks } from '#geometry/pages/qr.ts';

test('dark modules become rectangles in their place, with the quiet zone around', () => {
  const modules = [
    [true, true, false],
    [false, false, false],
    [true, false, true],
  ];
  // 3 + 2 × 4 = 11 modules of 1 mm.
  const [mark] = qrMarks(modules, { x: 100, y: 200, width: 11, height: 11 });
  expect(QUIET_MODULES).toBe(4);
  if (mark?.kind !== 'area') throw new Error('The code is no area.');
  const boxes = mark.rings.map((ring) => [ring[0]!.x, ring[0]!.y, ring[2]!.x, ring[2]!.y]);
  expect(boxes).toEqual([
    [104, 204, 106, 205],
    [104, 206, 105, 207],
    [106, 206, 107, 207],
  ]);
});

test('no modules, no marks', () => {
  expect(qrMarks([], { x: 0, y: 0, width: 10, height: 10 })).toEqual([]);
});
