import { describe, expect, test } from 'vitest';
import { loopOf, nearestOn, onChord, outwardNormal, trueChordOf } from '#geometry/contour/loop.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { FREE_FORM, UNIT, naca4 } from '#tests/geometry/shapes/samples.ts';

const outline = outlineOf(naca4('4412'));
const loop = loopOf(outline);

test('the loop runs from the lower trailing edge over the nose to the upper, smoothly', () => {
  expect(loop(-0.3)).toMatchObject(outline.lower.at(0.3));
  expect(loop(0.3)).toMatchObject(outline.upper.at(0.3));
  const h = 1e-6;
  for (const w of [-0.7, -0.2, 0.2, 0.7]) {
    expect(Math.abs((loop(w + h).x - loop(w - h).x) / (2 * h) - loop(w).dx)).toBeLessThan(1e-7);
    expect(Math.abs((loop(w + h).y - loop(w - h).y) / (2 * h) - loop(w).dy)).toBeLessThan(1e-7);
  }
});

describe('the longest chord', () => {
  test('of a cambered section lies ahead and aslant, of a symmetric one on the sheet’s', () => {
    const chord = trueChordOf(outline);
    // Computed independently for 4412: nose and slope.
    expect(Math.abs(chord.nose.x + 0.0003)).toBeLessThan(1e-6);
    expect(Math.abs(chord.nose.y - 0.003086)).toBeLessThan(1e-6);
    expect(Math.abs(chord.rotationDeg + 0.1768)).toBeLessThan(1e-4);
    expect(trueChordOf(outlineOf(naca4('0012')))).toMatchObject({
      nose: { x: 0, y: 0 },
      scale: 1,
      rotationDeg: 0,
    });
  });

  test('nose and trailing edge are its ends, and no point is farther', () => {
    const chord = trueChordOf(outline);
    const [nose, edge] = [onChord(chord, chord.nose), onChord(chord, outline.upper.at(1))];
    expect(Math.hypot(nose.x, nose.y)).toBeLessThan(1e-15);
    expect(Math.hypot(edge.x - 1, edge.y)).toBeLessThan(1e-15);
    for (let w = -1; w <= 1; w += 0.01) {
      const point = onChord(chord, loop(w));
      expect(Math.hypot(point.x - 1, point.y)).toBeLessThan(1 + 1e-12);
    }
  });
});

test('the nearest point is found from either side, at an end too', () => {
  for (const w of [-0.8, -0.05, 0.05, 0.6]) {
    const [at, normal] = [loop(w), outwardNormal(loop, w)];
    for (const height of [-1e-3, 0, 2e-3]) {
      const found = nearestOn(loop, { x: at.x + height * normal.x, y: at.y + height * normal.y }, w + 0.02);
      expect(Math.abs(found.w - w)).toBeLessThan(1e-6);
      expect(Math.abs(found.distance - Math.abs(height))).toBeLessThan(1e-12);
    }
  }
  expect(nearestOn(loop, { x: 1.5, y: 0 }, 0.9).w).toBeCloseTo(1, 12);
});

test('normals have unit length and point out of the section, at nose and trailing edge as well', () => {
  for (const curve of [loop, loopOf(cstOutline(FREE_FORM)), loopOf(cstOutline(UNIT))]) {
    for (const w of [-1, -0.5, 0, 0.5, 1]) {
      const normal = outwardNormal(curve, w);
      expect(Math.abs(Math.hypot(normal.x, normal.y) - 1)).toBeLessThan(1e-14);
      expect(Math.sign(w) * normal.y).toBeGreaterThanOrEqual(0);
    }
    expect(outwardNormal(curve, 0).x).toBeLessThan(-0.9);
  }
  const pointed = loopOf(cstOutline({ ...UNIT, n1: 1, upper: [0, 0, 0.1], lower: [0, 0, -0.1] }));
  expect(Number.isFinite(outwardNormal(pointed, 0).x)).toBe(true);
});
