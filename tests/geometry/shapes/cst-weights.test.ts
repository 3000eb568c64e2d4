import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  boatTailAngleDegOf,
  noseRadiusOf,
  weightInfluence,
  weightStation,
  weightThrough,
  withBoatTailAngleDeg,
  withEqualNoseRadius,
  withNoseRadius,
  withWeight,
} from '#geometry/shapes/cst-weights.ts';
import { cstOutline, ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { similarityOf, toChord, toSheet } from '#geometry/shapes/placement.ts';
import { FREE_FORM, UNIT, cstShapes, deepFrozen } from './samples.ts';

const surfaces = ['upper', 'lower'] as const;

function refusal(action: () => unknown): string[] {
  try {
    action();
  } catch (error) {
    if (error instanceof ShapeError) return error.issues.map((issue) => issue.path);
    throw error;
  }
  return [];
}

describe('nose radius', () => {
  test('A₀ = 0.2 is a radius of 0.02', () => {
    expect(noseRadiusOf(withWeight(UNIT, 'upper', 0, 0.2), 'upper')).toBeCloseTo(0.02, 15);
    expect(noseRadiusOf(UNIT, 'lower')).toBe(0.5);
  });

  test('what is set is read, on the surfaces it is set for', () => {
    const shape = withNoseRadius(deepFrozen(FREE_FORM), 'both', 0.0123);
    for (const surface of surfaces) expect(noseRadiusOf(shape, surface)).toBeCloseTo(0.0123, 15);
    expect([shape.upper[0]! > 0, shape.lower[0]! < 0]).toEqual([true, true]);
    expect(withNoseRadius(FREE_FORM, 'upper', 0.01).lower).toBe(FREE_FORM.lower);
  });

  test('it is the curvature radius of the outline at the nose', () => {
    const plain = { ...FREE_FORM, placement: undefined };
    for (const surface of surfaces) {
      const { dx, dy, ddx, ddy } = cstOutline(plain)[surface].derivatives(0);
      const radius = Math.hypot(dx, dy) ** 3 / Math.abs(dx * ddy - dy * ddx);
      expect(Math.abs(radius - noseRadiusOf(plain, surface))).toBeLessThan(1e-14);
    }
  });

  test('equal on both sides on request', () => {
    const shape = withEqualNoseRadius(deepFrozen(FREE_FORM));
    expect(shape.lower[0]).toBe(-FREE_FORM.upper[0]!);
    expect(noseRadiusOf(shape, 'lower')).toBe(noseRadiusOf(shape, 'upper'));
  });

  test('a pointed nose has radius 0 and cannot be given another', () => {
    expect(noseRadiusOf({ ...FREE_FORM, n1: 0.75 }, 'upper')).toBe(0);
    expect(refusal(() => withNoseRadius({ ...FREE_FORM, n1: 0.75 }, 'upper', 0.01))).toEqual(['n1']);
    for (const radius of [-0.1, NaN, Infinity]) {
      expect(refusal(() => withNoseRadius(FREE_FORM, 'upper', radius))).toEqual(['noseRadius']);
    }
  });
});

describe('boat-tail angle', () => {
  test('the unit shape closes at 45° on both sides', () => {
    for (const surface of surfaces) expect(boatTailAngleDegOf(UNIT, surface)).toBeCloseTo(45, 13);
  });

  test('what is set is read, and is the slope of the outline at the trailing edge', () => {
    fc.assert(
      fc.property(cstShapes(), fc.double({ min: -40, max: 60, noNaN: true }), (shape, deg) => {
        const set = withBoatTailAngleDeg(deepFrozen(shape), 'both', deg);
        for (const surface of surfaces) {
          expect(Math.abs(boatTailAngleDegOf(set, surface) - deg)).toBeLessThan(1e-11);
          const { ddx, ddy } = cstOutline(set)[surface].derivatives(1);
          const falls = (surface === 'upper' ? -1 : 1) * (ddy / ddx);
          expect(Math.abs((Math.atan(falls) * 180) / Math.PI - deg)).toBeLessThan(1e-9);
        }
      }),
    );
  });

  test('other exponents: a cusp leaves along the wedge of the gap, a rounded end square to the chord', () => {
    const cusp = { ...FREE_FORM, n2: 1.5, trailingEdgeGap: 0.02 };
    expect(boatTailAngleDegOf(cusp, 'upper')).toBeCloseTo((-Math.atan(0.01) * 180) / Math.PI, 13);
    expect(boatTailAngleDegOf({ ...FREE_FORM, n2: 0.5 }, 'upper')).toBe(90);
    expect(boatTailAngleDegOf({ ...UNIT, n2: 0.5, upper: [1, 1, 0] }, 'upper')).toBeCloseTo(0, 15);
    expect(refusal(() => withBoatTailAngleDeg(cusp, 'upper', 5))).toEqual(['n2']);
    for (const deg of [90, -90, NaN]) {
      expect(refusal(() => withBoatTailAngleDeg(FREE_FORM, 'lower', deg))).toEqual(['boatTailAngleDeg']);
    }
  });
});

describe('one handle a weight', () => {
  test('its station is where its influence is largest, away from both ends', () => {
    fc.assert(
      fc.property(cstShapes('any'), fc.nat(), fc.constantFrom(...surfaces), (shape, pick, surface) => {
        const index = pick % shape[surface].length;
        const station = weightStation(shape, surface, index);
        const most = weightInfluence(shape, surface, index, station);
        expect(station).toBeGreaterThan(0.03);
        expect(station).toBeLessThan(0.97);
        for (const beside of [station - 0.01, station + 0.01]) {
          expect(weightInfluence(shape, surface, index, beside)).toBeLessThan(most);
        }
      }),
    );
  });

  test('influence is the change of the ordinate', () => {
    const raised = withWeight(FREE_FORM, 'upper', 2, FREE_FORM.upper[2]! + 1);
    const change = ordinateAt(raised, 'upper', 0.3) - ordinateAt(FREE_FORM, 'upper', 0.3);
    expect(Math.abs(change - weightInfluence(FREE_FORM, 'upper', 2, 0.3))).toBeLessThan(1e-15);
  });

  test('the surface passes through the pointer within 1e-12, only that weight changes', () => {
    const pointers = fc.record({
      shape: cstShapes('any'),
      pick: fc.nat(),
      surface: fc.constantFrom(...surfaces),
      y: fc.double({ min: -0.3, max: 0.3, noNaN: true }),
      off: fc.double({ min: -0.02, max: 0.02, noNaN: true }),
      rotationDeg: fc.double({ min: -5, max: 5, noNaN: true }),
    });
    fc.assert(
      fc.property(pointers, ({ shape, pick, surface, y, off, rotationDeg }) => {
        const placed = { ...shape, placement: { x: 0.01, y: -0.02, rotationDeg, scale: 1.01 } };
        const index = pick % shape[surface].length;
        const frame = similarityOf(placed.placement);
        const pointer = toSheet(frame, weightStation(shape, surface, index) + off, y);
        const moved = weightThrough(deepFrozen(placed), surface, index, pointer);
        const local = toChord(frame, pointer);
        expect(Math.abs(ordinateAt(moved, surface, local.x) - local.y)).toBeLessThan(1e-12);
        const kept = moved[surface].filter((weight, i) => weight === placed[surface][i] || i === index);
        expect(kept).toHaveLength(placed[surface].length);
      }),
    );
  });

  test('a pointer beyond the ends, too near to them or not finite is refused', () => {
    const shape = { ...UNIT, upper: new Array<number>(13).fill(0.2) };
    for (const point of [
      { x: 0, y: 0.1 },
      { x: 1, y: 0.1 },
      { x: -0.2, y: 0.1 },
      { x: NaN, y: 0.1 },
      { x: 0.5, y: Infinity },
      { x: 0.999, y: 0.1 },
    ]) {
      expect(refusal(() => weightThrough(shape, 'upper', 0, point))).toEqual(['point']);
    }
  });

  test('a weight that is not there is refused by name', () => {
    expect(refusal(() => weightStation(UNIT, 'lower', 3))).toEqual(['lower.3']);
    expect(refusal(() => withWeight(UNIT, 'upper', -1, 0))).toEqual(['upper.-1']);
    expect(refusal(() => weightThrough(UNIT, 'upper', 1.5, { x: 0.5, y: 0 }))).toEqual(['upper.1.5']);
  });
});
