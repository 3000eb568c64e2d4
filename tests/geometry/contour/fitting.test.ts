import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitCst } from '#geometry/contour/fitting.ts';
import { type CstShape, cstOutline } from '#geometry/shapes/cst.ts';
import { ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { type Outline, stationOf } from '#geometry/shapes/outline.ts';
import { similarityOf, toChord } from '#geometry/shapes/placement.ts';
import { FITS_0012, FITS_CAMBERED, WEIGHTS_CAMBERED } from '#tests/reference/cst-fits.ts';
import { FREE_FORM, UNIT, cstShapes, deepFrozen, naca4 } from '#tests/geometry/shapes/samples.ts';

const fit = (source: Outline, order: number) => fitCst(source, { orderUpper: order, orderLower: order });

/** The source's ordinate at a station of the fitted chord, by plain bisection round the outline from the trailing edge. */
function sourceOrdinate(
  source: Outline,
  shape: CstShape,
  surface: 'upper' | 'lower',
  station: number,
): number {
  const frame = similarityOf(shape.placement);
  const at = (w: number) =>
    toChord(frame, w >= 0 ? source[surface].at(w) : source[surface === 'upper' ? 'lower' : 'upper'].at(-w));
  let nose = 0;
  for (let w = -0.1; w <= 0.1; w += 1e-4) if (at(w).x < at(nose).x) nose = w;
  let [low, high] = [nose, 1];
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (at(middle).x < station) low = middle;
    else high = middle;
  }
  return at(low).y;
}

/** Largest ordinate differences ahead of and behind 20 % of chord on the fitting stations. */
function residuals(source: Outline, shape: CstShape, surface: 'upper' | 'lower'): readonly [number, number] {
  const largest: [number, number] = [0, 0];
  for (let j = 1; j < 200; j++) {
    const station = stationOf(j / 200);
    const part = station < 0.2 ? 0 : 1;
    const difference = ordinateAt(shape, surface, station) - sourceOrdinate(source, shape, surface, station);
    largest[part] = Math.max(largest[part], Math.abs(difference));
  }
  return largest;
}

const within = (value: number, reference: number, share: number) =>
  expect(Math.abs(value - reference)).toBeLessThanOrEqual(share * reference);

describe('fits of 0012 against computed ones: weights 1e-4, residuals 10 %', () => {
  test.each(FITS_0012)('$edge edge, order $order', ({ edge, order, weights, ahead, behind }) => {
    const source = naca4Outline(naca4('0012', edge));
    const { shape, nose, rotationDeg, scale } = fit(source, order);
    weights.forEach((weight, i) => {
      expect(Math.abs(shape.upper[i]! - weight)).toBeLessThan(1e-4);
      expect(Math.abs(shape.lower[i]! + weight)).toBeLessThan(1e-4);
    });
    expect([nose, rotationDeg, scale, shape.placement]).toEqual([{ x: 0, y: 0 }, 0, 1, undefined]);
    const [foundAhead, foundBehind] = residuals(source, shape, 'upper');
    within(foundAhead, ahead, 0.1);
    within(foundBehind, behind, 0.1);
  });
});

describe('fits of cambered sections against computed ones', () => {
  test.each(FITS_CAMBERED)('$digits $surface: nose, slope, residuals', (expected) => {
    const source = naca4Outline(naca4(expected.digits));
    for (const order of [4, 6, 8] as const) {
      const { shape, nose, rotationDeg } = fit(source, order);
      expect(Math.abs(nose.x - expected.noseX)).toBeLessThan(1e-6);
      expect(Math.abs(nose.y - expected.noseY)).toBeLessThan(1e-6);
      expect(Math.abs(rotationDeg - expected.slopeDeg)).toBeLessThan(1e-4);
      const found = residuals(source, shape, expected.surface);
      found.forEach((value, part) => within(value, expected.residuals[order][part]!, 0.1));
    }
  });

  test.each(WEIGHTS_CAMBERED)('$digits: weights of order 6 to 1e-4', ({ digits, upper, lower }) => {
    const { shape } = fit(naca4Outline(naca4(digits)), 6);
    upper.forEach((weight, i) => expect(Math.abs(shape.upper[i]! - weight)).toBeLessThan(1e-4));
    lower.forEach((weight, i) => expect(Math.abs(shape.lower[i]! - weight)).toBeLessThan(1e-4));
  });
});

describe('the fit lies where the source lay', () => {
  test('order 8 reproduces 2412 within 2e-4 and 0012 within 1e-4 of chord', () => {
    for (const edge of ['open', 'closed'] as const) {
      expect(fit(naca4Outline(naca4('2412', edge)), 8).residual.largest).toBeLessThan(2e-4);
      expect(fit(naca4Outline(naca4('0012', edge)), 8).residual.largest).toBeLessThan(1e-4);
    }
  });

  test('the residual is the distance to the nearest point of the source, found here by dense sampling', () => {
    const source = naca4Outline(naca4('4412'));
    const { shape, residual } = fit(source, 5);
    const points = Array.from({ length: 20_001 }, (_, i) => i / 20_000).flatMap((t) => [
      source.upper.at(t),
      source.lower.at(t),
    ]);
    const { upper, lower } = cstOutline(shape);
    let largest = 0;
    for (let j = 0; j <= 100; j++) {
      for (const { x, y } of [upper.at(j / 100), lower.at(j / 100)]) {
        let nearest = Infinity;
        for (const point of points) nearest = Math.min(nearest, Math.hypot(point.x - x, point.y - y));
        largest = Math.max(largest, nearest);
      }
    }
    expect(Math.abs(residual.largest - largest)).toBeLessThan(0.02 * largest);
    expect(residual.largest).toBe(Math.max(residual.upper, residual.lower));
  });

  test('an open trailing edge keeps its gap and its middle', () => {
    const source = naca4Outline(naca4('2412', 'open'));
    const outline = cstOutline(fit(source, 8).shape);
    for (const surface of ['upper', 'lower'] as const) {
      const [a, b] = [outline[surface].at(1), source[surface].at(1)];
      expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeLessThan(1e-4);
    }
    expect(fit(naca4Outline(naca4('2412', 'closed')), 8).shape.trailingEdgeGap).toBe(0);
  });
});

describe('fits of free forms', () => {
  test('a shape whose nose is its farthest point is found again, placement and all', () => {
    const symmetric = { ...FREE_FORM, lower: FREE_FORM.upper.map((weight) => -weight) };
    const { shape, residual } = fit(cstOutline(symmetric), 6);
    expect(residual.largest).toBeLessThan(1e-12);
    symmetric.upper.forEach((weight, i) => expect(Math.abs(shape.upper[i]! - weight)).toBeLessThan(1e-9));
    expect(Math.abs(shape.placement!.rotationDeg - symmetric.placement!.rotationDeg)).toBeLessThan(1e-9);
    expect(Math.abs(shape.placement!.scale - symmetric.placement!.scale)).toBeLessThan(1e-12);
  });

  test('the order of each surface is its own', () => {
    const { shape } = fitCst(naca4Outline(naca4('2412')), { orderUpper: 3, orderLower: 9 });
    expect([shape.upper.length, shape.lower.length]).toEqual([4, 10]);
  });

  test('any source gives finite weights and a finite residual, or is refused', () => {
    fc.assert(
      fc.property(cstShapes(), (shape) => {
        const source = cstOutline(deepFrozen(shape));
        const found = (() => {
          try {
            return fit(source, 8);
          } catch (error) {
            if (error instanceof ShapeError) return null;
            throw error;
          }
        })();
        fc.pre(found !== null);
        expect([...found!.shape.upper, ...found!.shape.lower].every(Number.isFinite)).toBe(true);
        expect(Number.isFinite(found!.residual.largest)).toBe(true);
      }),
      { numRuns: 30 },
    );
  });

  test('an order out of range is refused', () => {
    for (const order of [1, 13, 2.5, NaN]) {
      expect(() => fit(cstOutline(UNIT), order)).toThrow('order must be a whole number between 2 and 12');
    }
  });
});
