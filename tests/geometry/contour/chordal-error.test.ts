import { describe, expect, test } from 'vitest';
import { largestChordalError } from '#geometry/contour/chordal-error.ts';
import { contourAt } from '#geometry/contour/contour.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { type Outline, type SurfaceCurve } from '#geometry/shapes/outline.ts';
import { FREE_FORM, UNIT, naca4 } from '#tests/geometry/shapes/samples.ts';

/** An arc of a circle of radius 1 as a surface, from (0, 0) to (2 sin 0.5, 0) and its mirror image. */
function circleArc(side: 1 | -1): SurfaceCurve {
  const angle = (t: number) => t - 0.5;
  return {
    breaks: [],
    at: (t) => ({ x: Math.sin(angle(t)) + Math.sin(0.5), y: side * (Math.cos(angle(t)) - Math.cos(0.5)) }),
    derivatives: () => {
      throw new Error('not needed');
    },
  };
}

const lens: Outline = {
  upper: circleArc(1),
  lower: circleArc(-1),
  sharp: true,
  meanLine: (x) => ({ x, y: 0 }),
};

describe('the largest chordal error', () => {
  test('of a circle in equal segments is its sagitta 1 − cos(θ/2)', () => {
    for (const count of [3, 5, 21]) {
      const parameters = Array.from({ length: count }, (_, i) => i / (count - 1));
      const sagitta = 1 - Math.cos(1 / (count - 1) / 2);
      expect(
        Math.abs(largestChordalError(lens, contourAt(lens, parameters, parameters)) / sagitta - 1),
      ).toBeLessThan(1e-6);
    }
  });

  test('of unequal segments is that of the longest, on either side', () => {
    const equal = [0, 0.2, 0.4, 0.6, 0.8, 1];
    const gap = [0, 0.2, 0.6, 0.8, 1];
    const sagitta = 1 - Math.cos(0.2);
    for (const [upper, lower] of [
      [equal, gap],
      [gap, equal],
    ] as const) {
      expect(Math.abs(largestChordalError(lens, contourAt(lens, upper, lower)) / sagitta - 1)).toBeLessThan(
        1e-6,
      );
    }
  });

  test('falls by four when the points double', () => {
    for (const outline of [naca4Outline(naca4('2412', 'open')), cstOutline(UNIT), cstOutline(FREE_FORM)]) {
      const ratio =
        largestChordalError(outline, sampleCosine(outline, 101)) /
        largestChordalError(outline, sampleCosine(outline, 201));
      expect(ratio).toBeGreaterThan(3.8);
      expect(ratio).toBeLessThan(4.2);
    }
  });

  test('sees a contour that was moved off the outline', () => {
    const outline = cstOutline(UNIT);
    const contour = sampleCosine(outline, 400);
    const moved = { ...contour, y: contour.y.map((y) => y + 0.001) };
    expect(Math.abs(largestChordalError(outline, moved) - 0.001)).toBeLessThan(5e-5);
  });

  test('is a number when two vertices coincide', () => {
    const outline = cstOutline(UNIT);
    const { x, y, noseIndex, sharp } = sampleCosine(outline, 40);
    const twice = (values: Float64Array) => Float64Array.from([...values.slice(0, 6), ...values.slice(5)]);
    const doubled = { x: twice(x), y: twice(y), noseIndex: noseIndex + 1, sharp };
    expect(largestChordalError(outline, doubled)).toBe(
      largestChordalError(outline, { x, y, noseIndex, sharp }),
    );
  });
});
