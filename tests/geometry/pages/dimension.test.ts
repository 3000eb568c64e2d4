import { expect, test } from 'vitest';
import { dimension } from '#geometry/pages/dimension.ts';
import { textBox } from '#geometry/pages/lettering.ts';
import { overlaps } from '#geometry/pages/occupied.ts';
import { boxOfMark, textsOf } from './checking.ts';

const WIDE = {
  from: { x: 10, y: 50 },
  to: { x: 110, y: 40 },
  direction: 'level',
  at: 60,
  text: '100.0',
} as const;

test('the text stands in a gap of the dimension line, between arrows that point outwards', () => {
  const marks = dimension(WIDE);
  const [words] = textsOf(marks);
  expect(words?.text).toBe('100.0');
  expect(words?.at.x).toBeCloseTo(60, 9);
  const box = textBox(words!);
  const lines = marks.filter((of) => of.kind === 'line').map(boxOfMark);
  for (const line of lines) expect(overlaps(box, { ...line, height: line.height + 0.001 })).toBe(false);
  const level = lines.filter(({ height }) => height === 0);
  expect(level.map(({ y }) => y)).toEqual([60, 60]);
  expect(Math.min(...level.map(({ x }) => x))).toBe(10);
  expect(Math.max(...level.map(({ x, width }) => x + width))).toBe(110);
  const tips = marks.flatMap((of) => (of.kind === 'area' ? [of.rings[0]![0]!.x] : []));
  expect(tips).toEqual([10, 110]);
});

test('extension lines begin beside the outline and end beyond the dimension line', () => {
  const upright = dimension(WIDE)
    .filter((of) => of.kind === 'line')
    .map(boxOfMark)
    .filter(({ width }) => width === 0);
  expect(upright.map(({ x }) => x)).toEqual([10, 110]);
  expect(upright.map(({ y }) => y)).toEqual([50.8, 40.8]);
  for (const { y, height } of upright) expect(y + height).toBeCloseTo(61.5, 9);
});

test('where there is no room the text stands beyond arrows that point inwards', () => {
  const marks = dimension({ ...WIDE, to: { x: 18, y: 40 }, text: '8.0' });
  const box = textBox(textsOf(marks)[0]!);
  expect(box.x).toBeGreaterThan(18 + 5);
  const arrows = marks.flatMap((of) => (of.kind === 'area' ? [boxOfMark(of)] : []));
  expect(arrows.map(({ x }) => x)).toEqual([7.5, 18]);
  const before = dimension({ ...WIDE, to: { x: 18, y: 40 }, text: '8.0', outside: 'before' });
  const other = textBox(textsOf(before)[0]!);
  expect(other.x + other.width).toBeLessThan(10 - 5);
});

test('an upright dimension is read from the right and above the line is the left', () => {
  const marks = dimension({
    from: { x: 50, y: 10 },
    to: { x: 50, y: 90 },
    direction: 'upright',
    at: 40,
    text: '80.0',
  });
  const [words] = textsOf(marks);
  expect(words?.turned).toBe(true);
  const box = textBox(words!);
  expect(box.y + box.height / 2).toBeCloseTo(50, 9);
  expect(box.x).toBeLessThan(40);
  expect(box.x + box.width).toBeGreaterThan(40);
});
