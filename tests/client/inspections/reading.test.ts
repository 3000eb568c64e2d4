import { describe, expect, it } from 'vitest';
import { judge } from '#client/inspections/reading.ts';

const row = { end: 'root', station: 0.3, nominalMm: 24, toleranceMm: 0.3 } as const;

describe('a caliper reading', () => {
  it('is within up to the tolerance, and out beyond it', () => {
    expect(judge('24.3', row, 1)).toMatchObject({ state: 'within', measuredMm: 24.3 });
    expect(judge('23.70', row, 1).state).toBe('within');
    expect(judge('24.31', row, 1)).toMatchObject({ state: 'out', measuredMm: 24.31 });
    expect(judge('23.69', row, 1).state).toBe('out');
  });

  it('is read with a comma, without a leading zero, and in inches', () => {
    expect(judge('23,9', row, 1)).toMatchObject({ measuredMm: 23.9 });
    expect(judge(' .5 ', row, 1)).toMatchObject({ measuredMm: 0.5 });
    expect(judge('0.945', row, 25.4)).toMatchObject({ measuredMm: 24.003, state: 'within' });
  });

  it.each(['abc', '1.2.3', '-3', '24 mm', '1e3', '501', '.'])('%s is no reading', (text) => {
    expect(judge(text, row, 1).state).toBe('unreadable');
  });

  it.each(['', '  ', undefined])('%j is none yet', (text) => {
    expect(judge(text, row, 1)).toEqual({ state: 'empty' });
  });
});
