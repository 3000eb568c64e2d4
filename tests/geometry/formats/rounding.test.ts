import { describe, expect, test } from 'vitest';
import { roundContour, roundTo, withoutRepeats } from '#geometry/formats/rounding.ts';

const contour = (points: readonly (readonly [number, number])[], noseIndex: number, sharp: boolean) => ({
  x: Float64Array.from(points, ([x]) => x),
  y: Float64Array.from(points, ([, y]) => y),
  noseIndex,
  sharp,
});

describe('withoutRepeats', () => {
  test('leaves a contour without repeats as it is', () => {
    const plain = contour([[1, 0.1], [0.5, 0.2], [0, 0], [0.5, -0.2], [1, -0.1]], 2, false); // prettier-ignore
    expect(withoutRepeats(plain)).toEqual(plain);
  });

  test('drops repeats on both surfaces and at the nose, and keeps the nose', () => {
    const repeated = contour(
      [[1, 0.1], [1, 0.1], [0.5, 0.2], [0, 0], [0, 0], [0, 0], [0.5, -0.2], [0.5, -0.2], [1, -0.1]], // prettier-ignore
      4,
      false,
    );
    const plain = contour([[1, 0.1], [0.5, 0.2], [0, 0], [0.5, -0.2], [1, -0.1]], 2, false); // prettier-ignore
    expect(withoutRepeats(repeated)).toEqual(plain);
  });

  test('makes a trailing edge sharp whose gap is rounded away', () => {
    const rounded = roundContour(
      contour([[1, 4e-6], [0.5, 0.2], [0, 0], [0.5, -0.2], [1, -4e-6]], 2, false), // prettier-ignore
      5,
    );
    expect(withoutRepeats(rounded)).toEqual(contour([[1, 0], [0.5, 0.2], [0, 0], [0.5, -0.2]], 2, true)); // prettier-ignore
  });
});

test.each([
  [1.23456, 2, 1.23],
  [-1.5, 0, -1],
  [0.000005, 5, 0.00001],
])('%d with %d decimals is %d', (value, decimals, rounded) => {
  expect(roundTo(value, decimals)).toBe(rounded);
});
