import { expect, test } from 'vitest';
import { areaOf, boxOf, polylineOf } from '#geometry/cutting/arrays.ts';
import { type CoreEnd } from '#geometry/cutting/core.ts';
import { entryOf, slotAt, stripAt, tubeAt, verticalCut } from '#geometry/cutting/feature-ends.ts';
import { type OffsetLine } from '#geometry/cutting/offset.ts';
import { SLOT, TUBE } from './plans.ts';

/** A bar of 100 by 20 mm, moved outward by so much. */
function bar(by: number): OffsetLine {
  const line = polylineOf([
    { x: 100 + by, y: 10 + by },
    { x: -by, y: 10 + by },
    { x: -by, y: -10 - by },
    { x: 100 + by, y: -10 - by },
  ]);
  const none = new Float64Array(4);
  return { ...line, distance: none, nx: none, ny: none, collapsed: new Uint8Array(4), tail: null };
}
const END: CoreEnd = { core: bar(0), path: bar(0.5), halfKerfMm: 0.5 };
const cut = <T>(cutout: T | string): T => {
  if (typeof cutout === 'string') throw new Error(cutout);
  return cutout as T;
};

test('an upright meets the outline at its lowest and highest point, or not at all', () => {
  expect(verticalCut(END.core, 30)).toEqual({ low: -10, high: 10 });
  expect(verticalCut(END.core, 101)).toBeNull();
});

test('a slot of 8 by 6 mm from above: its outline, the wire half a kerf inside, the web below', () => {
  const slot = cut(slotAt(END, 'upper', 40, 8, 6));
  expect(boxOf(slot.outline)).toEqual({ minX: 36, maxX: 44, minY: 4, maxY: 10 });
  expect(areaOf(slot.outline)).toBe(48);
  expect(slot.wire).toEqual([
    { x: 43.5, y: 10.5 },
    { x: 43.5, y: 4.5 },
    { x: 36.5, y: 4.5 },
    { x: 36.5, y: 10.5 },
  ]);
  expect(slot.webMm).toBe(14);
  const below = cut(slotAt(END, 'lower', 40, 8, 6));
  expect(boxOf(below.outline)).toEqual({ minX: 36, maxX: 44, minY: -10, maxY: -4 });
  expect(areaOf(below.outline)).toBe(48);
});

test('a slot outside, narrower than the kerf, or with sides lower than half of it is no slot', () => {
  expect(slotAt(END, 'upper', 97, 8, 6)).toBe('outside');
  expect(slotAt(END, 'upper', 40, 0.9, 6)).toBe('narrow');
  expect(slotAt(END, 'upper', 40, 8, 0.4)).toBe('shallow');
  expect(cut(slotAt(END, 'upper', 40, 8, 25)).webMm).toBe(-5);
});

test('a strip goes through, the wire half a kerf inside both its sides', () => {
  const strip = cut(stripAt(END, 40, 3));
  expect(areaOf(strip.outline)).toBe(60);
  expect(strip.wire.map(({ x, y }) => [x, y])).toEqual([
    [41, 10.5],
    [41, -10.5],
    [39, -10.5],
    [39, 10.5],
  ]);
  expect(strip.mouths.map(({ surface }) => surface)).toEqual(['upper', 'lower']);
  expect(stripAt(END, 40, 0.5)).toBe('narrow');
  expect(stripAt(END, 99, 3)).toBe('outside');
});

test('a straight tube is a circle, the wire on one half a kerf smaller, entered from its surface', () => {
  const tube = cut(tubeAt(END, { x: 50, y: 1, slopeX: 0, slopeY: 0 }, 'lower', 6));
  expect(areaOf(tube.outline) / (Math.PI * 9)).toBeCloseTo(1, 2);
  for (const { x, y } of tube.wire) expect(Math.hypot(x - 50, y - 1)).toBeCloseTo(2.5, 12);
  expect(tube.wire[0]).toEqual({ x: expect.closeTo(50, 12), y: expect.closeTo(-1.5, 12) });
  expect(tube.webMm).toBeCloseTo(6, 1);
  expect(tube.mouths[0]).toMatchObject({ surface: 'lower', edges: [{ y: -10 }, { y: -10 }] });
  expect(tube.mouths[0]!.edges[1].x - tube.mouths[0]!.edges[0].x).toBeCloseTo(1, 12);
  // The entry slit takes the wall beside it away.
  expect(tube.walls.filter((of) => of === null).length).toBeGreaterThan(0);
  expect(tubeAt(END, { x: 50, y: 9, slopeX: 0, slopeY: 0 }, 'lower', 6)).toBe('outside');
  expect(tubeAt(END, { x: 50, y: 0, slopeX: 0, slopeY: 0 }, 'lower', 1)).toBe('narrow');
});

test('a tube that leans by 3 in 4 is longer by 5/4 along its lean', () => {
  const tube = cut(tubeAt(END, { x: 50, y: 0, slopeX: 0.75, slopeY: 0 }, 'upper', 8));
  const box = boxOf(tube.outline);
  expect(box.maxX - box.minX).toBeCloseTo(10, 1);
  expect(box.maxY - box.minY).toBeCloseTo(8, 1);
});

test('the wire enters a feature from its own surface, a hinge from the other one', () => {
  expect(entryOf(SLOT)).toBe('upper');
  expect(entryOf(TUBE)).toBe('lower');
  expect(entryOf({ kind: 'strip', name: '', rootStation: 0.3, tipStation: 0.3, widthMm: 3 })).toBe('upper');
  const hinge = {
    kind: 'hinge',
    name: '',
    rootStation: 0.7,
    tipStation: 0.7,
    bevelDeg: 30,
    webMm: 1,
  } as const;
  expect(entryOf({ ...hinge, hingeSurface: 'upper' })).toBe('lower');
  expect(entryOf({ ...hinge, hingeSurface: 'lower' })).toBe('upper');
});
