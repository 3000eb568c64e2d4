import { describe, expect, test } from 'vitest';
import { exportFile, parseExportOptions } from '#geometry/formats/export.ts';
import { readDxfOutline } from '#geometry/imports/dxf-outline.ts';
import { type Point } from '#geometry/point.ts';
import { measuredOutline } from '#geometry/shapes/measured.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { MARSH } from '#tests/geometry/formats/identity-example.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';
import { OPEN, SHARP, bytesOf, dxf, largestShift, lightPolyline, pointsOf, refusalOf } from './files.ts';

const read = (...arguments_: Parameters<typeof dxf>) => readDxfOutline(bytesOf(dxf(...arguments_)));
const mm = SHARP.map(({ x, y }) => ({ x: 250 * x, y: 250 * y }));
const line = (a: Point, b: Point, layer = 'OUTLINE') => [
  0,
  'LINE',
  8,
  layer,
  10,
  a.x,
  20,
  a.y,
  11,
  b.x,
  21,
  b.y,
];
const lines = (points: readonly Point[], layer = 'OUTLINE') =>
  points.slice(1).map((point, i) => line(points[i]!, point, layer));

describe('outlines of a drawing', () => {
  test('a closed polyline of either kind', () => {
    const light = read([lightPolyline(mm.slice(0, -1), true)]);
    expect(largestShift(light, SHARP)).toBeLessThan(1e-14);
    expect([light.name, light.sourceChordMm, light.repairs]).toEqual([
      null,
      250,
      ['scaled from 250 mm chord'],
    ]);
    const vertices = mm.flatMap(({ x, y }) => [0, 'VERTEX', 8, 'P', 10, x, 20, y, 30, 0]);
    const old = read([[0, 'POLYLINE', 8, 'P', 66, 1, 70, 0, ...vertices, 0, 'SEQEND']]);
    expect(largestShift(old, SHARP)).toBeLessThan(1e-14);
  });

  test('lines in any order and direction, the trailing-edge face among them', () => {
    const sides = lines([...OPEN, OPEN[0]!]);
    const shuffled = sides.map((_, i) => sides[(i * 7) % sides.length]!);
    const turned = shuffled.map((side, i) => (i % 2 ? line({ x: +side[9]!, y: +side[11]! }, { x: +side[5]!, y: +side[7]! }) : side));
    expect(largestShift(read(turned), OPEN)).toBeLessThan(1e-4);
  }); // prettier-ignore

  test('an open polyline, and surfaces on layers of their own', () => {
    expect(largestShift(read([lightPolyline(OPEN, false)]), OPEN)).toBeLessThan(1e-14);
    const surfaces = read([...lines(SHARP.slice(0, 20), 'UPPER'), ...lines(SHARP.slice(19), 'LOWER')]);
    expect(largestShift(surfaces, SHARP)).toBeLessThan(1e-14);
  });

  test('the unit of the drawing counts', () => {
    const inches = SHARP.slice(0, -1).map(({ x, y }) => ({ x: 10 * x, y: 10 * y }));
    expect(read([lightPolyline(inches, true)], ['9', '$INSUNITS', '70', '1']).sourceChordMm).toBe(254);
    expect(read([lightPolyline(inches, true)], ['9', '$INSUNITS', '70', '5']).sourceChordMm).toBe(100);
    expect(read([lightPolyline(inches, true)]).sourceChordMm).toBe(10);
  });

  test('chord line, camber line and text beside the outline are passed over', () => {
    const contour = read([
      lightPolyline(mm.slice(0, -1), true),
      line({ x: 0, y: 0 }, { x: 250, y: 0 }, 'CHORD'),
      [0, 'TEXT', 8, 'TEXT', 10, 0, 20, 0, 1, 'Marsh'],
    ]);
    expect(contour.repairs).toEqual([
      'passed over 1 other entity (TEXT)',
      'passed over 1 open line beside the outline',
      'scaled from 250 mm chord',
    ]);
  });

  test('lines and arcs: a straight lower side under a round nose', () => {
    // Nose: a quarter circle of radius 20 from (0, 20) down to (20, 0); the top an arc to the edge at (250, 0).
    const top = { x: 250 - 0, y: 0 };
    const contour = read([
      [0, 'ARC', 8, '0', 10, 20, 20, 20, 40, 20, 50, 180, 51, 270],
      line({ x: 20, y: 0 }, top, '0'),
      [0, 'LWPOLYLINE', 8, '0', 70, 0, 10, 250, 20, 0, 42, 0.15, 10, 0, 20, 20],
    ]);
    expect(contour.repairs).toContain('divided 1 long straight line into short pieces');
    expect(contour.repairs.at(-1)).toMatch(/^scaled from 25\d(\.\d+)? mm chord$/);
    expect(contour.x.length).toBeGreaterThan(100);
  });

  test('a cubic B-spline through its control points follows the curve it stands for', () => {
    // A Bézier cubic for each surface: nose at the origin, edge at 100.
    const knots = [0, 0, 0, 0, 1, 1, 1, 1].flatMap((knot) => [40, knot]);
    const surface = (side: number) => [0, 'SPLINE', 8, '0', 70, 8, 71, 3, ...knots, ...[[0, 0], [0, 12 * side], [50, 12 * side], [100, 0]].flatMap(([x, y]) => [10, x!, 20, y!])];
    const contour = read([surface(1), surface(-1)]);
    const outline = measuredOutline({ kind: 'measured', x: contour.x, y: contour.y });
    for (const u of [0.2, 0.5, 0.8]) {
      const x = (3 * u * u * (1 - u) * 50 + u ** 3 * 100) / 100;
      const y = (3 * u * (1 - u) ** 2 * 12 + 3 * u * u * (1 - u) * 12) / 100;
      let t = 0;
      while (outline.upper.at(t).x < x) t += 1e-5;
      expect(Math.abs(outline.upper.at(t).y - y)).toBeLessThan(2e-5);
    }
  }); // prettier-ignore

  test('what this program draws is read again: lines and arcs, both releases', () => {
    for (const options of [
      { chordMm: 250 },
      { chordMm: 250, arcs: true },
      { chordMm: 250, release: 'r12' },
    ]) {
      for (const shape of options.chordMm === 250 && 'arcs' in options
        ? [naca4('2412')]
        : [naca4('4415', 'open')]) {
        const { text } = exportFile(
          'dxf',
          shape,
          MARSH,
          parseExportOptions('dxf', { ...options, toleranceMm: 0.005 }),
        );
        const contour = readDxfOutline(bytesOf(text));
        const outline = measuredOutline({ kind: 'measured', x: contour.x, y: contour.y });
        const exact = pointsOf(outlineOf(shape), 800);
        const found = pointsOf(outline, 30);
        const off = found.map(({ x, y }) =>
          Math.min(...exact.map((point) => Math.hypot(point.x - x, point.y - y))),
        );
        // 0.005 mm on 250 mm, and half the spacing of the points compared with.
        expect(Math.max(...off)).toBeLessThan(2e-5 + 1e-3);
        expect(contour.sourceChordMm).toBe(250);
      }
    }
  });
});

describe('refused', () => {
  const square = [[0, 0], [9, 0], [9, 3], [0, 3]].map(([x, y]) => ({ x: x!, y: y! })); // prettier-ignore
  test.each([
    ['XML', '<svg/>', 'markup'],
    ['a list', 'Marsh\n1 0\n0 0', 'broken-drawing'],
    ['no sections', '0\nLINE\n', 'wrong-type'],
    ['nothing drawn', dxf([]), 'no-outline'],
    ['blocks only', dxf([[0, 'INSERT', 2, 'WING']]), 'no-outline'],
    ['a square', dxf([lightPolyline(square, true)]), 'too-few-points'],
    ['two outlines', dxf([lightPolyline(mm, true), lightPolyline(mm, true)]), 'several-contours'],
    ['lines that do not meet', dxf(lines(mm).filter((_, i) => i % 3 > 0)), 'several-contours'],
    ['a bad number', dxf([[0, 'LINE', 10, 'x', 20, 0, 11, 1, 21, 0]]), 'broken-drawing'],
    ['too many points', dxf(Array.from({ length: 120 }, () => [0, 'ARC', 10, 0, 20, 0, 40, 1, 50, 0, 51, 359])), 'too-many-points'],
  ])('%s', (_, text, code) => {
    expect(refusalOf(() => readDxfOutline(bytesOf(text))).code).toBe(code);
  }); // prettier-ignore

  test('blocks are named, for they can be exploded', () => {
    expect(refusalOf(() => read([[0, 'INSERT', 2, 'WING']])).message).toContain('explode them first');
  });
});
