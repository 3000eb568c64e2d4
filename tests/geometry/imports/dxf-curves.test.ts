import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { arcPoints, bulgeArc, nurbsPoint, nurbsPoints } from '#geometry/imports/dxf-curves.ts';

const near = (a: { x: number; y: number }, x: number, y: number) => Math.hypot(a.x - x, a.y - y);

describe('arcs', () => {
  test('points lie on the circle, chords within the tolerance, ends included', () => {
    const points = arcPoints({ centre: { x: 1, y: 2 }, radius: 5, start: 0, sweep: Math.PI / 2 }, 1e-3);
    expect(near(points[0]!, 6, 2)).toBeLessThan(1e-14);
    expect(near(points.at(-1)!, 1, 7)).toBeLessThan(1e-14);
    points.forEach((point, i) => {
      expect(Math.abs(near(point, 1, 2) - 5)).toBeLessThan(1e-14);
      const next = points[i + 1] ?? point;
      expect(5 - near({ x: (point.x + next.x) / 2, y: (point.y + next.y) / 2 }, 1, 2)).toBeLessThan(1e-3);
    });
  });

  test('steps are few on tiny arcs and bounded on huge ones', () => {
    expect(arcPoints({ centre: { x: 0, y: 0 }, radius: 1e-9, start: 0, sweep: 1 }, 1).length).toBeLessThan(
      10,
    );
    expect(arcPoints({ centre: { x: 0, y: 0 }, radius: 1e9, start: 0, sweep: 6 }, 1e-9).length).toBe(721);
  });

  test('a bulge of 1 is a half circle to the right of the way, −1 to the left', () => {
    const [a, b] = [{ x: 0, y: 0 }, { x: 2, y: 0 }]; // prettier-ignore
    const middle = (bulge: number) => arcPoints(bulgeArc(a, b, bulge), 1).at(9)!;
    const half = arcPoints(bulgeArc(a, b, 1), 1);
    expect(half).toHaveLength(19);
    expect(near(middle(1), 1, -1)).toBeLessThan(1e-14);
    expect(near(middle(-1), 1, 1)).toBeLessThan(1e-14);
  });

  test('any bulge: both ends are met and the height is bulge times half the chord', () => {
    const bulge = fc.double({ min: 0.01, max: 20, noNaN: true });
    fc.assert(
      fc.property(bulge, fc.boolean(), (size, left) => {
        const value = left ? -size : size;
        const arc = bulgeArc({ x: 1, y: 1 }, { x: 4, y: 5 }, value);
        const points = arcPoints({ ...arc, sweep: arc.sweep / 2 }, 1);
        const [start, top] = [points[0]!, points.at(-1)!];
        expect(near(start, 1, 1)).toBeLessThan(1e-9);
        // To the right of the way from (1, 1) to (4, 5): (4, −3)/5.
        expect(near(top, 2.5 + value * 2.5 * 0.8, 3 - value * 2.5 * 0.6)).toBeLessThan(1e-9);
      }),
      { numRuns: 100 },
    );
  });
});

/** A quarter circle as a rational quadratic. */
const QUARTER = {
  degree: 2,
  knots: [0, 0, 0, 1, 1, 1],
  control: [{ x: 1, y: 0 }, { x: 1, y: 1 }, { x: 0, y: 1 }], // prettier-ignore
  weights: [1, Math.SQRT1_2, 1],
};

describe('B-splines', () => {
  test('a rational quadratic is a circle exactly', () => {
    for (const u of [0, 0.2, 0.5, 0.9, 1]) {
      expect(Math.abs(near(nurbsPoint(QUARTER, 2, u), 0, 0) - 1)).toBeLessThan(1e-15);
    }
    const points = nurbsPoints(QUARTER, 1e-4, 1000);
    points.forEach((point, i) => {
      const next = points[i + 1] ?? point;
      expect(1 - near({ x: (point.x + next.x) / 2, y: (point.y + next.y) / 2 }, 0, 0)).toBeLessThan(1.1e-4);
    });
    expect([points[0], points.at(-1)]).toEqual([QUARTER.control[0], QUARTER.control[2]]);
  });

  test('uniform cubic: the point at a knot is (1, 4, 1)/6 of the control points', () => {
    const control = [0, 1, 5, 2, 3].map((y, x) => ({ x, y }));
    const curve = { degree: 3, knots: [0, 1, 2, 3, 4, 5, 6, 7, 8], control, weights: control.map(() => 1) };
    expect(near(nurbsPoint(curve, 3, 3), 1, (0 + 4 * 1 + 5) / 6)).toBeLessThan(1e-15);
    expect(near(nurbsPoint(curve, 4, 4), 2, (1 + 4 * 5 + 2) / 6)).toBeLessThan(1e-15);
  });

  test('empty spans are passed over and the number of points is bounded', () => {
    const doubled = { ...QUARTER, knots: [0, 0, 0, 0.5, 0.5, 1, 1, 1], control: [...QUARTER.control, { x: -1, y: 1 }, { x: -1, y: 0 }], weights: [1, 1, 1, 1, 1] }; // prettier-ignore
    expect(nurbsPoints(doubled, 1e-3, 1000).at(-1)).toEqual({ x: -1, y: 0 });
    expect(nurbsPoints(QUARTER, 1e-12, 50).length).toBeLessThan(60);
  });
});
