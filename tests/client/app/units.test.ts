import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatAngle,
  formatLength,
  formatPercent,
  parseQuantity,
  type QuantityContext,
} from '#client/app/units.ts';

const fraction: QuantityContext = { kind: 'fraction', chordMm: 200, units: 'mm' };
const length: QuantityContext = { kind: 'length', chordMm: 200, units: 'mm' };
const angle: QuantityContext = { kind: 'angle', chordMm: 200, units: 'mm' };

describe('parseQuantity', () => {
  it.each([
    ['12', 0.12],
    ['57', 0.57],
    ['12+0.4', 0.124],
    ['2*1.1 %', 0.022],
    ['1.5 %', 0.015],
    ['3 mm', 0.015],
    ['0.5 cm', 0.025],
    ['0.25 in', 0.03175],
    ['1/4"', 0.03175],
    ['12 % + 3 mm', 0.135],
  ])('reads %s as the fraction %d of a 200 mm chord', (text, value) => {
    expect(parseQuantity(text, fraction)).toEqual({ value });
  });

  it.each([
    ['220', 220],
    ['22 cm', 220],
    ['10 in', 254],
    ['50 %', 100],
  ])('reads %s as the length %d mm', (text, value) => {
    expect(parseQuantity(text, length)).toEqual({ value });
  });

  it('takes a bare length in the unit of the person', () => {
    expect(parseQuantity('10', { ...length, units: 'inch' })).toEqual({ value: 254 });
  });

  it.each([
    ['2.5', 2.5],
    ['2.5°', 2.5],
    ['0.5 rad', 28.6478897565412],
  ])('reads %s as the angle %d degrees', (text, value) => {
    expect(parseQuantity(text, angle)).toEqual({ value });
  });

  it.each([
    ['', 'Type a number, such as 12, 1.5 % or 3 mm.'],
    ['   ', 'Type a number, such as 12, 1.5 % or 3 mm.'],
    ['12 + 3 mm', 'Write the unit after each number of the sum.'],
    [`${'9'.repeat(50)}*${'9'.repeat(9)}*9`, 'This is too long to be a number.'],
  ])('answers %j with a sentence', (text, error) => {
    expect(parseQuantity(text, fraction)).toEqual({ error });
  });

  it('gives a finite value or a sentence for any text', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[0-9 .,+*/()%minc-]{0,30}$/)), (text) => {
        const read = parseQuantity(text, fraction);
        expect(read.error === undefined ? Number.isFinite(read.value) : read.error.length > 0).toBe(true);
      }),
      { numRuns: 2000 },
    );
  });

  it('reads back what the formats write, to the digits written', () => {
    fc.assert(
      fc.property(fc.integer({ min: -9999, max: 99999 }), (hundredths) => {
        const percent = hundredths / 100;
        expect(parseQuantity(formatPercent(percent / 100), fraction).value).toBeCloseTo(percent / 100, 12);
        expect(parseQuantity(formatLength(percent, 'mm'), length).value).toBeCloseTo(percent, 10);
        expect(parseQuantity(formatLength(percent * 25.4, 'inch'), length).value).toBeCloseTo(
          percent * 25.4,
          8,
        );
        expect(parseQuantity(formatAngle(percent, 2), angle).value).toBeCloseTo(percent, 10);
      }),
    );
  });

  it('gives the same fraction for a length in mm, cm and inch', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 5000, noNaN: true }),
        fc.double({ min: 10, max: 5000, noNaN: true }),
        (mm, chordMm) => {
          const context: QuantityContext = { kind: 'fraction', chordMm, units: 'mm' };
          const of = (text: string) => parseQuantity(text, context).value ?? Number.NaN;
          const expected = Number(mm.toFixed(6)) / chordMm;
          expect(Math.abs(of(`${mm.toFixed(6)} mm`) / expected - 1)).toBeLessThan(1e-12);
          expect(Math.abs(of(`${mm.toFixed(6)} mm / 10 * 10`) / expected - 1)).toBeLessThan(1e-12);
          expect(Math.abs(of(`${mm.toFixed(6)}/25.4 in`) / expected - 1)).toBeLessThan(1e-12);
        },
      ),
    );
  });
});

describe('formats', () => {
  it('write fixed decimals with the unit', () => {
    expect(formatLength(26.4, 'mm')).toBe('26.40 mm');
    expect(formatLength(26.4, 'inch')).toBe('1.039 in');
    expect(formatLength(220, 'mm', 1)).toBe('220.0 mm');
    expect(formatPercent(0.12)).toBe('12.00 %');
    expect(formatAngle(16)).toBe('16.0°');
  });

  it('write no zero with a minus sign', () => {
    expect(formatPercent(-0.000001)).toBe('0.00 %');
    expect(formatLength(-0.001, 'mm')).toBe('0.00 mm');
    expect(formatAngle(-0.04, 0)).toBe('0°');
  });
});
