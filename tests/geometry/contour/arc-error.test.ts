import { describe, expect, test } from 'vitest';
import { arcError, bestDivision, inflectionsOf } from '#geometry/contour/arc-error.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { type SurfaceCurve, parameterOf } from '#geometry/shapes/outline.ts';
import { FREE_FORM, UNIT, naca4 } from '#tests/geometry/shapes/samples.ts';

/** The slow, plain way: the largest of many distances. */
function sampledError(surface: SurfaceCurve, from: number, to: number): number {
  const [a, b] = [surface.at(from), surface.at(to)];
  const length = Math.hypot(b.x - a.x, b.y - a.y);
  let largest = 0;
  for (let i = 0; i <= 4000; i++) {
    const p = surface.at(from + ((to - from) * i) / 4000);
    largest = Math.max(largest, Math.abs((b.x - a.x) * (p.y - a.y) - (b.y - a.y) * (p.x - a.x)) / length);
  }
  return largest;
}

const surfaces: [string, SurfaceCurve][] = [
  ['2412 lower', naca4Outline(naca4('2412', 'open')).lower],
  ['4412 lower', naca4Outline(naca4('4412')).lower],
  ['9225 upper', naca4Outline(naca4('9225')).upper],
  ['free form lower', cstOutline(FREE_FORM).lower],
];

describe('inflections', () => {
  test('a convex surface has none', () => {
    expect(inflectionsOf(naca4Outline(naca4('0012')).upper)).toEqual([]);
    expect(inflectionsOf(cstOutline(UNIT).upper)).toEqual([]);
  });

  test('on the lower side of 2412 the corner at the camber position turns against the bend', () => {
    expect(inflectionsOf(naca4Outline(naca4('2412')).lower)).toEqual([parameterOf(0.4)]);
    expect(inflectionsOf(naca4Outline(naca4('2412')).upper)).toEqual([]);
  });

  test('at each one the bend changes its sign', () => {
    const { lower } = cstOutline(FREE_FORM);
    const found = inflectionsOf(lower);
    expect(found.length).toBeGreaterThan(0);
    const bend = (t: number) => {
      const { dx, dy, ddx, ddy } = lower.derivatives(t);
      return dx * ddy - dy * ddx;
    };
    for (const t of found) expect(bend(t - 1e-6) * bend(t + 1e-6)).toBeLessThan(0);
  });
});

describe('the error of an arc', () => {
  test.each(surfaces)(
    '%s: as dense sampling finds it, for long and short arcs, across breaks and inflections',
    (_, surface) => {
      const turns = inflectionsOf(surface);
      for (const from of [0, 0.1, 0.3, 0.42, 0.6, 0.85]) {
        for (const length of [0.15, 0.05, 0.01, 0.002]) {
          const [error, sampled] = [
            arcError(surface, from, from + length, turns),
            sampledError(surface, from, from + length),
          ];
          expect(Math.abs(error - sampled)).toBeLessThan(1e-5 * sampled + 1e-16);
        }
      }
    },
  );

  test('is infinite for an arc that turns by more than a right angle against its chord', () => {
    const round = cstOutline({ ...UNIT, n2: 0.5, upper: [1, 1, 1, 1] }).upper;
    expect(arcError(round, 0.01, 1, [])).toBeLessThan(1);
    const bent = naca4Outline({ ...naca4('9130'), maxCamberPosition: 0.15 }).upper;
    expect(arcError(bent, 0, 0.4, [])).toBe(Infinity);
  });

  test('the best division has a smaller error than its neighbours', () => {
    const surface = cstOutline(UNIT).upper;
    const error = (t: number) => Math.max(arcError(surface, 0, t, []), arcError(surface, t, 1, []));
    const t = bestDivision(surface, []);
    expect(error(t)).toBeLessThan(error(t - 1 / 256));
    expect(error(t)).toBeLessThan(error(t + 1 / 256));
    expect(error(t)).toBeLessThan(arcError(surface, 0, 1, []));
  });
});
