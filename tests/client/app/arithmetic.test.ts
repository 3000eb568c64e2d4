import { describe, expect, it } from 'vitest';
import { ArithmeticError, evaluate, type UnitTable } from '#client/app/arithmetic.ts';

const units: UnitTable = {
  bareUnit: 'mm',
  factors: new Map([
    ['mm', 1],
    ['cm', 10],
    ['in', 25.4],
  ]),
};
const amount = (text: string) => evaluate(text, units).amount;

describe('evaluate', () => {
  it.each([
    ['12+0.4', 12.4],
    ['2*3+4', 10],
    ['2+3*4', 14],
    ['(2+3)*4', 20],
    ['10-4-3', 3],
    ['24/4/2', 3],
    ['-3 + 5', 2],
    ['2 × 1.5', 3],
    ['9 ÷ 2', 4.5],
    ['5 − 2', 3],
    ['.5 + ,25', 0.75],
    ['1,5', 1.5],
  ])('reads %s without units as %d', (text, value) => {
    expect(evaluate(text, units)).toEqual({ unit: null, amount: value });
  });

  it.each([
    ['3 mm', 3],
    ['2*1.5cm', 30],
    ['1.5cm*2', 30],
    ['(1+2) cm', 30],
    ['1 cm + 2 mm', 12],
    ['2 + 3 mm', 5],
    ['1 in', 25.4],
  ])('reads %s as %d of the base unit', (text, value) => {
    expect(amount(text)).toBe(value);
  });

  it('takes the unit at the end of a fraction for the whole fraction', () => {
    expect(amount('3/8 in')).toBeCloseTo(9.525, 12);
  });

  it('makes a plain number of a length divided by a length', () => {
    expect(evaluate('3 cm / 2 mm', units)).toEqual({ unit: null, amount: 15 });
  });

  it.each([
    ['2 + 3 cm', 'Write the unit after each number of the sum.'],
    ['2 mm * 3 mm', 'Only one side of a product can have a unit.'],
    ['1/0', 'A division by zero has no result.'],
    ['3 furlong', '"furlong" is no unit here. Use mm, cm, in.'],
    ['(1+2', 'A closing bracket is missing.'],
    ['1 +', 'A number is missing.'],
    ['2 3', 'A sign is missing between two numbers.'],
    ['2)', 'This does not read as a sum.'],
    ['12 ?', '"?" cannot be read here.'],
    ['(2 mm) cm', 'A number can have one unit only.'],
    ['1,234', '1,234 can be read in two ways: type 1234 or 1.234.'],
  ])('refuses %s in a sentence', (text, sentence) => {
    expect(() => evaluate(text, units)).toThrow(new ArithmeticError(sentence));
  });
});
