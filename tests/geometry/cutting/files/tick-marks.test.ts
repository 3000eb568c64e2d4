import { expect, test } from 'vitest';
import { at, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { tickMarks } from '#geometry/cutting/files/tick-marks.ts';
import { type Tick } from '#geometry/cutting/template.ts';

/** A board 100 by 20 mm. */
const BOARD = polylineOf([
  { x: 100, y: 20 },
  { x: 0, y: 20 },
  { x: 0, y: 0 },
  { x: 100, y: 0 },
]);
const tick = (number: number, x: number, surface: 'upper' | 'lower' = 'upper'): Tick => ({
  number,
  station: x / 100,
  surface,
  at: { x, y: surface === 'upper' ? 20 : 0 },
  inwards: { x: 0, y: surface === 'upper' ? -1 : 1 },
});
const first = tick(1, 90);

test('a tick begins on the outline and points inwards, 2 mm long, 3.5 mm with a number', () => {
  const ticks = [first, tick(2, 80), tick(3, 70)];
  const [one, two, three] = tickMarks(ticks, BOARD, 0, []);
  expect(one).toEqual(polylineOf([{ x: 90, y: 20 }, { x: 90, y: 16.5 }])); // prettier-ignore
  expect(two).toEqual(polylineOf([{ x: 80, y: 20 }, { x: 80, y: 18 }])); // prettier-ignore
  expect(three).toEqual(polylineOf([{ x: 70, y: 20 }, { x: 70, y: 16.5 }])); // prettier-ignore
});

test('first, last and every fifth carry a number, 2 mm high, beyond the tick’s end', () => {
  const ticks = Array.from({ length: 7 }, (_, i) => tick(i + 1, 90 - 12 * i));
  const marks = tickMarks(ticks, BOARD, 0, []);
  const numbers = marks.slice(7);
  for (const x of [90, 42, 18]) {
    const here = numbers.filter((of) => Math.abs(at(of.x, 0) - x) < 2);
    expect(here.length).toBeGreaterThan(0);
    const { minY, maxY } = boxOf(...here);
    // Strokes are a tenth of the height thick, so their middle lines span nine tenths.
    expect(maxY - minY).toBeCloseTo(1.8, 2);
    expect(maxY).toBeLessThan(16.5);
  }
  expect(numbers.every((of) => [90, 42, 18].some((x) => Math.abs(at(of.x, 0) - x) < 2))).toBe(true);
});

test('a number gives way to what is taken, or stays away', () => {
  const level = { minX: 0, maxX: 100, minY: 15, maxY: 15 };
  const lowered = tickMarks([first], BOARD, 0, [level]).slice(1);
  expect(lowered.length).toBeGreaterThan(0);
  expect(boxOf(...lowered).maxY).toBeLessThan(15);
  expect(tickMarks([first], BOARD, 0, [{ minX: 80, maxX: 100, minY: 0, maxY: 16 }])).toHaveLength(1);
  const near = [first, tick(2, 89.5)];
  expect(tickMarks(near, BOARD, 0, []).length).toBeGreaterThan(2);
  const alone = tickMarks([first], BOARD, 0, []).length - 1;
  expect(tickMarks([first, tick(2, 90)], BOARD, 0, []).length).toBeGreaterThan(2 + alone);
});

test('ticks of both surfaces of a thin board stay apart, without numbers', () => {
  const thin = polylineOf([{ x: 100, y: 3 }, { x: 0, y: 3 }, { x: 0, y: 0 }, { x: 100, y: 0 }]); // prettier-ignore
  const upper = { ...first, at: { x: 90, y: 3 } };
  const [above, below, ...more] = tickMarks([upper, tick(2, 90, 'lower')], thin, 0, []);
  expect(at(above!.y, 1)).toBe(2);
  expect(at(below!.y, 1)).toBe(1);
  expect(more).toEqual([]);
});

test('ticks are taken inwards to the outline, and left out where they do not meet it', () => {
  const outside = { ...first, at: { x: 90, y: 20.3 } };
  expect(at(tickMarks([outside], BOARD, 0.3, [])[0]!.y, 0)).toBeCloseTo(20, 12);
  expect(tickMarks([outside], BOARD, 0, [])).toEqual([]);
});
