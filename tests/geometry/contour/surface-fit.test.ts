import { describe, expect, test } from 'vitest';
import { SHEET_CHORD, pointsOnChord } from '#geometry/contour/point-residuals.ts';
import { fitSurface, ladderOf, rowsOf } from '#geometry/contour/surface-fit.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { type Outline } from '#geometry/shapes/outline.ts';
import { FREE_FORM, naca4 } from '#tests/geometry/shapes/samples.ts';
import { pointsOf } from '#tests/geometry/imports/files.ts';

const { placement: _, ...onSheet } = FREE_FORM;
const rows = (outline: Outline, surface: 'upper' | 'lower', gap: number, pointsPerSurface = 40) => {
  const points = pointsOf(outline, pointsPerSurface);
  const contour = { x: points.map(({ x }) => x), y: points.map(({ y }) => y) };
  return rowsOf(pointsOnChord(contour, SHEET_CHORD), surface, gap);
};

describe('rows of a surface', () => {
  test('are its points between nose and trailing edge, without the wedge of the gap', () => {
    const { stations, ordinates } = rows(cstOutline(onSheet), 'upper', onSheet.trailingEdgeGap);
    expect(stations).toHaveLength(38);
    expect(Math.abs(ordinates[0]!)).toBeLessThan(1e-3);
  });

  test('points behind 20 % count half, crowded points as much as the stretch they stand for', () => {
    const { stations, shares, weights } = rows(outlineOf(naca4('0012')), 'upper', 0);
    const near = (place: number) => stations.findIndex((x) => Math.abs(x - place) < 0.03);
    expect(Math.abs(shares[near(0.15)]! / shares[near(0.3)]! - 2)).toBeLessThan(0.1);
    const twice = rows(outlineOf(naca4('0012')), 'upper', 0, 79);
    const [one, two] = [weights[20]! ** 2, twice.weights[41]! ** 2];
    expect(Math.abs(one / two - 2)).toBeLessThan(0.1);
  });

  test('of very many points a choice is taken', () => {
    expect(rows(outlineOf(naca4('0012')), 'lower', 0, 1999).stations.length).toBeLessThanOrEqual(400);
  });
});

describe('fits of a surface', () => {
  test('weights of a free form are found again', () => {
    for (const surface of ['upper', 'lower'] as const) {
      const fit = fitSurface(
        rows(cstOutline(onSheet), surface, onSheet.trailingEdgeGap),
        onSheet[surface].length - 1,
      )!;
      fit.weights.forEach((weight, i) => expect(Math.abs(weight - onSheet[surface][i]!)).toBeLessThan(1e-10));
      expect(fit.share).toBeLessThan(1e-9);
    }
  });

  test('the ladder begins at the first order that comes near the tolerance and ends well within it', () => {
    const { fits, rung } = ladderOf(rows(outlineOf(naca4('0012')), 'upper', 0))!;
    expect(fits.map(({ order }) => order)).toEqual(fits.map((_, i) => i + 2));
    expect(fits[rung]!.fit.share).toBeLessThanOrEqual(1.5);
    expect(fits.at(-1)!.fit.share).toBeLessThan(0.5);
  });

  test('few points allow low orders only, too few none', () => {
    expect(ladderOf(rows(outlineOf(naca4('6412')), 'lower', 0, 9))!.fits.at(-1)!.order).toBeLessThanOrEqual(
      4,
    );
    expect(ladderOf(rows(outlineOf(naca4('0012')), 'upper', 0, 4 + 1))!.fits).toHaveLength(1);
    const none = {
      stations: new Float64Array(),
      ordinates: new Float64Array(),
      weights: new Float64Array(),
      shares: new Float64Array(),
    };
    expect(ladderOf(none)).toBe(null);
  });
});
