import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { areaProperties, gaussLegendre } from '#geometry/contour/quadrature.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, UNIT, naca4, shapes } from '#tests/geometry/shapes/samples.ts';

/** The slow, plain way: the moments of a polygon of very many points (textbook sums), closed across the trailing edge. */
function polygonProperties(outline: Outline, count: number) {
  const points = [
    ...Array.from({ length: count }, (_, i) => outline.upper.at(1 - i / count)),
    ...Array.from({ length: count + 1 }, (_, i) => outline.lower.at(i / count)),
  ];
  const sums = { area: 0, x: 0, y: 0, xx: 0, yy: 0, xy: 0, perimeter: 0 };
  points.forEach((a, i) => {
    const b = points[(i + 1) % points.length]!;
    const cross = a.x * b.y - b.x * a.y;
    if (i + 1 < points.length) sums.perimeter += Math.hypot(b.x - a.x, b.y - a.y);
    sums.area += cross / 2;
    sums.x += ((a.x + b.x) * cross) / 6;
    sums.y += ((a.y + b.y) * cross) / 6;
    sums.xx += ((a.y * a.y + a.y * b.y + b.y * b.y) * cross) / 12;
    sums.yy += ((a.x * a.x + a.x * b.x + b.x * b.x) * cross) / 12;
    sums.xy += ((a.x * b.y + 2 * a.x * a.y + 2 * b.x * b.y + b.x * a.y) * cross) / 24;
  });
  const [cx, cy] = [sums.x / sums.area, sums.y / sums.area];
  return {
    area: sums.area,
    perimeter: sums.perimeter,
    centroid: { x: cx, y: cy },
    ixx: sums.xx - sums.area * cy * cy,
    iyy: sums.yy - sums.area * cx * cx,
    ixy: sums.xy - sums.area * cx * cy,
  };
}

describe('Gauss–Legendre', () => {
  test('is exact for polynomials up to twice its points less one', () => {
    for (const n of [1, 2, 5, 12]) {
      const { nodes, weights } = gaussLegendre(n);
      for (let power = 0; power < 2 * n; power++) {
        const sum = nodes.reduce((total, x, i) => total + weights[i]! * x ** power, 0);
        expect(Math.abs(sum - (power % 2 === 0 ? 2 / (power + 1) : 0))).toBeLessThan(1e-14);
      }
    }
  });

  test('the rule of two points is ±sqrt(1/3)', () => {
    expect([...gaussLegendre(2).nodes]).toEqual([
      expect.closeTo(-Math.sqrt(1 / 3), 15),
      expect.closeTo(Math.sqrt(1 / 3), 15),
    ]);
  });
});

describe('area properties', () => {
  test('of the unit shape in closed form: area 8/15, centroid 3/7, Iyy and Ixx by beta functions', () => {
    const found = areaProperties(cstOutline(UNIT));
    // 2 ∫ x^k sqrt(x)(1−x) dx = 2 (1/(k+3/2) − 1/(k+5/2));  (2/3) ∫ (sqrt(x)(1−x))³ dx = (2/3) B(5/2, 4) = (2/3)·32/1155
    expect(Math.abs(found.area - 8 / 15)).toBeLessThan(1e-13);
    expect(Math.abs(found.centroid.x - 3 / 7)).toBeLessThan(1e-13);
    expect(Math.abs(found.centroid.y)).toBeLessThan(1e-15);
    expect(Math.abs(found.iyy - (2 * (2 / 7 - 2 / 9) - (8 / 15) * (9 / 49)))).toBeLessThan(1e-13);
    expect(Math.abs(found.ixx - (2 / 3) * (32 / 1155))).toBeLessThan(1e-13);
    expect(Math.abs(found.ixy)).toBeLessThan(1e-15);
  });

  test.each([
    ['a cambered 4-digit section', naca4Outline(naca4('6412', 'open'))],
    ['a thin one', naca4Outline(naca4('4401'))],
    ['a placed free form with a gap', cstOutline(FREE_FORM)],
    ['a free form with a rounded end', cstOutline({ ...FREE_FORM, n2: 0.5 })],
  ])('of %s agree with a polygon of 40,000 points', (_, outline) => {
    const found = areaProperties(outline);
    const plain = polygonProperties(outline, 20_000);
    for (const key of ['area', 'perimeter', 'ixx', 'iyy', 'ixy'] as const) {
      expect(Math.abs(found[key] - plain[key])).toBeLessThan(2e-8);
    }
    expect(Math.hypot(found.centroid.x - plain.centroid.x, found.centroid.y - plain.centroid.y)).toBeLessThan(
      2e-8,
    );
  });

  test('scale with the powers of a placement, and do not change their trace when turned', () => {
    const plain = areaProperties(cstOutline({ ...FREE_FORM, placement: undefined }));
    const scale = 1.3;
    const placed = areaProperties(
      cstOutline({ ...FREE_FORM, placement: { x: 0.2, y: -0.1, rotationDeg: 20, scale } }),
    );
    expect(placed.area).toBeCloseTo(scale ** 2 * plain.area, 12);
    expect(placed.perimeter).toBeCloseTo(scale * plain.perimeter, 12);
    expect(placed.ixx + placed.iyy).toBeCloseTo(scale ** 4 * (plain.ixx + plain.iyy), 12);
    const determinant = ({ ixx, iyy, ixy }: typeof plain) => ixx * iyy - ixy * ixy;
    expect(determinant(placed)).toBeCloseTo(scale ** 8 * determinant(plain), 12);
  });

  test('are finite and sensible for every shape', () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const { area, perimeter, ixx, iyy, ixy, centroid } = areaProperties(outlineOf(shape));
        expect([area, perimeter, ixx, iyy, ixy, centroid.x, centroid.y].every(Number.isFinite)).toBe(true);
        expect(area).toBeGreaterThan(0);
        expect(perimeter).toBeGreaterThan(2);
        expect(ixx * iyy).toBeGreaterThan(ixy * ixy);
      }),
    );
  });
});
