import { expect, test } from 'vitest';
import { type z } from 'zod';
import { length, name, number, station, whole } from '#geometry/cutting/fields.ts';

const refusals = (schema: z.ZodType, values: readonly unknown[]) =>
  values.map((value) => schema.safeParse(value).error?.issues[0]?.message);

test('a length is taken within its range and refused beside it by a sentence', () => {
  const schema = length('The width', 2, 5);
  expect(refusals(schema, [2, 5])).toEqual([undefined, undefined]);
  for (const message of refusals(schema, [1.999, 5.001, NaN, Infinity, '3', null]))
    expect(message).toBe('The width must be between 2 and 5 mm.');
});

test('the unit stands where it is given', () => {
  expect(refusals(number('The density', ' kg/m³', 1, 500), [0])).toEqual([
    'The density must be between 1 and 500 kg/m³.',
  ]);
});

test('stations, whole numbers and names', () => {
  expect(refusals(station('The slot'), [0, 1])).toEqual([undefined, undefined]);
  expect(refusals(station('The slot'), [-0.1, 1.1])).toEqual(
    Array(2).fill('The slot must be between 0 % and 100 % of chord.'),
  );
  expect(refusals(whole('The ticks', 4, 50), [4, 4.5, 51])).toEqual([
    undefined,
    'The ticks must be a whole number between 4 and 50.',
    'The ticks must be a whole number between 4 and 50.',
  ]);
  expect(refusals(name, ['', 'x'.repeat(60)])).toEqual([undefined, undefined]);
  expect(refusals(name, ['x'.repeat(61), 7])).toEqual(
    Array(2).fill('A name must be text of at most 60 characters.'),
  );
});
