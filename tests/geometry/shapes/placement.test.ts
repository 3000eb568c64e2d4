import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { similarityOf, toChord, toSheet } from '#geometry/shapes/placement.ts';

describe('placement', () => {
  test('without one, chord and sheet are the same', () => {
    expect(toSheet(similarityOf(undefined), 0.3, -0.2)).toEqual({ x: 0.3, y: -0.2 });
  });

  test('a quarter of a right angle, counter-clockwise', () => {
    const frame = similarityOf({ x: 0.1, y: 0.2, rotationDeg: 45, scale: Math.SQRT2 });
    expect(toSheet(frame, 1, 0)).toEqual({ x: expect.closeTo(1.1, 14), y: expect.closeTo(1.2, 14) });
    expect(toSheet(frame, 0, 1)).toEqual({ x: expect.closeTo(-0.9, 14), y: expect.closeTo(1.2, 14) });
  });

  test('back from the sheet to the chord', () => {
    const number = fc.double({ min: -1, max: 1, noNaN: true });
    const placements = fc.record({
      x: number,
      y: number,
      rotationDeg: fc.double({ min: -45, max: 45, noNaN: true }),
      scale: fc.double({ min: 0.5, max: 2, noNaN: true }),
    });
    fc.assert(
      fc.property(placements, number, number, (placement, u, v) => {
        const frame = similarityOf(placement);
        const back = toChord(frame, toSheet(frame, u, v));
        expect(Math.hypot(back.x - u, back.y - v)).toBeLessThan(1e-14);
      }),
    );
  });
});
