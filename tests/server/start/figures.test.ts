import { expect, it } from 'vitest';
import { table } from '#tests/bench/figures.ts';

it('aligns the figures and says which miss their goal', () => {
  const lines = table([
    { what: 'contour', value: 0.0219, unit: 'ms', goal: 0.1 },
    { what: 'first page of many', value: 1.6, unit: '×', goal: 1.5 },
    { what: 'rows', value: 100_000, unit: 'rows' },
  ]);
  expect(lines).toEqual([
    '  contour               0.0219 ms  within 0.100 ms',
    '  first page of many       1.60 ×  OVER 1.50 ×',
    '  rows                100000 rows',
  ]);
});

it('takes a value on its goal as within', () => {
  expect(table([{ what: 'a', value: 2, unit: 'ms', goal: 2 }])[0]).toContain('within');
});
