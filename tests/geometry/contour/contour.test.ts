import { describe, expect, test } from 'vitest';
import { type Contour, contourAt, contourPoints, extents, scaleContour } from '#geometry/contour/contour.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

const square: Contour = {
  x: Float64Array.of(1, 0, -0.5, 1),
  y: Float64Array.of(0.25, 1, 0, -0.25),
  noseIndex: 2,
  sharp: false,
};

describe('contour', () => {
  test('points in order', () => {
    expect(contourPoints(square)[2]).toEqual({ x: -0.5, y: 0 });
    expect(contourPoints(square)).toHaveLength(4);
  });

  test('the box around the points', () => {
    expect(extents(square)).toEqual({ minX: -0.5, maxX: 1, minY: -0.25, maxY: 1 });
  });

  test('scaling makes a new contour and leaves the old one', () => {
    const scaled = scaleContour(square, 200);
    expect(extents(scaled)).toEqual({ minX: -100, maxX: 200, minY: -50, maxY: 200 });
    expect([scaled.noseIndex, scaled.sharp, square.x[0]]).toEqual([2, false, 1]);
    for (const factor of [0, -1, NaN, Infinity])
      expect(() => scaleContour(square, factor)).toThrow(RangeError);
  });

  test('runs from the upper trailing edge round the nose; a sharp edge stands once, a blunt one twice', () => {
    const parameters = [0, 0.5, 1];
    const sharp = contourAt(naca4Outline(naca4('0012', 'closed')), parameters, parameters);
    expect([[...sharp.x], sharp.noseIndex, sharp.sharp]).toEqual([
      [1, expect.closeTo(0.5, 15), 0, expect.closeTo(0.5, 15)],
      2,
      true,
    ]);
    expect([sharp.y[1]! > 0, sharp.y[3]! < 0]).toEqual([true, true]);
    const blunt = contourAt(naca4Outline(naca4('0012', 'open')), parameters, parameters);
    expect([blunt.x.length, blunt.y[4]! < 0, blunt.y[0]]).toEqual([5, true, -blunt.y[4]!]);
  });
});
