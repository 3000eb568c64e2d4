import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Point } from '#geometry/point.ts';
import { type Naca4Shape, naca4Outline } from '#geometry/shapes/naca4.ts';
import { crossesItself } from '#geometry/shapes/self-crossing.ts';

const turn = (a: Point, b: Point, c: Point) => (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x);

/** Every segment against every other. */
function anyPairCrosses(points: readonly Point[]): boolean {
  const segments = points.slice(1).map((b, i) => [points[i]!, b] as const);
  return segments.some(([a, b], i) =>
    segments
      .slice(i + 2)
      .some(([c, d]) => turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0),
  );
}

describe('a polyline against itself', () => {
  test('a loop crosses, a zigzag and a closed square do not', () => {
    const of = (...pairs: [number, number][]) => pairs.map(([x, y]) => ({ x, y }));
    expect(crossesItself(of([0, 0], [2, 2], [2, 0], [0, 2]))).toBe(true);
    expect(crossesItself(of([0, 0], [1, 3], [2, 0], [3, 3], [4, 0]))).toBe(false);
    expect(crossesItself(of([0, 0], [1, 0], [1, 1], [0, 1], [0, 0]))).toBe(false);
    expect(crossesItself(of([0, 0]))).toBe(false);
    expect(crossesItself([])).toBe(false);
  });

  test('finds what comparing every pair finds, upright and doubled segments included', () => {
    const whole = fc.integer({ min: 0, max: 7 });
    const point = fc.record({ x: whole, y: whole });
    fc.assert(
      fc.property(fc.array(point, { maxLength: 9 }), (points) => {
        expect(crossesItself(points)).toBe(anyPairCrosses(points));
      }),
      { numRuns: 2000 },
    );
  });

  test('finds it in strongly bent outlines too', () => {
    const outcomes = new Set<boolean>();
    for (const maxCamber of [0.06, 0.12, 0.3]) {
      for (const maxCamberPosition of [0.1, 0.12, 0.2, 0.8, 0.88, 0.9]) {
        for (const maxThickness of [0.1, 0.2, 0.3, 0.4, 0.8]) {
          const shape: Naca4Shape = {
            kind: 'naca4',
            maxCamber,
            maxCamberPosition,
            maxThickness,
            trailingEdge: 'open',
          };
          const { upper, lower } = naca4Outline(shape);
          const along = Array.from({ length: 90 }, (_, i) => i / 89);
          const points = [
            ...[...along].reverse().map((t) => upper.at(t)),
            ...along.slice(1).map((t) => lower.at(t)),
          ];
          expect(crossesItself(points)).toBe(anyPairCrosses(points));
          outcomes.add(crossesItself(points));
        }
      }
    }
    expect(outcomes.size).toBe(2);
  });
});
