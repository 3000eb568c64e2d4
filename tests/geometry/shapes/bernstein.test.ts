import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  binomial,
  derivativeWeights,
  elevate,
  evaluateScaled,
  halve,
  scaledWeights,
} from '#geometry/shapes/bernstein.ts';
import { deepFrozen } from './samples.ts';

const lists = fc.array(fc.double({ min: -2, max: 2, noNaN: true }), { minLength: 1, maxLength: 13 });
const stations = fc.double({ min: 0, max: 1, noNaN: true });
const evaluate = (weights: readonly number[], x: number) => evaluateScaled(scaledWeights(weights), x, 1 - x);

/** The slow, plain way: de Casteljau's scheme. */
function deCasteljau(weights: readonly number[], x: number): number {
  let row = [...weights];
  while (row.length > 1) row = row.slice(1).map((value, i) => (1 - x) * row[i]! + x * value);
  return row[0]!;
}

describe('Bernstein polynomials', () => {
  test('binomial coefficients', () => {
    expect([binomial(12, 0), binomial(12, 6), binomial(12, 12), binomial(5, 2), binomial(0, 0)]).toEqual([
      1, 924, 1, 10, 1,
    ]);
  });

  test('the fast evaluation agrees with de Casteljau', () => {
    fc.assert(
      fc.property(lists, stations, (weights, x) => {
        expect(Math.abs(evaluate(weights, x) - deCasteljau(weights, x))).toBeLessThan(1e-14);
      }),
    );
  });

  test('the ends are the first and last weight, exactly; equal weights are a constant', () => {
    expect(evaluate([0.3, 7, -0.7], 0)).toBe(0.3);
    expect(evaluate([0.3, 7, -0.7], 1)).toBe(-0.7);
    expect(evaluate([0.25, 0.25, 0.25, 0.25], 0.3)).toBeCloseTo(0.25, 15);
    expect(evaluate([5], 0.3)).toBe(5);
  });

  test('raising the order changes no value', () => {
    fc.assert(
      fc.property(lists, stations, (weights, x) => {
        const raised = elevate(deepFrozen(weights));
        expect(raised).toHaveLength(weights.length + 1);
        expect(Math.abs(evaluate(raised, x) - evaluate(weights, x))).toBeLessThan(1e-14);
      }),
    );
  });

  test('the derivative agrees with differences; a constant has none', () => {
    expect(derivativeWeights([4])).toEqual([0]);
    fc.assert(
      fc.property(lists, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (weights, x) => {
        const h = 1e-5;
        const difference = (evaluate(weights, x + h) - evaluate(weights, x - h)) / (2 * h);
        expect(Math.abs(evaluate(derivativeWeights(deepFrozen(weights)), x) - difference)).toBeLessThan(1e-5);
      }),
    );
  });

  test('the halves are the same polynomial on their half', () => {
    fc.assert(
      fc.property(lists, stations, (weights, x) => {
        const { left, right } = halve(deepFrozen(weights));
        expect(Math.abs(evaluate(left, x) - evaluate(weights, x / 2))).toBeLessThan(1e-14);
        expect(Math.abs(evaluate(right, x) - evaluate(weights, (1 + x) / 2))).toBeLessThan(1e-14);
      }),
    );
  });
});
