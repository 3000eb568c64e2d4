import { expect, test } from 'vitest';
import { balloon, planformExtent, planformMarks } from '#geometry/pages/cut-sheet/planform.ts';
import { boxOfMark, faultsOf, textsOf, wordsOf } from '../checking.ts';
import { PLANS, planned } from '../samples.ts';

const ROOM = { x: 10, y: 10, width: 700, height: 330 };

test('span and chords at their scale, the leading edge above', () => {
  const { plan } = planned(PLANS['tapered and swept']);
  const box = planformExtent(plan);
  expect([box.minX, box.maxX]).toEqual([0, 600]);
  expect(box.minY).toBeCloseTo(-220, 6);
  const marks = planformMarks(plan, ROOM, 1);
  const foam = marks.find((of) => of.kind === 'area' && of.ink === 'foam')!;
  expect(boxOfMark(foam).width).toBeCloseTo(600, 6);
  expect(faultsOf({ widthMm: 720, heightMm: 360, frame: ROOM, marks })).toEqual([]);
});

test('a tube is hidden and has an axis, an upper slot is seen', () => {
  const { plan } = planned(PLANS['tapered and swept']);
  const lines = planformMarks(plan, ROOM, 1).filter((of) => of.kind === 'line');
  expect(lines.filter(({ type }) => type === 'dashed')).toHaveLength(2);
  expect(lines.filter(({ type }) => type === 'long-dash-dot')).toHaveLength(1);
});

test('ribs have their numbers, and no foam is drawn where there is none', () => {
  const { plan } = planned(PLANS['ribs alone']);
  const marks = planformMarks(plan, ROOM, 1);
  for (const { number } of plan.ribs!.ribs) expect(wordsOf(marks)).toContain(String(number));
  expect(marks.some((of) => of.kind === 'area' && of.ink === 'foam')).toBe(false);
});

test('a balloon covers what is under it', () => {
  const [cover, , words] = balloon({ x: 5, y: 6 }, 12);
  expect(cover).toMatchObject({ kind: 'area', ink: 'paper' });
  expect(textsOf([words!])[0]?.text).toBe('12');
});
