import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { arcDistance, arcExtremes, arcHeight, biarc, type Arc } from '#geometry/contour/biarc.ts';

const QUARTER = Math.tan(Math.PI / 8);

describe('a quarter circle of radius 2 about the origin', () => {
  const arc: Arc = { a: { x: 2, y: 0 }, b: { x: 0, y: 2 }, bulge: QUARTER };

  test('has its height above the chord', () => {
    expect(arcHeight(arc)).toBeCloseTo(2 - Math.SQRT2, 14);
  });

  test.each([
    [1.9, Math.PI / 4, 0.1],
    [2.25, Math.PI / 5, 0.25],
    [2, Math.PI / 3, 0],
  ])('is as far from the point at radius %d and angle %d as the radii differ', (radius, angle, distance) => {
    expect(arcDistance({ x: radius * Math.cos(angle), y: radius * Math.sin(angle) }, arc)).toBeCloseTo(
      distance,
      14,
    );
  });

  test('is measured to its end beyond its end', () => {
    expect(arcDistance({ x: 2.5, y: -1 }, arc)).toBeCloseTo(Math.hypot(0.5, 1), 14);
  });

  test('has no extreme point between its ends, and one when it is turned', () => {
    expect(arcExtremes(arc).filter(({ x, y }) => Math.min(x, y) > 1e-9)).toEqual([]);
    const turned: Arc = {
      a: { x: Math.SQRT2, y: Math.SQRT2 },
      b: { x: -Math.SQRT2, y: Math.SQRT2 },
      bulge: QUARTER,
    };
    const extremes = arcExtremes(turned);
    expect(extremes).toHaveLength(1);
    expect(extremes[0]?.y).toBeCloseTo(2, 14);
  });
});

test('a very flat arc is measured without loss of digits', () => {
  const arc: Arc = { a: { x: 0, y: 0 }, b: { x: 1, y: 0 }, bulge: 2e-9 };
  expect(arcDistance({ x: 0.5, y: 0 }, arc)).toBeCloseTo(1e-9, 18);
  expect(arcDistance({ x: 0.5, y: 1e-9 }, arc)).toBeCloseTo(2e-9, 18);
});

describe('biarc', () => {
  const direction = (angle: number) => ({ x: Math.cos(angle), y: Math.sin(angle) });

  test('gives a circle back', () => {
    const circle = (angle: number) => ({ x: 3 * Math.cos(angle), y: 3 * Math.sin(angle) });
    const pair = biarc(circle, 0.2, 1.4, direction(0.2 + Math.PI / 2), direction(1.4 + Math.PI / 2))!;
    for (let i = 0; i <= 20; i += 1) {
      const angle = 0.2 + (1.2 * i) / 20;
      expect(arcDistance(circle(angle), angle <= pair.joint ? pair.first : pair.second)).toBeLessThan(1e-12);
    }
  });

  test('meets smoothly, on the curve, with the tangents of the curve at its ends', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -0.6, max: 0.6, noNaN: true }),
        fc.double({ min: -0.4, max: 0.4, noNaN: true }),
        (bend, twist) => {
          const curve = (x: number) => ({ x, y: bend * x * x + twist * x * x * x });
          const slope = (x: number) => ({ x: 1, y: 2 * bend * x + 3 * twist * x * x });
          const pair = biarc(curve, 0, 0.5, slope(0), slope(0.5));
          expect(pair).not.toBeNull();
          const { first, second, joint } = pair!;
          expect(first.a).toEqual(curve(0));
          expect(first.b).toEqual(curve(joint));
          expect(second.a).toEqual(first.b);
          expect(second.b).toEqual(curve(0.5));
          // The tangent at an end of an arc is its chord turned by twice the arc tangent of the bulge.
          const headings = ({ a, b, bulge }: Arc) => {
            const chord = Math.atan2(b.y - a.y, b.x - a.x);
            return [chord - 2 * Math.atan(bulge), chord + 2 * Math.atan(bulge)] as const;
          };
          const angle = ({ x, y }: { x: number; y: number }) => Math.atan2(y, x);
          expect(headings(first)[0]).toBeCloseTo(angle(slope(0)), 10);
          expect(headings(second)[1]).toBeCloseTo(angle(slope(0.5)), 10);
          expect(Math.abs(headings(first)[1] - headings(second)[0])).toBeLessThanOrEqual(1.001e-3);
        },
      ),
    );
  });

  test('is refused where an arc would turn by more than a quarter circle', () => {
    const circle = (angle: number) => ({ x: Math.cos(angle), y: Math.sin(angle) });
    expect(biarc(circle, 0, 4, direction(Math.PI / 2), direction(4 + Math.PI / 2))).toBeNull();
  });
});
