import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { crossingSides } from '#geometry/shapes/simple-polygon.ts';

type Polygon = readonly (readonly [number, number])[];

const found = (polygon: Polygon) =>
  crossingSides(
    polygon.map(([x]) => x),
    polygon.map(([, y]) => y),
  );

const turn = (a: readonly number[], b: readonly number[], c: readonly number[]) =>
  Math.sign((b[0]! - a[0]!) * (c[1]! - a[1]!) - (b[1]! - a[1]!) * (c[0]! - a[0]!));

const between = (p: readonly number[], a: readonly number[], b: readonly number[]) =>
  turn(a, b, p) === 0 && (p[0]! - a[0]!) * (p[0]! - b[0]!) + (p[1]! - a[1]!) * (p[1]! - b[1]!) <= 0;

/** Every pair of sides, one by one. */
function crossesPlainly(polygon: Polygon): boolean {
  const n = polygon.length;
  for (let i = 0; i < n; i++) {
    for (let k = i + 1; k < n; k++) {
      const [a, b, c, d] = [polygon[i]!, polygon[(i + 1) % n]!, polygon[k]!, polygon[(k + 1) % n]!];
      if (k === i + 1) {
        if (between(d, a, b) || between(a, c, d)) return true;
      } else if (i === 0 && k === n - 1) {
        if (between(c, a, b) || between(b, c, d)) return true;
      } else {
        if (turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0) return true;
        if (between(a, c, d) || between(b, c, d) || between(c, a, b) || between(d, a, b)) return true;
      }
    }
  }
  return false;
}

const distinct = (polygon: Polygon) =>
  polygon.every(([x, y], i) => {
    const [nx, ny] = polygon[(i + 1) % polygon.length]!;
    return x !== nx || y !== ny;
  });

describe('sides of a polygon that cross', () => {
  test.each<readonly [string, Polygon, boolean]>([
    ['a square', [[0, 0], [1, 0], [1, 1], [0, 1]], false],
    ['a bow tie', [[0, 0], [1, 1], [1, 0], [0, 1]], true],
    ['a vertex on another side', [[0, 0], [4, 0], [4, 2], [2, 0], [0, 2]], true],
    ['a side that runs back', [[0, 0], [4, 0], [2, 0], [2, 3]], true],
    ['a vertex met twice', [[0, 0], [2, 0], [1, 1], [2, 2], [0, 2], [1, 1]], true],
    ['two upright sides at one x', [[0, 0], [1, 0], [1, 1], [2, 1], [2, 2], [0, 2]], false],
    ['upright sides that overlap', [[0, 0], [1, 0], [1, 3], [2, 3], [2, 1], [1, 1], [1, 2], [0, 2]], true],
  ])('%s', (_, polygon, crosses) => {
    expect(found(polygon) !== null).toBe(crosses);
  }); // prettier-ignore

  test('the pair that is named does meet', () => {
    expect(found([[0, 0], [4, 0], [4, 4], [2, -1]])?.toSorted()).toEqual([0, 2]); // prettier-ignore
  });

  const polygons = (coordinate: fc.Arbitrary<number>) =>
    fc.array(fc.tuple(coordinate, coordinate), { minLength: 4, maxLength: 14 }).filter(distinct);

  test.each([
    ['on a coarse grid, where sides touch and overlap', polygons(fc.integer({ min: 0, max: 6 }))],
    ['anywhere', polygons(fc.integer({ min: 0, max: 1e6 }).map((value) => value / 1e6))],
  ])('the sweep agrees with the plain search: %s', (_, arbitrary) => {
    fc.assert(
      fc.property(arbitrary, (polygon) => {
        expect(found(polygon) !== null).toBe(crossesPlainly(polygon));
      }),
      { numRuns: 700 },
    );
  });

  test('star-shaped polygons are simple', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.2, max: 1, noNaN: true }), { minLength: 3, maxLength: 60 }),
        (r) => {
          const polygon = r.map((radius, i): [number, number] => {
            const angle = (2 * Math.PI * i) / r.length;
            return [radius * Math.cos(angle), radius * Math.sin(angle)];
          });
          expect(found(polygon)).toBe(null);
        },
      ),
      { numRuns: 60 },
    );
  });
});
