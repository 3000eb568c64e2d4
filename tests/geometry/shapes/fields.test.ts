import { describe, expect, test } from 'vitest';
import { fractionWithin, numberWithin, outsideChord, percent } from '#geometry/shapes/fields.ts';

describe('fields', () => {
  test('a range includes its ends and refuses all else with one sentence', () => {
    const field = numberWithin({ min: -1, max: 2 }, 'out');
    for (const value of [-1, 0, 2]) expect(field.parse(value)).toBe(value);
    for (const value of [-1.0001, 2.0001, NaN, Infinity, -Infinity, '1', null, undefined]) {
      expect(field.safeParse(value).error?.issues.map((issue) => issue.message)).toEqual(['out']);
    }
  });

  test('a fraction states its range in per cent of chord', () => {
    const message = 'gap must be between 0.5 % and 7 % of chord';
    expect(fractionWithin('gap', { min: 0.005, max: 0.07 }).safeParse(1).error?.issues[0]?.message).toBe(
      message,
    );
    expect(outsideChord('gap', { min: 0.005, max: 0.07 })).toBe(message);
  });

  test('per cent in as few digits as say it', () => {
    expect(percent(0.07)).toBe('7');
    expect(percent(0.1234567, 2)).toBe('12.35');
    expect(percent(0)).toBe('0');
  });
});
