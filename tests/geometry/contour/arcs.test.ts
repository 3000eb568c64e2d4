import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { arcContour, arcExtents, largestArcError, type ArcContour } from '#geometry/contour/arcs.ts';
import { sampleToTolerance } from '#geometry/contour/sampling.ts';
import { checkShape, outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { closedForm, distanceToArcs, type BulgeVertex, NACA_2412 } from '../formats/closed-form.ts';

const verticesOf = ({ x, y, bulge }: ArcContour): readonly BulgeVertex[] =>
  Array.from(x, (at, i) => ({ x: at, y: y[i]!, bulge: bulge[i]! }));

const cst = (over: object): Shape =>
  checkShape({
    kind: 'cst',
    upper: [0.17, 0.16, 0.14, 0.16],
    lower: [-0.1, -0.08, -0.12, -0.05],
    n1: 0.5,
    n2: 1,
    trailingEdgeGap: 0.0025,
    ...over,
  });

const SHAPES: readonly (readonly [string, Shape])[] = [
  ['2412, open', NACA_2412],
  ['2412, closed', { ...NACA_2412, trailingEdge: 'closed' }],
  ['a thick symmetrical section', { ...NACA_2412, maxCamber: 0, maxThickness: 0.4 }],
  ['camber far forward', { ...NACA_2412, maxCamber: 0.1, maxCamberPosition: 0.15, maxThickness: 0.08 }],
  ['camber far aft', { ...NACA_2412, maxCamber: 0.1, maxCamberPosition: 0.85, maxThickness: 0.08 }],
  ['a free form, blunt', cst({})],
  ['a free form with a hollow, sharp', cst({ trailingEdgeGap: 0, lower: [-0.1, -0.02, -0.1, 0.12] })],
  ['a wavy free form', cst({ upper: [0.17, 0.3, 0.1, 0.4, 0.05, 0.3, 0.1, 0.16] })],
  ['a nose without radius', cst({ n1: 0.75 })],
  ['a pointed nose and a cusped trailing edge', cst({ n1: 1, n2: 1.5, trailingEdgeGap: 0 })],
  ['a round trailing edge', cst({ n2: 0.5, trailingEdgeGap: 0 })],
];

describe.each(SHAPES)('%s', (_, shape) => {
  const outline = outlineOf(shape);

  test.each([
    [0.01, 220],
    [0.001, 220],
    [0.1, 1000],
  ])('stays within %d mm at a chord of %d mm', (toleranceMm, chordMm) => {
    const tolerance = toleranceMm / chordMm;
    const shortest = 0.001 / chordMm;
    const arcs = arcContour(outline, tolerance, shortest);
    const vertices = verticesOf(arcs);
    let largest = 0;
    for (let i = 0; i <= 1000; i += 1) {
      for (const surface of [outline.upper, outline.lower]) {
        const { x, y } = surface.at(i / 1000);
        largest = Math.max(largest, distanceToArcs([x, y], vertices));
      }
    }
    expect(largest).toBeLessThanOrEqual(tolerance);
    expect(largestArcError(outline, arcs)).toBeLessThanOrEqual(tolerance);
    expect(largestArcError(outline, arcs)).toBeGreaterThanOrEqual(largest * (1 - 1e-4));
    expect(vertices.length).toBeLessThan(0.7 * sampleToTolerance(outline, tolerance).x.length);
  });

  test('has its vertices on the outline, apart from each other, with the ends and the nose among them', () => {
    const shortest = 0.001 / 220;
    const arcs = arcContour(outline, 0.01 / 220, shortest);
    expect(arcs.sharp).toBe(outline.sharp);
    for (let i = 0; i < arcs.x.length; i += 1) {
      const place = arcs.place[i]!;
      const { x, y } = place < 0 ? outline.upper.at(-place) : outline.lower.at(place);
      expect([arcs.x[i], arcs.y[i]]).toEqual([x, y]);
      const next = (i + 1) % arcs.x.length;
      expect(Math.hypot(arcs.x[next]! - arcs.x[i]!, arcs.y[next]! - arcs.y[i]!)).toBeGreaterThanOrEqual(
        shortest,
      );
    }
    expect(arcs.place[0]).toBe(-1);
    expect(arcs.place).toContain(0);
    expect(arcs.place.at(-1) === 1).toBe(!outline.sharp);
    if (!outline.sharp) expect(arcs.bulge.at(-1)).toBe(0);
  });

  test('is the same each time', () => {
    expect(arcContour(outline, 1e-4)).toEqual(arcContour(outlineOf(shape), 1e-4));
  });
});

test('the closed-form 2412 lies within 0.01 mm of its arcs at 220 mm', () => {
  const arcs = arcContour(outlineOf(NACA_2412), 0.01 / 220);
  const vertices = verticesOf(arcs).map(({ x, y, bulge }) => ({ x: 220 * x, y: 220 * y, bulge: bulge! }));
  const errors = closedForm(NACA_2412, 220, 1500).map((point) => distanceToArcs(point, vertices));
  expect(Math.max(...errors)).toBeLessThanOrEqual(0.01);
  expect(Math.max(...errors)).toBeGreaterThan(0.005);
});

test('a round-nosed outline is smooth within 0.001 rad wherever the outline is', () => {
  const { x, y, bulge, place } = arcContour(outlineOf(NACA_2412), 0.01 / 220);
  const heading = (i: number, end: -1 | 1) =>
    Math.atan2(y[i + 1]! - y[i]!, x[i + 1]! - x[i]!) + end * 2 * Math.atan(bulge[i]!);
  for (let i = 1; i < x.length - 1; i += 1) {
    const kink = heading(i, -1) - heading(i - 1, 1);
    expect(Math.abs(Math.sin(kink / 2)), `at ${place[i]}`).toBeLessThanOrEqual(0.55e-3);
  }
});

test('any tolerance is kept on any 4-digit section', () => {
  const anySection = fc.record({
    kind: fc.constant('naca4' as const),
    maxCamber: fc.double({ min: 0, max: 0.09, noNaN: true }),
    maxCamberPosition: fc.double({ min: 0.2, max: 0.8, noNaN: true }),
    maxThickness: fc.double({ min: 0.04, max: 0.3, noNaN: true }),
    trailingEdge: fc.constantFrom('open', 'closed'),
  } as const);
  fc.assert(
    fc.property(anySection, fc.double({ min: -5.5, max: -3, noNaN: true }), (shape, exponent) => {
      const outline = outlineOf(checkShape(shape));
      const tolerance = 10 ** exponent;
      const arcs = arcContour(outline, tolerance);
      const vertices = verticesOf(arcs);
      for (let i = 0; i <= 300; i += 1) {
        for (const surface of [outline.upper, outline.lower]) {
          const { x, y } = surface.at(i / 300);
          expect(distanceToArcs([x, y], vertices)).toBeLessThanOrEqual(tolerance);
        }
      }
    }),
    { numRuns: 40 },
  );
});

test('a tolerance greater than the thickness leaves an outline with area', () => {
  for (const trailingEdge of ['open', 'closed'] as const) {
    const arcs = arcContour(outlineOf({ ...NACA_2412, maxThickness: 0.01, trailingEdge }), 0.1);
    const vertices = verticesOf(arcs);
    const area = vertices.reduce((sum, a, i) => {
      const b = vertices[(i + 1) % vertices.length]!;
      return sum + (a.x * b.y - b.x * a.y) / 2;
    }, 0);
    expect(vertices.length).toBeGreaterThanOrEqual(4);
    expect(area).toBeGreaterThan(0.002);
  }
});

test('the extents are those of the arcs, not of their vertices', () => {
  const outline = outlineOf(NACA_2412);
  const box = arcExtents(arcContour(outline, 1e-4));
  // x_min, y_max and y_min of the open 2412, solved from the polynomial of NACA Report 460.
  expect(Math.abs(box.minX - -0.000078)).toBeLessThanOrEqual(1e-4);
  expect(Math.abs(box.maxY - 0.079217)).toBeLessThanOrEqual(1e-4);
  expect(Math.abs(box.minY - -0.042378)).toBeLessThanOrEqual(1e-4);
  expect(box.maxY).toBeGreaterThan(Math.max(...arcContour(outline, 1e-4).y));
});

test.each([
  [0, 0],
  [-1, 0],
  [0.99e-8, 0],
  [0.101, 0],
  [NaN, 0],
  [Infinity, 0],
  [1e-4, -1],
  [1e-4, 2e-4],
  [1e-4, NaN],
])('a tolerance of %d with a shortest piece of %d is refused', (tolerance, shortest) => {
  expect(() => arcContour(outlineOf(NACA_2412), tolerance, shortest)).toThrow(RangeError);
});
