import { expect, test } from 'vitest';
import { deviationWords, modelTolerance, toleranceVerdict } from '#geometry/contour/model-tolerance.ts';

test('0.04 % of chord ahead of 20 %, 0.08 % from there on', () => {
  expect([-0.01, 0, 0.199, 0.2, 1, 1.01].map(modelTolerance)).toEqual([4e-4, 4e-4, 4e-4, 8e-4, 8e-4, 8e-4]);
});

test('a deviation in words: size, side and place', () => {
  expect(deviationWords({ deviation: 0.0001234, surface: 'upper', station: 0.0312 })).toBe(
    '0.012 % of chord outside at 3.1 % on the upper surface',
  );
  expect(deviationWords({ deviation: -4e-8, surface: 'lower', station: -1e-9 })).toBe(
    '0.000004 % of chord inside at 0 % on the lower surface',
  );
  expect(deviationWords({ deviation: 0, surface: 'lower', station: 1 })).toBe(
    '0 % of chord at 100 % on the lower surface',
  );
});

test('the verdict in words', () => {
  const largest = { deviation: 0.001, surface: 'upper', station: 0.5 } as const;
  expect(toleranceVerdict(largest, { counted: 120, outside: 0, excluded: 1 })).toBe(
    'Within the usual tolerance of wind-tunnel models (about 0.04 % of chord ahead of 20 %, 0.08 % behind). ' +
      'Largest deviation 0.1 % of chord outside at 50 % on the upper surface. 1 point left out.',
  );
  expect(toleranceVerdict(largest, { counted: 120, outside: 3, excluded: 0 })).toMatch(
    /^Out of the usual tolerance of wind-tunnel models \(about .*\): 3 of 120 points\. Largest deviation .*surface\.$/,
  );
});
