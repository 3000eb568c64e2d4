import { describe, expect, test } from 'vitest';
import * as cst from '#geometry/shapes/cst.ts';
import { ordinateAt } from '#geometry/shapes/cst-outline.ts';
import { FREE_FORM } from './samples.ts';

describe('the door to the free-form section', () => {
  test('a handle is dragged, the order raised and lowered again, and the shape is still the one dragged', () => {
    const plain = cst.cstSchema.parse({ ...FREE_FORM, placement: undefined });
    const pointer = { x: cst.weightStation(plain, 'upper', 2), y: 0.12 };
    const dragged = cst.weightThrough(plain, 'upper', 2, pointer);
    const { shape, residual } = cst.lowerOrder(cst.raiseOrder(dragged, 'upper', 8), 'upper', 6);
    expect(residual).toBeLessThan(1e-13);
    expect(Math.abs(ordinateAt(shape, 'upper', pointer.x) - 0.12)).toBeLessThan(1e-12);
    expect(cst.cstOutline(shape).sharp).toBe(false);
    expect(cst.noseRadiusOf(cst.withNoseRadius(shape, 'upper', 0.02), 'upper')).toBeCloseTo(0.02, 14);
  });
});
