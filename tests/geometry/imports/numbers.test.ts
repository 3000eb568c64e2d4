import fc from 'fast-check';
import { expect, test } from 'vitest';
import { numbersIn } from '#geometry/imports/numbers.ts';

test.each<readonly [string, '.' | ',', readonly number[] | null]>([
  ['1.0 0.5', '.', [1, 0.5]],
  ['  -.5;\t+3. ', '.', [-0.5, 3]],
  ['1,0', '.', [1, 0]],
  ['1,0', ',', [1]],
  ['0,95,0,012', ',', [0.95, 0.012]],
  ['0,5; -,25', ',', [0.5, -0.25]],
  ['250, 3', ',', [250, 3]],
  ['0.5 3', ',', null],
  ['1e-3 2D+02 4E1', '.', [0.001, 200, 40]],
  ['"0.5","0.1"', '.', [0.5, 0.1]],
  ['(0.5, 0.1)', '.', [0.5, 0.1]],
  ['\u22120.5\u00a050%', '.', [-0.5, 50]],
  ['', '.', []],
  [' ,; ', '.', []],
  ['1 2 3 4 5 6 7', '.', [1, 2, 3, 4, 5]],
  ['0.5 x', '.', null],
  ['0.5x', '.', null],
  ['.', '.', null],
  ['-', '.', null],
  ['1.2.3', '.', null],
  ['1e', '.', null],
  ['NaN 1', '.', null],
  ['1e999 1', '.', null],
  ['0x10 1', '.', null],
  [`${'1'.repeat(65)} 1`, '.', null],
])('%j with the mark "%s"', (line, mark, expected) => {
  expect(numbersIn(line, mark, 5)).toEqual(expected);
});

test('any numbers written are read again, with point or comma', () => {
  const number = fc
    .double({ noNaN: true, noDefaultInfinity: true })
    .map((value) => (value === 0 ? 0 : value));
  fc.assert(
    fc.property(number, number, (x, y) => {
      expect(numbersIn(`${x} ${y}`, '.', 5)).toEqual([x, y]);
      expect(numbersIn(`${x};${y}`.replaceAll('.', ','), ',', 5)).toEqual([x, y]);
    }),
    { numRuns: 200 },
  );
});
