import { describe, expect, test } from 'vitest';
import { contourPoints } from '#geometry/contour/contour.ts';
import { fitCst } from '#geometry/contour/fitting.ts';
import { measure } from '#geometry/contour/measures.ts';
import { largestChordalError, sampleCosine, sampleToTolerance } from '#geometry/contour/sampling.ts';
import { type CstShape, cstOutline } from '#geometry/shapes/cst.ts';
import {
  MEASURED_LIMITS,
  type MeasuredShape,
  describeMeasured,
  measuredOutline,
  measuredSchema,
} from '#geometry/shapes/measured.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { expectDerivatives, expectFinite } from './curves.ts';
import { naca4 } from './samples.ts';

const SMOOTH: CstShape = {
  kind: 'cst',
  upper: [0.18, 0.2, 0.19, 0.2, 0.21],
  lower: [-0.15, -0.1, -0.12, -0.06, -0.08],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap: 0.003,
};

const pointsOf = (outline: Outline, pointsPerSurface: number): MeasuredShape => {
  const points = contourPoints(sampleCosine(outline, pointsPerSurface));
  if (outline.sharp) points.push(points[0]!);
  return { kind: 'measured', x: points.map(({ x }) => x), y: points.map(({ y }) => y) };
};

const smooth = pointsOf(cstOutline(SMOOTH), 80);

describe('the outline of a measured contour', () => {
  test('passes through every point and is parted at the origin', () => {
    const outline = measuredOutline(smooth);
    expect(outline.upper.at(0)).toEqual({ x: 0, y: 0 });
    expect(outline.lower.at(0)).toEqual({ x: 0, y: 0 });
    expect(outline.upper.at(1)).toEqual({ x: smooth.x[0], y: smooth.y[0] });
    expect(outline.lower.at(1)).toEqual({ x: smooth.x.at(-1), y: smooth.y.at(-1) });
    expect(outline.sharp).toBe(false);
    const chain = sampleCosine(outline, 500);
    smooth.x.forEach((x, i) => {
      const nearest = Math.min(...chain.x.map((cx, k) => Math.hypot(cx - x, chain.y[k]! - smooth.y[i]!)));
      expect(nearest).toBeLessThan(2e-3);
    });
  });

  test('derivatives by t are those of the curve, and finite everywhere', () => {
    const { upper, lower } = measuredOutline(smooth);
    for (const surface of [upper, lower]) {
      expectDerivatives(surface, [0.011, 0.1, 0.3, 0.52, 0.8, 0.97], 2e-3);
      expectFinite(surface);
    }
  });

  test('its knots are the t of its points, ascending from the nose', () => {
    const { upper, lower } = measuredOutline(smooth);
    expect(upper.knots).toHaveLength(78);
    expect(lower.knots).toHaveLength(78);
    upper.knots!.forEach((t, i) => {
      expect(Math.hypot(upper.at(t).x - smooth.x[78 - i]!, upper.at(t).y - smooth.y[78 - i]!)).toBeLessThan(
        1e-12,
      );
      expect(t).toBeGreaterThan(upper.knots![i - 1] ?? 0);
    });
  });

  test('curvature does not jump at a point', () => {
    const outline = measuredOutline(pointsOf(outlineOf(naca4('0012')), 20));
    const steps = Array.from({ length: 4001 }, (_, i) => outline.upper.derivatives(0.05 + (0.9 * i) / 4000));
    const bends = steps.map(({ dx, dy, ddx, ddy }) => (dx * ddy - dy * ddx) / Math.hypot(dx, dy) ** 3);
    const range = Math.max(...bends) - Math.min(...bends);
    for (let i = 1; i < bends.length; i++)
      expect(Math.abs(bends[i]! - bends[i - 1]!)).toBeLessThan(0.02 * range);
  });

  test('equal steps of t are nearly the cosine spacing', () => {
    const { upper } = measuredOutline(smooth);
    for (let t = 0; t <= 1; t += 0.05) {
      expect(Math.abs(upper.at(t).x - Math.sin((Math.PI / 2) * t) ** 2)).toBeLessThan(0.02);
    }
  });

  test('measures come close to those of the curve that the points lie on', () => {
    const [found, exact] = [measure(measuredOutline(smooth)), measure(cstOutline(SMOOTH))];
    for (const key of ['maxThickness', 'maxCamber', 'area', 'ixx', 'trailingEdgeGap'] as const) {
      expect(Math.abs(found[key] - exact[key]), key).toBeLessThan(1e-6);
    }
    expect(Math.abs(found.perimeter - exact.perimeter)).toBeLessThan(1e-5);
    // The surfaces leave the nose with different radii; a curve whose curvature does not jump takes one between.
    expect(found.noseRadius).toBeGreaterThan(exact.noseRadiusLower);
    expect(found.noseRadius).toBeLessThan(exact.noseRadiusUpper);
    const even = { ...SMOOTH, lower: SMOOTH.upper.map((weight) => -weight) };
    const radius = measure(measuredOutline(pointsOf(cstOutline(even), 80))).noseRadius;
    expect(Math.abs(radius / exact.noseRadiusUpper - 1)).toBeLessThan(0.02);
    expect(Math.abs(found.trailingEdgeAngleDeg - exact.trailingEdgeAngleDeg)).toBeLessThan(0.05);
  });

  test('the nose is found between points as well', () => {
    const turned = pointsOf(cstOutline(SMOOTH), 80);
    const middle = turned.x.indexOf(0);
    const without = (list: readonly number[]) => list.filter((_, i) => i !== middle);
    const outline = measuredOutline({ kind: 'measured', x: without(turned.x), y: without(turned.y) });
    const { x, y } = outline.upper.at(0);
    expect(Math.hypot(x, y)).toBeLessThan(5e-5);
  });

  test('its mean line runs between the surfaces', () => {
    const outline = measuredOutline(smooth);
    const exact = cstOutline(SMOOTH);
    for (const station of [0, 0.1, 0.5, 0.9, 1]) {
      expect(Math.abs(outline.meanLine(station).y - exact.meanLine(station).y)).toBeLessThan(1e-6);
    }
  });

  test('the tolerance is kept on a contour whose points scatter', () => {
    const scattered = pointsOf(outlineOf(naca4('2412')), 400);
    const y = scattered.y.map((value, i) =>
      Math.abs(value) > 0.002 ? value + ((i * 7919) % 13) * 1e-6 : value,
    );
    const outline = measuredOutline({ ...scattered, y });
    for (const tolerance of [1e-4, 2e-5]) {
      const error = largestChordalError(outline, sampleToTolerance(outline, tolerance));
      expect(error).toBeLessThanOrEqual(1.001 * tolerance);
    }
  });

  test('it is sampled within a tolerance and fitted like any other outline', () => {
    const outline = measuredOutline(smooth);
    const chain = sampleToTolerance(outline, 1e-4);
    expect(largestChordalError(outline, chain)).toBeLessThanOrEqual(1e-4);
    expect(fitCst(outline, { orderUpper: 6, orderLower: 6 }).residual.largest).toBeLessThan(3e-4);
  });
});

test('a short name', () => {
  expect(describeMeasured(smooth)).toBe('Measured contour, 159 points');
});

describe('what is refused', () => {
  const issue = (change: Partial<Record<'x' | 'y', readonly number[]>>) => {
    const result = measuredSchema.safeParse({ ...smooth, ...change });
    return result.success
      ? null
      : `${result.error.issues[0]!.path.join('.')}: ${result.error.issues[0]!.message}`;
  };

  test('points of a section are accepted, sharp and blunt', () => {
    expect(issue({})).toBe(null);
    for (const digits of ['0012', '2412', '4415']) {
      expect(measuredSchema.safeParse(pointsOf(outlineOf(naca4(digits)), 30)).error).toBeUndefined();
    }
  });

  test('too few, too many, unequal and repeated points', () => {
    const few = MEASURED_LIMITS.points.min - 1;
    expect(issue({ x: smooth.x.slice(0, few) })).toBe('x: a measured contour must have 10 to 2000 points');
    expect(issue({ x: Array.from({ length: 2001 }, () => 0.5) })).toContain('10 to 2000 points');
    expect(issue({ y: smooth.y.slice(1) })).toBe('y: y must have as many values as x: 158 for 159');
    const twice = <T>(list: readonly T[]) => list.flatMap((value, i) => (i === 4 ? [value, value] : [value]));
    expect(issue({ x: twice(smooth.x), y: twice(smooth.y) })).toBe('x.5: point 6 repeats the one before');
  });

  test('values out of range, not finite, and keys that are not its own', () => {
    expect(issue({ y: smooth.y.map((y) => 9 * y) })).toContain(
      'each y must be between -50 % and 50 % of chord',
    );
    expect(issue({ x: smooth.x.map((x) => (x === 0 ? NaN : x)) })).toContain('each x must be between');
    expect(measuredSchema.safeParse({ ...smooth, name: 'x' }).success).toBe(false);
  });

  test('a chord that is elsewhere, an edge that is too open, points the wrong way round', () => {
    expect(issue({ x: smooth.x.map((x) => 0.97 * x) })).toContain('x.0: the trailing edge must lie at 100 %');
    expect(issue({ y: smooth.y.map((y) => y + 0.02) })).not.toBe(null);
    expect(issue({ y: smooth.y.map((y, i) => y + (i < 79 ? 0.06 : -0.06)) })).toContain('open by 10 %');
    expect(issue({ x: smooth.x.toReversed(), y: smooth.y.toReversed() })).toContain(
      'from the upper trailing edge',
    );
  });

  test('an outline that crosses itself', () => {
    const crossed = smooth.y.map((y, i) =>
      i < 79 && smooth.x[i]! > 0.6 && smooth.x[i]! < 0.8 ? y - 0.15 : y,
    );
    expect(issue({ y: crossed })).toMatch(/^y\.\d+: the outline crosses or touches itself near \d/);
  });
});
