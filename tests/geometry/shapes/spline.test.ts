import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { splineThrough } from '#geometry/shapes/spline.ts';

const circle = (count: number) => {
  const angles = Array.from({ length: count }, (_, i) => (i * Math.PI) / (count - 1));
  return { x: angles.map(Math.cos), y: angles.map(Math.sin) };
};

describe('the cubic spline through points', () => {
  test('passes through every point, and s is the length of the polygon', () => {
    const { x, y } = circle(9);
    const spline = splineThrough(x, y);
    x.forEach((value, i) => {
      const point = spline.at(spline.knots[i]!);
      expect([point.x, point.y]).toEqual([value, y[i]]);
    });
    expect(Math.abs(spline.length - 16 * Math.sin(Math.PI / 16))).toBeLessThan(1e-14);
  });

  test('errors fall as the fourth power of the spacing inside, and the third at the ends', () => {
    const error = (count: number, from: number, to: number) => {
      const { x, y } = circle(count);
      const spline = splineThrough(x, y);
      let largest = 0;
      for (let k = 0; k <= 500; k++) {
        const { x: px, y: py } = spline.at(spline.length * (from + ((to - from) * k) / 500));
        largest = Math.max(largest, Math.abs(Math.hypot(px, py) - 1));
      }
      return largest;
    };
    expect(error(21, 0.3, 0.7) / error(41, 0.3, 0.7)).toBeGreaterThan(14);
    expect(error(21, 0, 1) / error(41, 0, 1)).toBeGreaterThan(7);
    expect(error(41, 0, 1)).toBeLessThan(4e-5);
  });

  test('a straight line stays one, with slope of unit length and no bend', () => {
    const spline = splineThrough([0, 0.3, 0.9, 3], [0, 0.4, 1.2, 4]);
    for (const s of [0, 0.2, 1, 3.3, 5]) {
      const { x, y, dx, dy, ddx, ddy } = spline.at(s);
      expect(Math.hypot(x - 0.6 * s, y - 0.8 * s)).toBeLessThan(1e-14);
      expect(Math.hypot(dx - 0.6, dy - 0.8)).toBeLessThan(1e-14);
      expect(Math.hypot(ddx, ddy)).toBeLessThan(1e-13);
    }
  });

  test('first and second derivatives join at the knots and are those of the curve', () => {
    const points = fc.array(
      fc.record({
        step: fc.double({ min: 0.05, max: 1, noNaN: true }),
        y: fc.double({ min: -1, max: 1, noNaN: true }),
      }),
      { minLength: 3, maxLength: 12 },
    );
    fc.assert(
      fc.property(points, (list) => {
        let x = 0;
        const xs = list.map(({ step }) => (x += step));
        const spline = splineThrough(
          xs,
          list.map(({ y }) => y),
        );
        for (const knot of spline.knots.slice(1, -1)) {
          const [a, b] = [spline.at(knot - 1e-9), spline.at(knot)];
          const scale = 1 + Math.hypot(b.ddx, b.ddy);
          expect(Math.hypot(a.dx - b.dx, a.dy - b.dy)).toBeLessThan(1e-7 * scale);
          expect(Math.hypot(a.ddx - b.ddx, a.ddy - b.ddy)).toBeLessThan(1e-5 * scale);
          const h = 1e-5;
          const [m, n] = [spline.at(knot - h), spline.at(knot + h)];
          expect(Math.hypot((n.x - m.x) / (2 * h) - b.dx, (n.y - m.y) / (2 * h) - b.dy)).toBeLessThan(
            1e-4 * scale,
          );
        }
      }),
      { numRuns: 30 },
    );
  });

  test('beyond an end the end is given', () => {
    const spline = splineThrough([0, 1, 2], [0, 1, 0]);
    expect(spline.at(-1)).toEqual(spline.at(0));
    expect(spline.at(99)).toEqual(spline.at(spline.length));
  });
});
