import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { leastSquares } from '#geometry/shapes/least-squares.ts';

const column = (...values: number[]) => Float64Array.from(values);

describe('least squares', () => {
  test('a square system is solved', () => {
    const solution = leastSquares([column(2, 1), column(1, 3)], column(5, 10));
    expect(solution).toEqual([expect.closeTo(1, 14), expect.closeTo(3, 14)]);
  });

  test('the line through three points that lie on none', () => {
    const solution = leastSquares([column(1, 1, 1), column(0, 1, 2)], column(0, 1, 1));
    expect(solution).toEqual([expect.closeTo(1 / 6, 14), expect.closeTo(0.5, 14)]);
  });

  test('the residual is square to every column, and the arguments stay as they were', () => {
    const entry = fc.double({ min: -1, max: 1, noNaN: true });
    const list = fc.array(entry, { minLength: 9, maxLength: 9 });
    fc.assert(
      fc.property(fc.array(list, { minLength: 1, maxLength: 4 }), list, (lists, target) => {
        const columns = lists.map((values, k) => Float64Array.from(values, (v, i) => v + (i === k ? 5 : 0)));
        const before = columns.map((values) => [...values]);
        const b = Float64Array.from(target);
        const solution = leastSquares(columns, b)!;
        expect([columns.map((values) => [...values]), [...b]]).toEqual([before, target.map((v) => v)]);
        const residual = b.map((v, i) => v - columns.reduce((sum, c, k) => sum + c[i]! * solution[k]!, 0));
        for (const c of columns) {
          expect(Math.abs(c.reduce((sum, v, i) => sum + v * residual[i]!, 0))).toBeLessThan(1e-13);
        }
      }),
    );
  });

  test('no answer for dependent columns, zero columns or too few rows', () => {
    expect(leastSquares([column(1, 2, 3), column(2, 4, 6)], column(1, 1, 1))).toBeNull();
    expect(leastSquares([column(0, 0)], column(1, 1))).toBeNull();
    expect(leastSquares([column(1), column(2)], column(1))).toBeNull();
    expect(leastSquares([], column(1))).toEqual([]);
  });
});
