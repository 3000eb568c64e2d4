import { expect, test } from 'vitest';
import { SCALE_BAR_MM, scaleBar } from '#geometry/pages/scale-bar.ts';
import { boxOfMark, wordsOf } from './checking.ts';

test.each(['level', 'upright'] as const)('the %s bar is 100 mm long and says so', (direction) => {
  const from = { x: 20, y: 150 };
  const marks = scaleBar(from, direction);
  const lines = marks.filter(({ kind }) => kind === 'line').map(boxOfMark);
  const longest = lines.reduce((best, of) => (of.width + of.height > best.width + best.height ? of : best));
  expect(SCALE_BAR_MM).toBe(100);
  expect([longest.width, longest.height]).toEqual(direction === 'level' ? [100, 0] : [0, 100]);
  expect(longest.x).toBe(20);
  expect(longest.y).toBe(direction === 'level' ? 150 : 50);
  expect(wordsOf(marks)).toEqual(['100 mm']);
  // All of it keeps to the room it asks for.
  for (const box of marks.map(boxOfMark)) {
    if (direction === 'level') expect(box.y).toBeGreaterThanOrEqual(150 - 5.5);
    else expect(box.x).toBeGreaterThanOrEqual(20 - 5.5);
  }
});
