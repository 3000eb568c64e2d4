import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ALIGNMENTS, deviationOf, laidOn } from '#geometry/contour/deviation.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { measuredOutline } from '#geometry/shapes/measured.ts';
import { type CurvePoint, type Outline, type SurfaceCurve } from '#geometry/shapes/outline.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, naca4, shapes } from '#tests/geometry/shapes/samples.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

/** An outline with every point mapped by x' = x₀ + a x − b y, y' = y₀ + b x + a y. */
function moved({ upper, lower, sharp, meanLine }: Outline, x0: number, y0: number, a = 1, b = 0): Outline {
  const turn = (x: number, y: number) => [a * x - b * y, b * x + a * y] as const;
  const curve = (surface: SurfaceCurve): SurfaceCurve => ({
    breaks: surface.breaks,
    at(t) {
      const p = surface.at(t);
      const [x, y] = turn(p.x, p.y);
      return { x: x0 + x, y: y0 + y };
    },
    derivatives(t): CurvePoint {
      const p = surface.derivatives(t);
      const [[x, y], [dx, dy], [ddx, ddy]] = [turn(p.x, p.y), turn(p.dx, p.dy), turn(p.ddx, p.ddy)];
      return { x: x0 + x, y: y0 + y, dx, dy, ddx, ddy };
    },
  });
  return { upper: curve(upper), lower: curve(lower), sharp, meanLine };
}

const size = (first: Outline, second: Outline, alignment: (typeof ALIGNMENTS)[number]) =>
  Math.abs(deviationOf(first, second, alignment, 41).largest.deviation);

describe('deviation of an outline', () => {
  test('from itself it is nothing, however the two are aligned', () => {
    fc.assert(
      fc.property(shapes, fc.constantFrom(...ALIGNMENTS), (shape, alignment) => {
        const outline = outlineOf(shape);
        const { largest, places } = deviationOf(outline, outline, alignment, 41);
        expect(Math.abs(largest.deviation)).toBeLessThan(1e-11);
        expect(places).toHaveLength(81);
      }),
      { numRuns: 40 },
    );
  });

  test('moved, turned and enlarged, it is nothing on the chord; moved alone, on leading edge and quarter chord too', () => {
    const outline = cstOutline(FREE_FORM);
    expect(size(outline, moved(outline, 0.4, -0.2, 1.9, 0.3), 'chord')).toBeLessThan(1e-12);
    for (const alignment of ['leading-edge', 'quarter-chord'] as const) {
      expect(size(outline, moved(outline, 0.4, -0.2), alignment)).toBeLessThan(1e-12);
      expect(size(outline, moved(outline, 0, 0, 1, 0.01), alignment)).toBeGreaterThan(1e-3);
    }
    expect(size(outline, moved(outline, 0, 0.002), 'sheet')).toBeGreaterThan(1e-3);
  });

  test('a small shift is its component along the normal', () => {
    const outline = outlineOf(naca4('2412'));
    const { places } = deviationOf(outline, moved(outline, 3e-5, 1e-4), 'sheet', 61);
    for (const { normal, deviation, station } of places) {
      if (station < 0.001 || station > 0.999) continue;
      expect(Math.abs(deviation - (3e-5 * normal.x + 1e-4 * normal.y))).toBeLessThan(1e-6);
    }
  });

  test('thickness scaled: a symmetric section grows outward by the difference of its half-thickness', () => {
    const [thin, thick] = [outlineOf(naca4('0012')), outlineOf(naca4('0015'))];
    const { largest, largestInside, places } = deviationOf(thin, thick, 'chord');
    expect(largestInside).toBe(null);
    expect(Math.abs(largest.deviation - 0.015)).toBeLessThan(2e-5);
    expect(Math.abs(largest.station - 0.3)).toBeLessThan(0.03);
    const middle = places.filter(({ station }) => station > 0.29 && station < 0.31);
    for (const { deviation } of middle) expect(Math.abs(deviation - 0.015)).toBeLessThan(2e-5);
    const back = deviationOf(thick, thin, 'chord');
    expect([back.largestOutside, back.largest]).toEqual([null, back.largestInside]);
  });

  test('signs turn round when the two change places, sizes stay to second order', () => {
    const small = fc.double({ min: -2e-3, max: 2e-3, noNaN: true });
    fc.assert(
      fc.property(small, small, (a, b) => {
        const other = { ...FREE_FORM, upper: FREE_FORM.upper.map((w, i) => (i === 3 ? w + a : w)) };
        const changed = { ...other, lower: other.lower.map((w, i) => (i === 2 ? w + b : w)) };
        const [p, q] = [cstOutline(FREE_FORM), cstOutline(changed)];
        const [there, back] = [deviationOf(p, q, 'sheet', 31), deviationOf(q, p, 'sheet', 31)];
        there.places.forEach(({ deviation }, i) => {
          expect(Math.abs(deviation + back.places[i]!.deviation)).toBeLessThan(2e-5);
        });
      }),
      { numRuns: 15 },
    );
  });

  test('the largest is named with surface and station, and agrees with dense sampling', () => {
    const [first, second] = [outlineOf(naca4('2412')), outlineOf(naca4('4412'))];
    const { largest, largestOutside, largestInside } = deviationOf(first, second, 'chord', 201);
    // Camber raised by 2 % of chord: the upper surface moves out, the lower in.
    expect([largestOutside!.surface, largestInside!.surface]).toEqual(['upper', 'lower']);
    expect(Math.abs(largestOutside!.deviation)).toBeGreaterThan(0.018);
    const dense = Array.from({ length: 20_001 }, (_, i) => second[largest.surface].at(i / 20_000));
    const across = dense.map(({ x, y }) =>
      Math.abs((x - largest.at.x) * largest.normal.y - (y - largest.at.y) * largest.normal.x),
    );
    const foot = dense[across.indexOf(Math.min(...across))]!;
    const height = (foot.x - largest.at.x) * largest.normal.x + (foot.y - largest.at.y) * largest.normal.y;
    expect(Math.abs(height - largest.deviation)).toBeLessThan(1e-5);
  });

  test('a contour kept as points lies on the curve its points come from', () => {
    const exact = outlineOf(naca4('0012'));
    const points = pointsOf(exact, 80);
    const kept = measuredOutline({
      kind: 'measured',
      x: points.map(({ x }) => x),
      y: points.map(({ y }) => y),
    });
    expect(size(exact, kept, 'chord')).toBeLessThan(2e-6);
  });

  test('any two sections have finite deviations', () => {
    fc.assert(
      fc.property(shapes, shapes, fc.constantFrom(...ALIGNMENTS), (a, b, alignment) => {
        const { places } = deviationOf(outlineOf(a), outlineOf(b), alignment, 21);
        expect(places.every(({ deviation }) => Number.isFinite(deviation) && Math.abs(deviation) < 1)).toBe(
          true,
        );
      }),
      { numRuns: 60 },
    );
  });

  test('places out of range are refused', () => {
    const outline = outlineOf(naca4('0012'));
    for (const count of [4, 1001, 20.5]) {
      expect(() => deviationOf(outline, outline, 'chord', count)).toThrow('between 5 and 1000');
    }
  });
});

test('points are laid where the deviation has them: a moved and turned outline comes back onto itself', () => {
  const first = outlineOf(naca4('2412'));
  const second = moved(first, 0.3, -0.2, 1.1 * Math.cos(0.2), 1.1 * Math.sin(0.2));
  const [nose, edge] = [second.upper.at(0), second.upper.at(1)];
  const [laidNose, laidEdge] = laidOn(first, second, 'chord', [nose, edge]);
  expect(laidNose?.x).toBeCloseTo(first.upper.at(0).x, 12);
  expect(laidEdge?.y).toBeCloseTo(first.upper.at(1).y, 12);
  expect(laidOn(first, second, 'sheet', [edge])).toEqual([edge]);
});
