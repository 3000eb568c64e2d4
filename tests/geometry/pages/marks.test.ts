import { expect, test } from 'vitest';
import {
  DASHES,
  WIDTH,
  area,
  circle,
  corners,
  line,
  outlined,
  segment,
  text,
} from '#geometry/pages/marks.ts';

test('wide and narrow lines are as 2 to 1, and dashes come in pairs of stroke and gap', () => {
  expect(WIDTH.wide / WIDTH.narrow).toBe(2);
  for (const pattern of Object.values(DASHES)) expect(pattern.length % 2).toBe(0);
});

test('marks are narrow, continuous and in ink unless said otherwise', () => {
  expect(segment(1, 2, 3, 4)).toEqual({
    kind: 'line',
    points: [
      { x: 1, y: 2 },
      { x: 3, y: 4 },
    ],
    closed: false,
    type: 'continuous',
    widthMm: 0.25,
    ink: 'ink',
  });
  expect(line([], { type: 'dashed', closed: true })).toMatchObject({ type: 'dashed', closed: true });
  expect(circle({ x: 0, y: 0 }, 2, { ink: 'wire' })).toMatchObject({ radiusMm: 2, ink: 'wire' });
  expect(text({ x: 0, y: 0 }, 'A', 2)).toMatchObject({ anchor: 'start', turned: false, weight: 400 });
});

test('a rectangle goes round its four corners', () => {
  const rect = { x: 1, y: 2, width: 3, height: 4 };
  const around = [
    { x: 1, y: 2 },
    { x: 4, y: 2 },
    { x: 4, y: 6 },
    { x: 1, y: 6 },
  ];
  expect(corners(rect)).toEqual(around);
  expect(outlined(rect)).toMatchObject({ points: around, closed: true });
  expect(area(around, 'foam')).toEqual({ kind: 'area', rings: [around], ink: 'foam' });
});
