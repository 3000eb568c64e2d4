import { describe, expect, test } from 'vitest';
import { type Shape } from '#geometry/shapes/shape.ts';
import { compare } from '#client/compare/comparison.ts';
import { measureRows, parameterRows, type Row, tabSeparated } from '#client/compare/differences.ts';
import { largestWords } from '#client/compare/words.ts';
import { freeForm, naca4, versionOf } from './samples.ts';

const comparison = (...shapes: Shape[]) =>
  compare(
    shapes.map((shape, index) => ({ tag: index + 1, version: versionOf(index + 1, shape) })),
    'chord',
  );
const row = (rows: readonly Row[] | null, label: string) =>
  rows?.find((one) => one.label === label)?.cells.map(({ value, difference }) => [value, difference]);

describe('values side by side', () => {
  test('stand at the chord, with the signed difference from the first', () => {
    const rows = measureRows(comparison(naca4(0.12, 0), naca4(0.15, 0), naca4(0.09, 0)), 100, 'mm');
    expect(row(rows, 'Largest thickness')).toEqual([
      ['12.00 mm', null],
      ['15.00 mm', '+3.00 mm'],
      ['9.00 mm', '-3.00 mm'],
    ]);
    // NACA Report 824: r = 1.1019 t².
    expect(row(rows, 'Nose radius')).toEqual([
      ['1.59 mm', null],
      ['2.48 mm', '+0.89 mm'],
      ['0.89 mm', '-0.69 mm'],
    ]);
    expect(row(rows, 'Camber, station')).toEqual([
      ['–', null],
      ['–', null],
      ['–', null],
    ]);
  });

  test('are in inches for who works in inches', () => {
    const rows = measureRows(comparison(naca4(0.12, 0), naca4(0.12, 0)), 254, 'inch');
    expect(row(rows, 'Largest thickness')).toEqual([
      ['1.200 in', null],
      ['1.200 in', '0.000 in'],
    ]);
    expect(row(rows, 'Area')?.[0]?.[0]).toMatch(/^\d\.\d{4} in²$/);
  });

  test('parameters are compared within one kind only', () => {
    const rows = parameterRows(comparison(naca4(0.12), naca4(0.15, 0.04)));
    expect(row(rows, 'Camber')).toEqual([
      ['2.00 %', null],
      ['4.00 %', '+2.00 %'],
    ]);
    expect(row(rows, 'Trailing edge')).toEqual([
      ['open', null],
      ['open', 'same'],
    ]);
    expect(parameterRows(comparison(naca4(0.12), freeForm([0.17, 0.16, 0.18])))).toBeNull();
  });

  test('weights of unlike order have no difference', () => {
    const alike = parameterRows(comparison(freeForm([0.17, 0.16, 0.18]), freeForm([0.18, 0.16, 0.18])));
    expect(row(alike, 'Weight 0, upper')).toEqual([
      ['0.1700', null],
      ['0.1800', '+0.0100'],
    ]);
    const unlike = parameterRows(comparison(freeForm([0.17, 0.18]), freeForm([0.17, 0.16, 0.18])));
    expect(row(unlike, 'Weight 2, upper')).toEqual([
      ['–', null],
      ['0.1800', null],
    ]);
    expect(row(unlike, 'Weight 0, lower')).toEqual([
      ['-0.1700', null],
      ['-0.1700', '0.0000'],
    ]);
  });

  test('are copied with tabs, and a name cannot break the columns', () => {
    const compared = compare(
      [
        { tag: 1, version: versionOf(1, naca4(0.12, 0), { sectionName: 'Odd\tname' }) },
        { tag: 2, version: versionOf(2, naca4(0.15, 0)) },
      ],
      'chord',
    );
    const lines = tabSeparated(compared, measureRows(compared, 100, 'mm')).split('\n');
    expect(lines[0]).toBe('Value\tOdd name v1\tHeron outer panel v2\t2: difference');
    expect(lines[1]).toBe('Largest thickness\t12.00 mm\t15.00 mm\t+3.00 mm');
    expect(new Set(lines.map((line) => line.split('\t').length))).toEqual(new Set([4]));
  });
});

describe('the largest deviation in words', () => {
  test('has its sign, side, surface and station', () => {
    const [first, thicker, thinner] = comparison(naca4(0.12, 0), naca4(0.15, 0), naca4(0.09, 0));
    expect(first && largestWords(first, 100, 'mm')).toBe('the reference');
    // Half of the thickness difference, a little less square to the contour; where the thickness is largest.
    expect(thicker && largestWords(thicker, 100, 'mm')).toMatch(
      /^\+1\.50\d mm \(outside\) on the (upper|lower) surface at (29|30)\.\d\d? % of chord$/,
    );
    expect(thinner && largestWords(thinner, 254, 'inch')).toMatch(/^-0\.150\d in \(inside\) on the/);
  });

  test('is none between equal shapes', () => {
    const [, same] = comparison(naca4(0.12), naca4(0.12));
    expect(same && largestWords(same, 100, 'mm')).toBe('no deviation');
  });
});
