import { expect, test } from 'vitest';
import { PART } from '#geometry/cutting/row.ts';

test('the parts of a contour are told apart by a byte', () => {
  const values = Object.values(PART);
  expect(new Set(values).size).toBe(values.length);
  expect(Array.from(Uint8Array.from(values))).toEqual(values);
});
