import fc from 'fast-check';
import { expect, test } from 'vitest';
import { DenseMatrix } from '#geometry/flow/dense.ts';

const matrices = fc.integer({ min: 1, max: 23 }).chain((n) =>
  fc.record({
    n: fc.constant(n),
    values: fc.array(fc.integer({ min: -99, max: 99 }), { minLength: n * n, maxLength: n * n }),
    solution: fc.array(fc.integer({ min: -9, max: 9 }), { minLength: 3 * n, maxLength: 3 * n }),
  }),
);

test('solves what it was set up from, for one and for several right-hand sides', () => {
  let solved = 0;
  fc.assert(
    fc.property(matrices, ({ n, values, solution }) => {
      const matrix = new DenseMatrix(n);
      matrix.values.set(values);
      // Well conditioned, yet with small numbers on the diagonal, so that rows are exchanged.
      for (let i = 0; i < n; i++) matrix.values[i * n + ((i + 1) % n)]! += 500;
      const original = matrix.values.slice();
      const product = (column: number, i: number) =>
        solution.reduce(
          (sum, _, k) => (k < n ? sum + original[i * n + k]! * solution[k * 3 + column]! : sum),
          0,
        );
      const several = Float64Array.from({ length: 3 * n }, (_, at) => product(at % 3, Math.floor(at / 3)));
      const one = Float64Array.from({ length: n }, (_, i) => product(1, i));
      if (!matrix.factorise()) return;
      matrix.solve(several, 3);
      matrix.solve(one, 1);
      several.forEach((value, at) => expect(value).toBeCloseTo(solution[at]!, 6));
      one.forEach((value, i) => expect(value).toBeCloseTo(solution[i * 3 + 1]!, 6));
      solved++;
    }),
    { numRuns: 60 },
  );
  expect(solved).toBeGreaterThan(50);
});

test('a singular matrix and one that is not finite are found', () => {
  const singular = new DenseMatrix(3);
  singular.values.set([1, 2, 3, 2, 4, 6, 0, 1, 5]);
  expect(singular.factorise()).toBe(false);
  const broken = new DenseMatrix(2);
  broken.values.set([NaN, 1, 1, 1]);
  expect(broken.factorise()).toBe(false);
});
