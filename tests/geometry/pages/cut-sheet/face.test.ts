import { expect, test } from 'vitest';
import { faceExtent, faceMarks } from '#geometry/pages/cut-sheet/face.ts';
import { boxOfMark, faultsOf, wordsOf } from '../checking.ts';
import { PLANS, planned } from '../samples.ts';

const ROOM = { x: 20, y: 10, width: 320, height: 140 };
const faceOf = (name: keyof typeof PLANS, end: 'root' | 'tip') =>
  faceMarks(planned(PLANS[name]).plan, end, ROOM, 1);

test('block, place of the core and the wire are drawn at their scale', () => {
  const { plan } = planned(PLANS['tapered and swept']);
  const marks = faceOf('tapered and swept', 'root');
  const block = marks.find((of) => of.kind === 'line' && of.type === 'long-dash-double-dot')!;
  expect(boxOfMark(block)).toMatchObject({ width: 260, height: 60 });
  const wire = marks.find((of) => of.kind === 'line' && of.ink === 'wire')!;
  // Out of the block by the clearance.
  const beyond = boxOfMark(wire).x + boxOfMark(wire).width - boxOfMark(block).x - 260;
  expect(beyond).toBeCloseTo(plan.plan.cut.clearanceMm, 6);
  const [place] = plan.fit!.places;
  expect(wordsOf(marks)).toContain(place!.xMm.toFixed(1));
  expect(wordsOf(marks)).toContain(place!.yMm.toFixed(1));
  expect(faultsOf({ widthMm: 420, heightMm: 297, frame: ROOM, marks })).toEqual([]);
});

test('a pair is two cores, the second with its other end', () => {
  const foam = faceOf('pair in two passes', 'root').filter((of) => of.kind === 'area' && of.ink === 'foam');
  const [first, second] = foam.map((of) => boxOfMark(of).width);
  expect(foam).toHaveLength(2);
  expect(second).toBeLessThan(first!);
});

test('without a block the section stands alone with its chord', () => {
  const words = wordsOf(faceOf('ribs alone', 'tip'));
  expect(words).toContain('Tip, sheeting off 1 : 1');
  expect(words).toContain('160.0');
  const box = faceExtent(planned(PLANS['ribs alone']).plan, 'root');
  expect(box.maxX - box.minX).toBeCloseTo(220, 1);
});

test('each feature has its number above the face', () => {
  const words = wordsOf(faceMarks(planned(PLANS['chord of 1200 mm']).plan, 'tip', ROOM, 1 / 5));
  for (const number of ['1', '2', '3']) expect(words).toContain(number);
});
