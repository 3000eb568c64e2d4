import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { FIT_STATIONS, fitWeights, lowerOrder, raiseOrder } from '#geometry/shapes/cst-order.ts';
import { ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { stationOf } from '#geometry/shapes/outline.ts';
import { FREE_FORM, UNIT, cstShapes, deepFrozen } from './samples.ts';

const stations = Float64Array.from({ length: FIT_STATIONS }, (_, j) => stationOf(j / (FIT_STATIONS - 1)));

describe('raising the order', () => {
  test('changes no ordinate by more than 1e-14', () => {
    fc.assert(
      fc.property(cstShapes('any'), fc.double({ min: 0, max: 1, noNaN: true }), (shape, x) => {
        const raised = raiseOrder(deepFrozen(shape), 'both', 12);
        expect([raised.upper.length, raised.lower.length]).toEqual([13, 13]);
        for (const surface of ['upper', 'lower'] as const) {
          expect(Math.abs(ordinateAt(raised, surface, x) - ordinateAt(shape, surface, x))).toBeLessThan(
            1e-14,
          );
        }
      }),
    );
  });

  test('of one surface leaves the other; to the present order leaves all', () => {
    const raised = raiseOrder(FREE_FORM, 'lower', 7);
    expect([raised.lower.length, raised.upper]).toEqual([8, FREE_FORM.upper]);
    expect(raiseOrder(FREE_FORM, 'upper', 6)).toEqual(FREE_FORM);
  });

  test('is refused below the present order and out of range', () => {
    expect(() => raiseOrder(FREE_FORM, 'both', 5)).toThrow(
      'upper: the upper surface already has order 6, above 5',
    );
    for (const order of [13, 1, 4.5, NaN]) expect(() => raiseOrder(UNIT, 'both', order)).toThrow(ShapeError);
  });
});

describe('lowering the order', () => {
  test('undoes a raise, with no residual', () => {
    const { shape, residual } = lowerOrder(deepFrozen(raiseOrder(FREE_FORM, 'both', 9)), 'upper', 6);
    expect(residual).toBeLessThan(1e-13);
    FREE_FORM.upper.forEach((weight, i) => expect(Math.abs(weight - shape.upper[i]!)).toBeLessThan(1e-10));
    expect(shape.lower).toHaveLength(10);
  });

  test('reports the largest change of an ordinate', () => {
    const { shape, residual } = lowerOrder(FREE_FORM, 'both', 3);
    let largest = 0;
    for (const x of stations) {
      for (const surface of ['upper', 'lower'] as const) {
        largest = Math.max(
          largest,
          Math.abs(ordinateAt(shape, surface, x) - ordinateAt(FREE_FORM, surface, x)),
        );
      }
    }
    expect(residual).toBeGreaterThan(1e-4);
    expect(Math.abs(residual - largest)).toBeLessThan(1e-14);
    expect([shape.upper.length, shape.lower.length]).toEqual([4, 4]);
  });

  test('leaves a surface that is low enough, refuses an order out of range', () => {
    expect(lowerOrder(UNIT, 'both', 3)).toEqual({ shape: UNIT, residual: 0 });
    expect(() => lowerOrder(FREE_FORM, 'both', 1)).toThrow('order must be a whole number between 2 and 12');
  });
});

describe('fitting weights', () => {
  test('finds the weights that made the ordinates', () => {
    const shape = { ...FREE_FORM, trailingEdgeGap: 0 };
    const ordinates = stations.map((x) => ordinateAt(shape, 'upper', x));
    const weights = fitWeights(shape, 6, stations, ordinates);
    shape.upper.forEach((weight, i) => expect(Math.abs(weight - weights[i]!)).toBeLessThan(1e-11));
  });

  test('too few stations are refused', () => {
    const few = Float64Array.of(0.2, 0.5);
    expect(() => fitWeights({ n1: 0.5, n2: 1 }, 4, few, few)).toThrow('2 stations do not determine');
  });
});
