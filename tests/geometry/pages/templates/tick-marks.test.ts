import { expect, test } from 'vitest';
import { type Tick } from '#geometry/cutting/template.ts';
import { textBox } from '#geometry/pages/lettering.ts';
import { occupied, overlaps } from '#geometry/pages/occupied.ts';
import { down, tickMarks } from '#geometry/pages/templates/tick-marks.ts';

/** A bar 200 mm long, ticks along its upper edge. */
function bar(heightMm: number, count: number): { outline: { x: number; y: number }[]; ticks: Tick[] } {
  const outline = [
    { x: 0, y: 0 },
    { x: 200, y: 0 },
    { x: 200, y: heightMm },
    { x: 0, y: heightMm },
  ];
  const ticks = Array.from({ length: count }, (_, i): Tick => ({
    number: i + 1,
    station: i / count,
    surface: 'upper',
    at: { x: 10 + (180 * i) / (count - 1), y: 0 },
    inwards: { x: 0, y: -1 },
  }));
  return { outline, ticks };
}

test('numbers stand inside a thick template, beside their tick', () => {
  const { outline, ticks } = bar(20, 10);
  const { lines, texts } = tickMarks(ticks, outline, occupied());
  expect(lines).toHaveLength(10);
  expect(texts.map(({ text }) => Number(text)).sort((a, b) => a - b)).toEqual(ticks.map((of) => of.number));
  for (const mark of texts) {
    const tick = ticks.find(({ number }) => String(number) === mark.text)!;
    expect(mark.at.x).toBeCloseTo(tick.at.x, 9);
    expect(textBox(mark).y).toBeGreaterThan(2);
  }
});

test('where the template is thin they stand outside of it', () => {
  const { outline, ticks } = bar(3, 10);
  const { lines, texts } = tickMarks(ticks, outline, occupied());
  expect(texts).toHaveLength(10);
  for (const mark of texts) expect(textBox(mark).y + textBox(mark).height).toBeLessThan(0);
  // The tick is drawn out towards its number and no further in than the middle.
  for (const line of lines) {
    const ys = line.kind === 'line' ? line.points.map(({ y }) => y) : [];
    expect(Math.min(...ys)).toBeLessThan(-1);
    expect(Math.max(...ys)).toBeLessThanOrEqual(1.5);
  }
});

test('crowded ticks show the first, the last and every fifth number, none over another', () => {
  const { outline, ticks } = bar(20, 61);
  const { lines, texts } = tickMarks(ticks, outline, occupied());
  expect(lines).toHaveLength(61);
  const numbers = texts.map(({ text }) => Number(text)).sort((a, b) => a - b);
  expect(numbers).toEqual(
    [1, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50, 55, 60, 61].filter((of) => numbers.includes(of)),
  );
  expect(numbers.length).toBeGreaterThanOrEqual(13);
  texts.forEach((mark, i) => {
    for (const other of texts.slice(0, i)) expect(overlaps(textBox(mark), textBox(other))).toBe(false);
  });
});

test('the drawing has y down', () => {
  expect(down({ x: 1, y: 2 })).toEqual({ x: 1, y: -2 });
});

test('no number stands beyond the middle, where it would seem to belong to the other surface', () => {
  for (const heightMm of [4, 5, 6, 7, 8, 10]) {
    const { outline, ticks } = bar(heightMm, 10);
    for (const mark of tickMarks(ticks, outline, occupied()).texts) {
      const { y, height } = textBox(mark);
      expect(y + height / 2).toBeLessThan(heightMm / 2 + 0.6);
    }
  }
});
