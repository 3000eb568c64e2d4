import { expect, test } from 'vitest';
import { SHEETS, frameOf, sheetFrame } from '#geometry/pages/sheet-frame.ts';
import { boxOfMark, textsOf, wordsOf } from './checking.ts';

test('the frame keeps 20 mm at the left and 10 mm elsewhere', () => {
  expect(SHEETS.A3).toEqual({ widthMm: 420, heightMm: 297 });
  expect(frameOf('A3')).toEqual({ x: 20, y: 10, width: 390, height: 277 });
  expect(frameOf('A4')).toEqual({ x: 20, y: 10, width: 267, height: 190 });
});

test.each(['A3', 'A4'] as const)('%s: fields of 50 mm from the middle, named on all sides', (size) => {
  const marks = sheetFrame(size);
  const words = wordsOf(marks);
  const count = { A3: { columns: 8, rows: 6 }, A4: { columns: 6, rows: 4 } }[size];
  for (let i = 1; i <= count.columns; i += 1) expect(words.filter((of) => of === String(i))).toHaveLength(2);
  for (const letter of 'ABCDEF'.slice(0, count.rows))
    expect(words.filter((of) => of === letter)).toHaveLength(2);
  expect(words).toHaveLength(2 * (count.columns + count.rows));
  const top = marks
    .filter((of) => of.kind === 'line' && of.points.length === 2)
    .map(boxOfMark)
    .filter(({ width, y }) => width === 0 && y < 10)
    .map(({ x }) => x);
  expect(top).toContain(SHEETS[size].widthMm / 2);
  for (let i = 1; i < top.length; i += 1) expect(top[i]! - top[i - 1]!).toBe(50);
  const frame = frameOf(size);
  for (const mark of textsOf(marks)) {
    const box = boxOfMark(mark);
    const inside = box.x > frame.x && box.x + box.width < frame.x + frame.width && box.y > frame.y;
    expect(inside && box.y + box.height < frame.y + frame.height).toBe(false);
    expect(box.x).toBeGreaterThan(0);
    expect(box.y + box.height).toBeLessThan(SHEETS[size].heightMm);
  }
});
