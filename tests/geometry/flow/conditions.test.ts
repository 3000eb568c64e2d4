import { expect, test } from 'vitest';
import { checkConditions } from '#geometry/flow/conditions.ts';

test('only the Reynolds number is needed; the rest is a smooth surface in quiet air at low speed', () => {
  expect(checkConditions({ reynolds: 2e5 })).toEqual({ reynolds: 2e5, criticalN: 9, tripUpper: 1, tripLower: 1, mach: 0 }); // prettier-ignore
});

test('what is out of range or unknown is named', () => {
  expect(() => checkConditions({ reynolds: 1000 })).toThrow(/reynolds must be between/);
  expect(() => checkConditions({ reynolds: 2e5, criticalN: 20 })).toThrow(/criticalN/);
  expect(() => checkConditions({ reynolds: 2e5, tripUpper: 0 })).toThrow(/tripUpper/);
  expect(() => checkConditions({ reynolds: 2e5, mach: 0.8 })).toThrow(/mach/);
  expect(() => checkConditions({ reynolds: NaN })).toThrow(/reynolds/);
  expect(() => checkConditions({ reynolds: 2e5, alpha: 1 })).toThrow(/alpha is not a condition/);
});
