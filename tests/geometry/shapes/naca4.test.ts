import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type Naca4Shape,
  NACA4_LIMITS,
  designationOf,
  halfThickness,
  meanLine,
  naca4Outline,
  naca4Schema,
  parseDesignation,
  snapToDigits,
  naca4NoseRadius,
  naca4ThicknessOfNose,
  thickestStation,
} from '#geometry/shapes/naca4.ts';
import { radiiOf } from '#geometry/contour/curvature.ts';
import { parameterOf } from '#geometry/shapes/outline.ts';
import { HALF_THICKNESS_0012, SURFACES_2412, SURFACES_4412 } from '#tests/reference/naca4-polynomial.ts';
import { expectDerivatives, expectFinite } from './curves.ts';
import { deepFrozen, naca4, naca4Shapes } from './samples.ts';

const messagesOf = (shape: unknown) =>
  naca4Schema.safeParse(shape).error?.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`) ??
  [];

describe('the 4-digit formulas against computed values, 1e-6', () => {
  test.each(HALF_THICKNESS_0012)('half-thickness of 0012 at %d', (station, open, closed) => {
    expect(Math.abs(halfThickness(naca4('0012', 'open'), station) - open)).toBeLessThan(1e-6);
    expect(Math.abs(halfThickness(naca4('0012', 'closed'), station) - closed)).toBeLessThan(1e-6);
  });

  test.each([
    ['2412', SURFACES_2412],
    ['4412', SURFACES_4412],
  ])('surfaces of %s', (digits, rows) => {
    const { upper, lower } = naca4Outline(naca4(digits));
    for (const [station, xu, yu, xl, yl] of rows) {
      const [u, l] = [upper.at(parameterOf(station)), lower.at(parameterOf(station))];
      for (const difference of [u.x - xu, u.y - yu, l.x - xl, l.y - yl]) {
        expect(Math.abs(difference)).toBeLessThan(1e-6);
      }
    }
  });
});

describe('the outline', () => {
  test('a closed edge ends in exactly one point, an open one in a gap of 0.021 t', () => {
    const closed = naca4Outline(naca4('2412', 'closed'));
    expect([closed.sharp, closed.upper.at(1), closed.lower.at(1)]).toEqual([
      true,
      { x: 1, y: 0 },
      { x: 1, y: 0 },
    ]);
    const open = naca4Outline(naca4('0012', 'open'));
    expect(open.sharp).toBe(false);
    expect(Math.abs(open.upper.at(1).y - open.lower.at(1).y - 0.021 * 0.12)).toBeLessThan(1e-15);
  });

  test('derivatives are those of the curve, on both sides of the camber position', () => {
    for (const shape of [naca4('0012'), naca4('2412', 'open'), naca4('6321')]) {
      const { upper, lower } = naca4Outline(shape);
      for (const surface of [upper, lower])
        expectDerivatives(surface, [0.01, 0.1, 0.2, 0.35, 0.5, 0.6, 0.9, 0.99]);
    }
  });

  test('the camber position is the break; a symmetric section has none', () => {
    expect(naca4Outline(naca4('2412')).upper.breaks).toEqual([parameterOf(0.4)]);
    expect(naca4Outline(naca4('0012')).lower.breaks).toEqual([]);
  });

  test('mean line: the maximum at its position, zero at both ends, one slope from both sides', () => {
    const shape = naca4('4412');
    expect(meanLine(shape, 0.4)).toEqual({ y: expect.closeTo(0.04, 15), slope: 0 });
    expect([meanLine(shape, 0).y, meanLine(shape, 1).y]).toEqual([0, 0]);
    expect(Math.abs(meanLine(shape, 0.4 - 1e-9).slope)).toBeLessThan(1e-8);
    expect(naca4Outline(shape).meanLine(0.4)).toEqual({ x: 0.4, y: expect.closeTo(0.04, 15) });
  });

  test('without camber the surfaces mirror each other and the position does not matter', () => {
    fc.assert(
      fc.property(naca4Shapes, fc.double({ min: 0, max: 1, noNaN: true }), (shape, t) => {
        const { upper, lower } = naca4Outline({ ...shape, maxCamber: 0 });
        expect(lower.at(t)).toEqual({ x: upper.at(t).x, y: expect.closeTo(-upper.at(t).y, 15) });
        const moved = naca4Outline({ ...shape, maxCamber: 0, maxCamberPosition: 0 });
        expect(moved.upper.at(t)).toEqual(upper.at(t));
      }),
    );
  });

  test('half-thickness is proportional to the maximum thickness', () => {
    fc.assert(
      fc.property(naca4Shapes, fc.double({ min: 0, max: 1, noNaN: true }), (shape, station) => {
        const unit = halfThickness({ ...shape, maxThickness: 0.1 }, station) / 0.1;
        expect(Math.abs(halfThickness(shape, station) - unit * shape.maxThickness)).toBeLessThan(1e-15);
      }),
    );
  });

  test('surfaces lie square to the mean line at the construction station', () => {
    fc.assert(
      fc.property(naca4Shapes, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (shape, station) => {
        const { upper, lower } = naca4Outline(shape);
        const [u, l] = [upper.at(parameterOf(station)), lower.at(parameterOf(station))];
        const { slope, y } = meanLine(shape, station);
        expect(Math.abs(u.x - l.x + slope * (u.y - l.y))).toBeLessThan(1e-14);
        expect(Math.abs((u.y + l.y) / 2 - y)).toBeLessThan(1e-14);
        expect(Math.abs((u.x + l.x) / 2 - station)).toBeLessThan(1e-14);
        expect(Math.abs(Math.hypot(u.x - l.x, u.y - l.y) - 2 * halfThickness(shape, station))).toBeLessThan(
          1e-14,
        );
      }),
    );
  });

  test('finite everywhere, and nothing is written on the shape', () => {
    fc.assert(
      fc.property(naca4Shapes, (shape) => {
        const { upper, lower } = naca4Outline(deepFrozen(shape));
        expectFinite(upper);
        expectFinite(lower);
      }),
    );
  });
});

describe('nose and thickest station', () => {
  test('the nose radius is that of the outline, and gives its thickness back', () => {
    for (const maxThickness of [0.01, 0.12, 0.4]) {
      const { noseRadius } = radiiOf(naca4Outline({ ...naca4('0012'), maxThickness }));
      expect(Math.abs(naca4NoseRadius(maxThickness) / noseRadius - 1)).toBeLessThan(1e-12);
      expect(Math.abs(naca4ThicknessOfNose(noseRadius) - maxThickness)).toBeLessThan(1e-12);
    }
    expect(Math.abs(naca4NoseRadius(1) - 1.1019)).toBeLessThan(5e-5);
    expect(naca4ThicknessOfNose(-0.1)).toBe(0);
  });

  test.each(['open', 'closed'] as const)(
    'the thickness falls off on both sides of it, %s',
    (trailingEdge) => {
      const shape = { ...naca4('2412'), trailingEdge };
      const at = thickestStation(shape);
      const largest = halfThickness(shape, at);
      expect(largest).toBeGreaterThan(halfThickness(shape, at - 1e-4));
      expect(largest).toBeGreaterThan(halfThickness(shape, at + 1e-4));
    },
  );
});

describe('designations', () => {
  test.each([
    ['2412', 'NACA 2412'],
    ['NACA 0012', 'NACA 0012'],
    ['naca-4415', 'NACA 4415'],
    ['  naca 6409 ', 'NACA 6409'],
    ['NACA0001', 'NACA 0001'],
  ])('%s is read and written back', (text, designation) => {
    const values = parseDesignation(text);
    expect(values && designationOf({ kind: 'naca4', trailingEdge: 'open', ...values })).toBe(designation);
  });

  test.each(['', '241', '24121', '2012', '0412', '2400', '2441', 'NACA', '23012', '2.4', 'x2412'])(
    '"%s" is none',
    (text) => {
      expect(parseDesignation(text)).toBeNull();
    },
  );

  test('values beside a whole digit have no designation; rounding errors do not matter', () => {
    const shape = naca4('2412');
    expect(designationOf({ ...shape, maxThickness: 0.1201 })).toBeNull();
    expect(designationOf({ ...shape, maxCamberPosition: 0.41 })).toBeNull();
    expect(designationOf({ ...shape, maxCamber: 0.021 })).toBeNull();
    expect(designationOf({ ...shape, maxCamber: 0.1 })).toBeNull();
    expect(designationOf({ ...shape, maxThickness: 0.1 + 0.02 })).toBe('NACA 2412');
    expect(designationOf({ ...shape, maxCamber: 0, maxCamberPosition: 0.37 })).toBe('NACA 0012');
  });

  test('snapping gives the nearest digits, always has a designation and leaves digits alone', () => {
    const shape: Naca4Shape = {
      ...naca4('2412'),
      maxCamber: 0.0234,
      maxCamberPosition: 0.449,
      maxThickness: 0.1251,
    };
    expect(designationOf(snapToDigits(shape))).toBe('NACA 2413');
    fc.assert(
      fc.property(naca4Shapes, (any) => {
        const snapped = snapToDigits(deepFrozen(any));
        expect(designationOf(snapped)).toMatch(/^NACA \d{4}$/);
        expect(snapToDigits(snapped)).toEqual(snapped);
        expect(naca4Schema.safeParse(snapped).success).toBe(true);
        expect(Math.abs(snapped.maxThickness - any.maxThickness)).toBeLessThanOrEqual(0.005 + 1e-12);
      }),
    );
  });
});

describe('what is refused', () => {
  const shape = naca4('2412');

  test('the limits themselves are accepted', () => {
    for (const [field, { min, max }] of Object.entries(NACA4_LIMITS)) {
      expect(messagesOf({ ...shape, [field]: min })).toEqual([]);
      expect(messagesOf({ ...shape, [field]: max })).toEqual([]);
    }
  });

  test.each([
    [{ maxThickness: 0.009 }, 'maxThickness: maxThickness must be between 1 % and 40 % of chord'],
    [{ maxThickness: 0.41 }, 'maxThickness: maxThickness must be between 1 % and 40 % of chord'],
    [{ maxThickness: NaN }, 'maxThickness: maxThickness must be between 1 % and 40 % of chord'],
    [{ maxThickness: undefined }, 'maxThickness: maxThickness must be between 1 % and 40 % of chord'],
    [{ maxCamber: -0.01 }, 'maxCamber: maxCamber must be between 0 % and 12 % of chord'],
    [{ maxCamber: Infinity }, 'maxCamber: maxCamber must be between 0 % and 12 % of chord'],
    [{ maxCamberPosition: 1 }, 'maxCamberPosition: maxCamberPosition must be between 0 % and 90 % of chord'],
    [
      { maxCamberPosition: 0 },
      'maxCamberPosition: maxCamberPosition must be between 10 % and 90 % of chord when there is camber',
    ],
    [{ maxCamberPosition: -1 }, 'maxCamberPosition: maxCamberPosition must be between 0 % and 90 % of chord'],
    [{ trailingEdge: 'cut' }, 'trailingEdge: trailingEdge must be "open" or "closed"'],
  ])('%o', (change, message) => {
    expect(messagesOf({ ...shape, ...change })).toEqual([message]);
  });

  test('without camber the position may be 0', () => {
    expect(messagesOf({ ...shape, maxCamber: 0, maxCamberPosition: 0 })).toEqual([]);
  });
});
