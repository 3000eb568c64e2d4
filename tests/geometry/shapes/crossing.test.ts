import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cstCrossing, naca4Fault } from '#geometry/shapes/crossing.ts';
import { type CstShape, cstOutline, raiseOrder } from '#geometry/shapes/cst.ts';
import { ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { type Naca4Shape, naca4Outline } from '#geometry/shapes/naca4.ts';
import { FREE_FORM, UNIT, deepFrozen, naca4 } from './samples.ts';

const thickness = (shape: CstShape, x: number) =>
  ordinateAt(shape, 'upper', x) - ordinateAt(shape, 'lower', x);

/** Both surfaces of the same third-order polynomial, moved apart by `apart`. */
function nearly(apart: number, gap = 0): CstShape {
  return {
    ...UNIT,
    upper: [0.2, -0.1 + apart, -0.1 + apart, 0.2],
    lower: [-0.2, -0.1, -0.1, -0.2],
    trailingEdgeGap: gap,
  };
}

describe('surfaces of a CST shape', () => {
  test('sound shapes do not cross', () => {
    for (const shape of [UNIT, FREE_FORM, raiseOrder(FREE_FORM, 'both', 12)]) {
      expect(cstCrossing(deepFrozen(shape))).toBeNull();
    }
  });

  test('a crossing narrower than any sampling is found', () => {
    // D(x) = (x − c)² − ε as Bernstein weights: negative only within sqrt(ε) of c.
    const narrow = (c: number, epsilon: number): CstShape => ({
      ...UNIT,
      upper: [c * c - epsilon, c * c - c - epsilon, (1 - c) * (1 - c) - epsilon],
      lower: [0, 0, 0],
    });
    for (const c of [0.123456, 0.5, 0.9]) {
      const station = cstCrossing(narrow(c, 1e-12));
      expect(station).not.toBeNull();
      expect(Math.abs((station ?? 0) - c)).toBeLessThan(1e-5);
      expect(cstCrossing(narrow(c, -1e-10))).toBeNull();
    }
  });

  test('surfaces that touch are refused like surfaces that cross', () => {
    const touching: CstShape = { ...UNIT, upper: [0.25, -0.25, 0.25], lower: [0, 0, 0] };
    expect(cstCrossing(touching)).toBeCloseTo(0.5, 6);
    expect(cstCrossing({ ...UNIT, upper: [0.1, 0.1, 0.1], lower: [0.1, 0.1, 0.1] })).not.toBeNull();
    expect(cstCrossing({ ...UNIT, upper: [0, 0, 0], lower: [0, 0, 0] })).not.toBeNull();
  });

  test('at nose and trailing edge', () => {
    expect(cstCrossing({ ...UNIT, upper: [-0.2, 0.3, 0.3], lower: [-0.1, -0.1, -0.1] })).toBe(0);
    expect(cstCrossing({ ...UNIT, upper: [0.2, 0.3, -0.2], lower: [-0.1, -0.1, -0.1] })).toBe(1);
    expect(cstCrossing({ ...UNIT, upper: [0, 0.3, 0], lower: [0, -0.1, 0] })).toBeNull();
  });

  test('a gap can keep surfaces apart that would cross, and not if it is too small', () => {
    const tail = { ...UNIT, upper: [0.2, 0.2, -0.02], lower: [-0.2, -0.1, 0] };
    expect(cstCrossing(tail)).toBe(1);
    expect(cstCrossing({ ...tail, trailingEdgeGap: 0.03 })).toBeNull();
    const waist = { ...UNIT, upper: [0.2, -0.4, 0.2], lower: [-0.1, 0, -0.1] };
    expect(cstCrossing({ ...waist, trailingEdgeGap: 0.001 })).not.toBeNull();
    expect(cstCrossing({ ...UNIT, upper: [0, 0, 0], lower: [0, 0, 0], trailingEdgeGap: 0.01 })).toBeNull();
  });

  test('agrees with dense sampling wherever that can tell', () => {
    const weights = fc.array(fc.double({ min: -0.3, max: 0.5, noNaN: true }), { minLength: 3, maxLength: 9 });
    const gaps = fc.constantFrom(0, 0.002, 0.02);
    const exponents = fc.double({ min: 0.5, max: 1, noNaN: true });
    fc.assert(
      fc.property(weights, weights, gaps, exponents, (upper, other, trailingEdgeGap, n1) => {
        const shape: CstShape = {
          ...UNIT,
          upper,
          lower: other.map((w) => -w),
          trailingEdgeGap,
          n1,
          n2: n1 + 0.3,
        };
        let least = Infinity;
        for (let i = 1; i < 1000; i++) least = Math.min(least, thickness(shape, i / 1000));
        const station = cstCrossing(shape);
        if (least < 0) expect(station).not.toBeNull();
        if (station !== null && station > 0 && station < 1)
          expect(thickness(shape, station)).toBeLessThan(1e-9);
        expect(least < -1e-9 && station === null).toBe(false);
      }),
      { numRuns: 300 },
    );
  });

  test('apart by a hair is sound, touching by a hair is not', () => {
    expect(cstCrossing(nearly(1e-3, 0.001))).toBeNull();
    expect(cstCrossing(nearly(-0.3))).not.toBeNull();
    expect(cstOutline(nearly(1e-3)).sharp).toBe(true);
  });
});

describe('4-digit outlines', () => {
  const bent = (maxCamber: number, maxCamberPosition: number, maxThickness: number): Naca4Shape => {
    return { kind: 'naca4', maxCamber, maxCamberPosition, maxThickness, trailingEdge: 'open' };
  };

  test('ordinary sections are sound', () => {
    for (const digits of ['0012', '2412', '6412', '9215', '9730', '0040']) {
      expect(naca4Fault(deepFrozen(naca4(digits)))).toBeNull();
    }
  });

  test('a thick section with much camber far forward or aft folds back on its lower side', () => {
    for (const shape of [bent(0.12, 0.1, 0.4), bent(0.12, 0.9, 0.4)]) {
      expect(naca4Fault(shape)).toBe('folds');
      const stations = Array.from({ length: 400 }, (_, i) => naca4Outline(shape).lower.at(i / 399).x);
      expect(stations.some((x, i) => i > 0 && x < stations[i - 1]!)).toBe(true);
    }
  });

  test('what is accepted has monotone stations on the lower side', () => {
    const values = fc.tuple(
      fc.double({ min: 0.01, max: 0.12, noNaN: true }),
      fc.double({ min: 0.1, max: 0.9, noNaN: true }),
      fc.double({ min: 0.1, max: 0.4, noNaN: true }),
    );
    fc.assert(
      fc.property(values, ([m, p, t]) => {
        const shape = bent(m, p, t);
        fc.pre(naca4Fault(shape) === null);
        const { lower } = naca4Outline(shape);
        for (let i = 1; i < 150; i++) expect(lower.at(i / 149).x).toBeGreaterThan(lower.at((i - 1) / 149).x);
      }),
    );
  });
});
