import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cstOutline, ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { parameterOf } from '#geometry/shapes/outline.ts';
import { similarityOf, toChord } from '#geometry/shapes/placement.ts';
import { UNIT_SHAPE } from '#tests/reference/cst-fits.ts';
import { expectDerivatives, expectFinite } from './curves.ts';
import { FREE_FORM, UNIT, cstShapes, deepFrozen } from './samples.ts';

describe('the CST outline', () => {
  test.each(UNIT_SHAPE.map((ordinate, i) => [(i + 1) / 10, ordinate] as const))(
    'the unit shape at %d: 1e-12 of the formula, 5e-7 of the printed digits',
    (station, printed) => {
      const point = cstOutline(UNIT).upper.at(parameterOf(station));
      expect(Math.abs(point.y - Math.sqrt(station) * (1 - station))).toBeLessThan(1e-12);
      expect(Math.abs(point.y - printed)).toBeLessThan(5e-7);
      expect(Math.abs(cstOutline(UNIT).lower.at(parameterOf(station)).y + point.y)).toBeLessThan(1e-15);
    },
  );

  test('nose and trailing edge are met exactly', () => {
    const { upper, lower, sharp } = cstOutline(UNIT);
    expect([sharp, upper.at(0), lower.at(0), upper.at(1), lower.at(1)]).toEqual([
      true,
      { x: 0, y: 0 },
      { x: 0, y: 0 },
      { x: 1, y: 0 },
      { x: 1, y: 0 },
    ]);
    const blunt = cstOutline({ ...UNIT, trailingEdgeGap: 0.01 });
    expect(cstOutline({ ...UNIT, trailingEdgeGap: Number.MIN_VALUE }).sharp).toBe(true);
    expect([blunt.sharp, blunt.upper.at(1).y, blunt.lower.at(1).y]).toEqual([false, 0.005, -0.005]);
  });

  test('derivatives are those of the curve, with placement and any exponents', () => {
    for (const shape of [
      UNIT,
      FREE_FORM,
      { ...FREE_FORM, n1: 0.73, n2: 1.21 },
      { ...FREE_FORM, n1: 1, n2: 0.5 },
    ]) {
      const { upper, lower } = cstOutline(shape);
      for (const surface of [upper, lower]) expectDerivatives(surface, [0.02, 0.1, 0.3, 0.5, 0.7, 0.9, 0.98]);
    }
  });

  test('placement moves the same shape: ordinates in its own frame agree with the formula', () => {
    const frame = similarityOf(FREE_FORM.placement);
    for (const t of [0, 0.2, 0.5, 0.8, 1]) {
      const local = toChord(frame, cstOutline(FREE_FORM).lower.at(t));
      expect(Math.abs(local.y - ordinateAt(FREE_FORM, 'lower', Math.min(1, local.x)))).toBeLessThan(1e-14);
    }
  });

  test('the mean line is half the sum of both surfaces', () => {
    const shape = { ...FREE_FORM, placement: undefined };
    const expected = (ordinateAt(shape, 'upper', 0.3) + ordinateAt(shape, 'lower', 0.3)) / 2;
    expect(cstOutline(shape).meanLine(0.3)).toEqual({ x: 0.3, y: expect.closeTo(expected, 15) });
    expect(cstOutline(UNIT).meanLine(1)).toEqual({ x: 1, y: 0 });
  });

  test('finite everywhere for every exponent, and nothing is written on the shape', () => {
    fc.assert(
      fc.property(cstShapes('any'), (shape) => {
        const { upper, lower } = cstOutline(deepFrozen(shape));
        expectFinite(upper);
        expectFinite(lower);
      }),
    );
  });

  test('twice the weights and gap, twice the ordinates', () => {
    fc.assert(
      fc.property(cstShapes('any'), fc.double({ min: 0, max: 1, noNaN: true }), (shape, x) => {
        const doubled = {
          ...shape,
          upper: shape.upper.map((weight) => 2 * weight),
          trailingEdgeGap: 2 * shape.trailingEdgeGap,
        };
        expect(Math.abs(ordinateAt(doubled, 'upper', x) - 2 * ordinateAt(shape, 'upper', x))).toBeLessThan(
          1e-14,
        );
      }),
    );
  });
});
