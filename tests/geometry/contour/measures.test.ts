import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { camberAt, extentsOf, measure, thicknessAt } from '#geometry/contour/measures.ts';
import { cstOutline } from '#geometry/shapes/cst.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import {
  NOSE_RADIUS_PERCENT,
  OPEN_EDGE_PERCENT,
  SECTION_PROPERTIES,
} from '#tests/reference/naca4-properties.ts';
import { FREE_FORM, UNIT, cstShapes, deepFrozen, naca4, shapes } from '#tests/geometry/shapes/samples.ts';

const radians = (deg: number) => (deg * Math.PI) / 180;

/** Every number in a value, however deep. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : [];
}

describe('measures against computed section properties, 1e-6', () => {
  test.each(SECTION_PROPERTIES)('$digits, $edge edge', (expected) => {
    const found = measure(naca4Outline(naca4(expected.digits, expected.edge)));
    const pairs = [
      [found.perimeter, expected.perimeter],
      [found.area, expected.area],
      [found.centroid.x, expected.centroidX],
      [found.centroid.y, expected.centroidY],
      [found.extents.minX, expected.minX],
      [found.extents.maxY, expected.maxY],
      [found.extents.minY, expected.minY],
    ] as const;
    for (const [value, reference] of pairs) expect(Math.abs(value - reference)).toBeLessThan(1e-6);
  });

  test.each(NOSE_RADIUS_PERCENT)('nose radius at %d %% thickness', (thickness, radius) => {
    const outline = naca4Outline({ ...naca4('0012'), maxThickness: thickness / 100 });
    expect(Math.abs(measure(outline).noseRadius * 100 - radius)).toBeLessThan(0.005);
  });

  test.each(OPEN_EDGE_PERCENT)('open trailing edge at %d %% thickness', (thickness, gap) => {
    const outline = naca4Outline({ ...naca4('0012', 'open'), maxThickness: thickness / 100 });
    expect(Math.abs(measure(outline).trailingEdgeGap * 100 - gap)).toBeLessThan(1e-10);
  });
});

describe('trailing edge', () => {
  test('angle of a symmetric 4-digit section: twice atan(1.21125 t) closed, twice atan(1.16925 t) open', () => {
    for (const [edge, slope] of [
      ['closed', 1.21125],
      ['open', 1.16925],
    ] as const) {
      const { trailingEdgeAngleDeg } = measure(naca4Outline(naca4('0012', edge)));
      expect(Math.abs(radians(trailingEdgeAngleDeg) - 2 * Math.atan(slope * 0.12))).toBeLessThan(1e-12);
    }
  });

  test('angle of a free form is the sum of both boat-tail angles, whatever its placement', () => {
    const angle = Math.atan(0.25 - 0.002) + Math.atan(-0.02 - 0.002);
    const found = measure(cstOutline(FREE_FORM));
    expect(Math.abs(radians(found.trailingEdgeAngleDeg) - angle)).toBeLessThan(1e-12);
    expect(found.trailingEdgeGap).toBeCloseTo(0.004 * 1.0005, 14);
    expect(measure(cstOutline(UNIT)).trailingEdgeAngleDeg).toBeCloseTo(90, 12);
    expect(measure(cstOutline({ ...UNIT, n2: 0.5 })).trailingEdgeAngleDeg).toBeCloseTo(180, 12);
  });
});

describe('extents', () => {
  test('enclose every point of the outline and are reached', () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const outline = outlineOf(shape);
        const box = extentsOf(outline);
        const points = Array.from({ length: 800 }, (_, i) => i / 799).flatMap((t) => [
          outline.upper.at(t),
          outline.lower.at(t),
        ]);
        const reached = { minX: Infinity, maxX: -Infinity, minY: Infinity, maxY: -Infinity };
        for (const { x, y } of points) {
          reached.minX = Math.min(reached.minX, x);
          reached.maxX = Math.max(reached.maxX, x);
          reached.minY = Math.min(reached.minY, y);
          reached.maxY = Math.max(reached.maxY, y);
        }
        for (const key of ['minX', 'minY'] as const) expect(reached[key] - box[key]).toBeGreaterThan(-1e-14);
        for (const key of ['maxX', 'maxY'] as const) expect(box[key] - reached[key]).toBeGreaterThan(-1e-14);
        for (const key of ['minX', 'maxX', 'minY', 'maxY'] as const) {
          expect(Math.abs(reached[key] - box[key])).toBeLessThan(2e-5);
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe('all measures', () => {
  test('are finite for every shape with any exponents, and nothing is written on the shape', () => {
    fc.assert(
      fc.property(fc.oneof(shapes, cstShapes('any')), (shape) => {
        expect(numbersIn(measure(outlineOf(deepFrozen(shape)))).every(Number.isFinite)).toBe(true);
      }),
    );
  });

  test('agree with thickness and camber at the stated stations', () => {
    const outline = naca4Outline(naca4('4415'));
    const found = measure(outline);
    expect(thicknessAt(outline, found.maxThicknessPosition)).toBeCloseTo(found.maxThickness, 12);
    expect(camberAt(outline, found.maxCamberPosition)).toBeCloseTo(found.maxCamber, 12);
  });

  test('a section turned over has the same measures, mirrored', () => {
    fc.assert(
      fc.property(cstShapes(), (shape) => {
        const [upper, lower] = [shape.lower.map((w) => -w), shape.upper.map((w) => -w)];
        const [a, b] = [measure(cstOutline(shape)), measure(cstOutline({ ...shape, upper, lower }))];
        for (const key of [
          'area',
          'perimeter',
          'maxThickness',
          'trailingEdgeAngleDeg',
          'ixx',
          'iyy',
        ] as const) {
          expect(Math.abs(a[key] - b[key])).toBeLessThan(1e-10);
        }
        expect(Math.abs(a.centroid.y + b.centroid.y)).toBeLessThan(1e-12);
        expect(Math.abs(a.ixy + b.ixy)).toBeLessThan(1e-12);
        expect(Math.abs(a.extents.maxY + b.extents.minY)).toBeLessThan(1e-14);
      }),
    );
  });
});
