import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { orderLoop } from '#geometry/imports/section-loop.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4, naca4Shapes } from '#tests/geometry/shapes/samples.ts';
import { OPEN, SHARP, largestShift, numbered, pointsOf, refusalOf } from './files.ts';

const sharp = numbered(SHARP).slice(0, -1);
const open = numbered(OPEN);
const lists = (points: readonly { x: number; y: number }[]) => ({
  x: points.map(({ x }) => x),
  y: points.map(({ y }) => y),
});
const from = <T>(list: readonly T[], start: number) => [...list.slice(start), ...list.slice(0, start)];

describe('an outline in order', () => {
  test('wherever it begins and whichever way it runs', () => {
    for (let start = 0; start < sharp.length; start++) {
      for (const points of [from(sharp, start), from(sharp, start).toReversed()]) {
        const { points: ordered, sharp: isSharp, mirrored } = orderLoop(points);
        expect(largestShift(lists(ordered), SHARP)).toBe(0);
        expect([isSharp, mirrored]).toEqual([true, false]);
      }
      const blunt = orderLoop(from(open, start));
      expect(largestShift(lists(blunt.points), OPEN)).toBe(0);
      expect(blunt.sharp).toBe(false);
    }
    expect(orderLoop(sharp.toReversed()).reversed).toBe(true);
  });

  test('turned by up to 60°, the trailing edge is still the thin end', () => {
    for (const angle of [-1, -0.3, 0.2, 1]) {
      const [c, s] = [Math.cos(angle), Math.sin(angle)];
      const turned = sharp.map(({ x, y, line }) => ({ x: c * x - s * y, y: s * x + c * y, line }));
      expect(orderLoop(turned).points[0]!.line).toBe(1);
    }
  });

  test('a nose on the right is mirrored, not turned upside down', () => {
    for (const points of [sharp, open]) {
      const { points: ordered, mirrored } = orderLoop(points.map(({ x, y, line }) => ({ x: -x, y, line })));
      expect(mirrored).toBe(true);
      expect(largestShift(lists(ordered), points === sharp ? SHARP : OPEN)).toBe(0);
    }
  });

  test('points on the trailing-edge face are left out', () => {
    const { points, facePoints } = orderLoop([...open, { x: 1, y: 0, line: 99 }]);
    expect(facePoints).toBe(1);
    expect(largestShift(lists(points), OPEN)).toBe(0);
  });

  test('a thick blunt edge is found, an ellipse begins at its right end', () => {
    const thick = open.map((point, i) => ({ ...point, y: point.y + (i < 20 ? 1 : -1) * 0.02 * point.x }));
    const { points, sharp: isSharp } = orderLoop(thick);
    expect([isSharp, points[0]!.line, points.at(-1)!.line]).toEqual([false, 1, open.length]);
    const ellipse = Array.from({ length: 60 }, (_, i) => ({
      x: Math.cos((i * Math.PI) / 30),
      y: 0.2 * Math.sin((i * Math.PI) / 30),
      line: i + 1,
    }));
    expect(orderLoop(ellipse).points[0]!.line).toBe(1);
  });
});

describe('the trailing edge of any section', () => {
  const ordered = (points: readonly { x: number; y: number }[], list: boolean) => {
    const found = orderLoop(numbered(points), list);
    return found.points[0]!.line;
  };

  test('an oblique face is found by the ends of the list', () => {
    const shape = { ...naca4('0018', 'open'), maxCamber: 0.1, maxCamberPosition: 0.7 };
    const points = pointsOf(outlineOf(shape), 30);
    for (const way of [points, points.toReversed()]) {
      expect(largestShift(lists(orderLoop(numbered(way), true).points), points)).toBe(0);
    }
    const { sharp: isSharp } = orderLoop(
      numbered(points.toReversed()).map((one) => ({ ...one, x: -one.x })),
      true,
    );
    expect(isSharp).toBe(false);
  });

  test('is where a list begins; in a drawing it is found by its shape, mirrored as well', () => {
    fc.assert(
      fc.property(naca4Shapes, (shape) => {
        fc.pre(shape.maxThickness < 0.3 && shape.maxCamber < 0.09);
        const points = pointsOf(outlineOf(shape), 30);
        const once = shape.trailingEdge === 'closed' ? points.slice(0, -1) : points;
        expect(ordered(once, true)).toBe(1);
        expect(ordered(once, false)).toBe(1);
        expect(ordered(once.map(({ x, y }) => ({ x: -x, y })).reverse(), true)).toBeGreaterThanOrEqual(
          once.length - 1,
        );
      }),
      { numRuns: 40 },
    );
  });
});

describe('what is no section', () => {
  test('points on a line', () => {
    const line = Array.from({ length: 20 }, (_, i) => ({ x: i, y: 2 * i, line: i + 1 }));
    expect(refusalOf(() => orderLoop(line)).message).toContain('they enclose no section');
    expect(refusalOf(() => orderLoop(line.map((point) => ({ ...point, x: 0, y: 0 })))).code).toBe(
      'not-a-section',
    );
  });

  test('a circle', () => {
    const circle = Array.from({ length: 40 }, (_, i) => ({
      x: Math.cos(i / 6.4),
      y: Math.sin(i / 6.4),
      line: i,
    }));
    expect(refusalOf(() => orderLoop(circle)).message).toMatch(/% as thick as long; a section may have 60 %/);
  });

  test('an outline that crosses itself, with the lines of both sides', () => {
    const crossed = sharp.map((point, i) => (i > 4 && i < 8 ? { ...point, y: -0.2 } : point));
    const refusal = refusalOf(() => orderLoop(crossed));
    expect(refusal.code).toBe('crossing');
    expect(refusal.message).toMatch(
      /^The outline crosses or touches itself: behind line \d+ and behind line \d+\.$/,
    );
    expect(refusal.line).toBeGreaterThanOrEqual(4);
  });
});
