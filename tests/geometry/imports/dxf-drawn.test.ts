import { describe, expect, test } from 'vitest';
import { definingPoints, drawnPoints } from '#geometry/imports/dxf-drawn.ts';
import { readDxf } from '#geometry/imports/dxf-entities.ts';
import { dxf, refusalOf } from './files.ts';

const entity = (...groups: readonly (string | number)[]) => readDxf(dxf([groups])).entities[0]!;
const drawn = (...groups: readonly (string | number)[]) => drawnPoints(entity(...groups), 10);
const ends = (...groups: readonly (string | number)[]) => {
  const { points } = drawn(...groups);
  return [points[0]!, points.at(-1)!].map(({ x, y }) =>
    [x, y].map((value) => Math.round(1e9 * value) / 1e9 + 0),
  );
};

describe('points along an entity', () => {
  test('a short line has two, a long one is divided', () => {
    expect(drawn(0, 'LINE', 10, 0, 20, 0, 11, 0.6, 21, 0.8)).toEqual({
      points: [{ x: 0, y: 0 }, { x: 0.6, y: 0.8 }], // prettier-ignore
      divided: false,
    });
    const long = drawn(0, 'LINE', 10, 0, 20, 0, 11, 4, 21, 0);
    expect([long.points.length, long.divided, long.points[5]!.x]).toEqual([21, true, 1]);
  });

  test('an arc runs counter-clockwise from its first angle, through 0° as well', () => {
    expect(ends(0, 'ARC', 10, 1, 20, 2, 40, 2, 50, 0, 51, 90)).toEqual([[3, 2], [1, 4]]); // prettier-ignore
    expect(ends(0, 'ARC', 10, 0, 20, 0, 40, 1, 50, 270, 51, 90)).toEqual([[0, -1], [0, 1]]); // prettier-ignore
    expect(drawn(0, 'ARC', 10, 0, 20, 0, 40, 1, 50, 270, 51, 90).points.every(({ x }) => x > -1e-9)).toBe(
      true,
    );
  });

  test('seen from below, an arc and a polyline are mirrored', () => {
    expect(ends(0, 'ARC', 10, 1, 20, 2, 40, 2, 50, 0, 51, 90, 230, -1)).toEqual([[-3, 2], [-1, 4]]); // prettier-ignore
    expect(ends(0, 'LWPOLYLINE', 70, 0, 10, 1, 20, 2, 10, 3, 20, 4, 230, -1)).toEqual([[-1, 2], [-3, 4]]); // prettier-ignore
  });

  test('polylines keep their vertices, closed ones come back, bulges are arcs', () => {
    expect(drawn(0, 'LWPOLYLINE', 70, 1, 10, 0, 20, 0, 10, 5, 20, 0, 10, 5, 20, 5).points).toHaveLength(4);
    const bulged = drawn(0, 'LWPOLYLINE', 70, 0, 10, 0, 20, 0, 42, 1, 10, 2, 20, 0, 10, 2, 20, 5);
    expect(Math.min(...bulged.points.map(({ y }) => y))).toBeLessThan(-0.999);
    expect(bulged.divided).toBe(true);
    const old = entity(0, 'POLYLINE', 70, 0, 0, 'VERTEX', 10, 1, 20, 1, 0, 'VERTEX', 70, 16, 10, 9, 20, 9, 0, 'VERTEX', 10, 2, 20, 1);
    expect(drawnPoints(old, 10).points).toEqual([{ x: 1, y: 1 }, { x: 2, y: 1 }]); // prettier-ignore
  }); // prettier-ignore

  test('splines by control points and through fit points', () => {
    const knots = [0, 0, 0, 1, 1, 1].flatMap((knot) => [40, knot]);
    expect(ends(0, 'SPLINE', 71, 2, ...knots, 10, 0, 20, 0, 10, 1, 20, 2, 10, 2, 20, 0)).toEqual([[0, 0], [2, 0]]); // prettier-ignore
    const fit = drawn(0, 'SPLINE', 71, 3, 11, 0, 21, 0, 11, 1, 21, 1, 11, 2, 21, 0);
    expect(fit.points).toHaveLength(17);
    expect(fit.points[8]).toEqual({ x: 1, y: 1 });
  });

  test('what defines an entity bounds it', () => {
    expect(definingPoints(entity(0, 'ARC', 10, 1, 20, 2, 40, 2, 50, 0, 51, 1))).toEqual([{ x: -1, y: 0 }, { x: 3, y: 4 }]); // prettier-ignore
    expect(definingPoints(entity(0, 'LINE', 10, 1, 20, 2, 11, 3, 21, 4))).toHaveLength(2);
  });
});

test.each([
  ['a line without an end', [0, 'LINE', 10, 0, 20, 0], 'broken-drawing', 'The LINE at line 11 has no two ends.'],
  ['x without y', [0, 'LINE', 10, 0, 20, 0, 11, 1], 'broken-drawing', 'has not as many y as x ordinates'],
  ['an arc without radius', [0, 'ARC', 10, 0, 20, 0, 40, 0], 'broken-drawing', 'has no centre or radius'],
  ['a spline without knots', [0, 'SPLINE', 71, 3, 10, 0, 20, 0], 'broken-drawing', 'do not belong together'],
  ['falling knots', [0, 'SPLINE', 71, 1, 40, 0, 40, 2, 40, 1, 40, 2, 10, 0, 20, 0, 10, 1, 20, 1], 'broken-drawing', 'has falling knots'],
  ['a weight of 0', [0, 'SPLINE', 71, 1, 40, 0, 40, 0, 40, 1, 40, 1, 41, 1, 41, 0, 10, 0, 20, 0, 10, 1, 20, 1], 'broken-drawing', 'has weights'],
  ['degree 12', [0, 'SPLINE', 71, 12, 10, 0, 20, 0], 'broken-drawing', 'is of degree 12; 1 to 11 are read'],
  ['two fit points', [0, 'SPLINE', 11, 0, 21, 0, 11, 1, 21, 0], 'broken-drawing', 'has too few points'],
  ['a tilted plane', [0, 'LWPOLYLINE', 10, 0, 20, 0, 210, 1, 220, 0, 230, 0], 'not-a-section', 'does not lie in the XY plane'],
  ['a line that climbs', [0, 'LINE', 10, 0, 20, 0, 30, 0, 11, 1, 21, 0, 31, 1], 'not-a-section', 'does not lie in the XY plane'],
])('refused: %s', (_, groups, code, message) => {
  const refusal = refusalOf(() => {
    definingPoints(entity(...groups));
    drawn(...groups);
  });
  expect(refusal.code).toBe(code);
  expect(refusal.message).toContain(message);
  expect(refusal.line).toBe(11);
}); // prettier-ignore
