import { expect, test } from 'vitest';
import { at, boxOf } from '#geometry/cutting/arrays.ts';
import { strokeText, strokeWidth } from '#geometry/cutting/strokes.ts';

const DIGITS = '0123456789';

test('each digit is one stroke, 10 high with its thickness of 1, and 5 wide, the one 3', () => {
  for (const digit of DIGITS) {
    const lines = strokeText(digit, { x: 0, y: 0 }, 10);
    expect(lines).toHaveLength(1);
    const box = boxOf(lines[0]!);
    expect([box.minY, box.maxY]).toEqual([expect.closeTo(-4.5, 9), expect.closeTo(4.5, 9)]);
    expect(box.maxX - box.minX).toBeLessThanOrEqual(strokeWidth(digit) * 10 - 1 + 1e-9);
    expect(strokeWidth(digit)).toBeCloseTo(digit === '1' ? 0.3 : 0.5, 12);
  }
});

test('no two digits have the same strokes', () => {
  const forms = Array.from(DIGITS, (digit) => JSON.stringify(strokeText(digit, { x: 0, y: 0 }, 1)));
  expect(new Set(forms).size).toBe(10);
});

test('a text stands centred, its characters 2 apart, in the order of reading', () => {
  const lines = strokeText('24.5', { x: 100, y: 50 }, 20);
  expect(lines).toHaveLength(4);
  const boxes = lines.map((line) => boxOf(line));
  expect(strokeWidth('24.5')).toBeCloseTo((5 + 2 + 5 + 2 + 1 + 2 + 5) / 10, 12);
  expect(boxes[0]!.minX).toBeCloseTo(100 - strokeWidth('24.5') * 10 + 1, 9);
  // From the line of one stroke to that of the next: half a stroke, the gap, half a stroke; in units of 2 mm.
  expect(boxes[1]!.minX - boxes[0]!.maxX).toBeCloseTo(6, 9);
  boxes.slice(1).forEach(({ minX }, i) => expect(minX).toBeGreaterThan(boxes[i]!.maxX));
});

test('curves are drawn finely: no segment of a round digit is longer than a quarter of its height', () => {
  for (const digit of '03689') {
    const [line] = strokeText(digit, { x: 0, y: 0 }, 4);
    for (let i = 1; i < line!.x.length; i++) {
      const length = Math.hypot(at(line!.x, i) - at(line!.x, i - 1), at(line!.y, i) - at(line!.y, i - 1));
      // The straight sides of the 0 are half its height.
      expect(length).toBeLessThanOrEqual(digit === '0' ? 2 + 1e-9 : 1);
    }
  }
});

test('a character without strokes is a mistake', () => {
  expect(() => strokeText('3R', { x: 0, y: 0 }, 5)).toThrow(RangeError);
  expect(strokeText('', { x: 0, y: 0 }, 5)).toEqual([]);
  expect(strokeWidth('')).toBe(0);
});
