import fc from 'fast-check';
import { expect, test } from 'vitest';
import { SmallMatrix } from '#geometry/flow/inverse.ts';

test('a matrix times its inverse is the unit matrix', () => {
  const entry = fc.integer({ min: -9, max: 9 });
  fc.assert(
    fc.property(fc.array(entry, { minLength: 9, maxLength: 9 }), (values) => {
      const matrix = new SmallMatrix();
      matrix.values.set(values);
      const [a, b, c, d, e, f, g, h, k] = values as [number, number, number, number, number, number, number, number, number]; // prettier-ignore
      const determinant = a * (e * k - f * h) - b * (d * k - f * g) + c * (d * h - e * g);
      expect(matrix.invert()).toBe(determinant !== 0);
      if (determinant === 0) return;
      for (let i = 0; i < 3; i++) {
        for (let j = 0; j < 3; j++) {
          const product = [0, 1, 2].reduce(
            (sum, m) => sum + values[i * 3 + m]! * matrix.inverse[m * 3 + j]!,
            0,
          );
          expect(product).toBeCloseTo(i === j ? 1 : 0, 9);
        }
      }
    }),
    { numRuns: 100 },
  );
});

test('what is not finite has no inverse', () => {
  const matrix = new SmallMatrix();
  matrix.values.fill(NaN);
  expect(matrix.invert()).toBe(false);
});
