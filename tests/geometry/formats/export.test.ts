import DxfParser from 'dxf-parser';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  type ExportOptions,
  type FileIdentity,
  exportFile,
  parseExportOptions,
} from '#geometry/formats/export.ts';
import { readDat } from '#geometry/formats/dat.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { checkShape, type Shape } from '#geometry/shapes/shape.ts';
import {
  type BulgeVertex,
  closedForm,
  distanceToArcs,
  distanceToChain,
  NACA_2412,
  type XY,
} from './closed-form.ts';
import { MARSH, NASTY_NAMES } from './identity-example.ts';

const dxfOf = (shape: Shape, options: object, identity: FileIdentity = MARSH) =>
  exportFile('dxf', shape, identity, parseExportOptions('dxf', options));
const datOf = (shape: Shape, options: object, identity: FileIdentity = MARSH) =>
  exportFile('dat', shape, identity, parseExportOptions('dat', options));
const svgOf = (shape: Shape, options: object, identity: FileIdentity = MARSH) =>
  exportFile('svg', shape, identity, parseExportOptions('svg', options));

/** The outline that an independent reader finds. */
function outlineVertices(text: string): readonly BulgeVertex[] {
  const entities = (new DxfParser().parseSync(text)?.entities ?? []) as unknown as readonly {
    readonly layer: string;
    readonly shape: boolean;
    readonly vertices: readonly BulgeVertex[];
  }[];
  const outlines = entities.filter(({ layer }) => layer === 'OUTLINE');
  expect(outlines).toHaveLength(1);
  expect(outlines[0]?.shape).toBe(true);
  return outlines[0]?.vertices ?? [];
}

const pairs = (vertices: readonly BulgeVertex[]): readonly XY[] => vertices.map(({ x, y }) => [x, y]);

function largestDistance(points: readonly XY[], chain: readonly XY[], closed: boolean): number {
  return Math.max(...points.map((point) => distanceToChain(point, chain, closed)));
}

const FORMS = [
  NACA_2412,
  { ...NACA_2412, trailingEdge: 'closed' },
  { ...NACA_2412, maxCamber: 0, maxThickness: 0.09 },
  { ...NACA_2412, maxCamber: 0.06, maxCamberPosition: 0.3, maxThickness: 0.15, trailingEdge: 'closed' },
] as const;

describe.each(['r12', 'r2000'])('a %s file at 220 mm', (release) => {
  test.each(FORMS)('has every vertex on the closed-form section of %j, and keeps 0.01 mm', (form) => {
    const file = dxfOf(form, { chordMm: 220, release });
    const vertices = pairs(outlineVertices(file.text));
    const exact = closedForm(form, 220);
    expect(largestDistance(vertices, exact, false)).toBeLessThanOrEqual(0.0005);
    const error = largestDistance(exact, vertices, true);
    expect(error).toBeLessThanOrEqual(0.01);
    expect(file.facts.largestErrorMm).toBeLessThanOrEqual(0.01);
    expect(Math.abs(file.facts.largestErrorMm - error)).toBeLessThanOrEqual(1e-4);
    expect(file.facts).toMatchObject({ points: vertices.length, arcs: 0, unit: 'mm' });
    expect(vertices.length).toBeLessThan(100);
  });

  test('repeats no vertex and closes a blunt trailing edge by its base', () => {
    const vertices = pairs(outlineVertices(dxfOf(NACA_2412, { chordMm: 220, release }).text));
    const first = vertices[0]!;
    const last = vertices.at(-1)!;
    expect(Math.hypot(first[0] - last[0], first[1] - last[1])).toBeCloseTo(220 * 0.00252, 4);
    vertices.forEach(([x, y], i) => {
      const [px, py] = vertices[(i + 1) % vertices.length]!;
      expect(Math.hypot(x - px, y - py)).toBeGreaterThan(0.01);
    });
  });

  test('holds arcs within the tolerance, far fewer than straight pieces', () => {
    for (const form of FORMS) {
      const arcs = dxfOf(form, { chordMm: 220, release, arcs: true });
      const vertices = outlineVertices(arcs.text);
      const errors = closedForm(form, 220, 1500).map((point) => distanceToArcs(point, vertices));
      expect(Math.max(...errors)).toBeLessThanOrEqual(0.01);
      expect(Math.abs(arcs.facts.largestErrorMm - Math.max(...errors))).toBeLessThanOrEqual(1e-4);
      expect(largestDistance(pairs(vertices), closedForm(form, 220), false)).toBeLessThanOrEqual(0.0005);
      expect(arcs.facts.points).toBe(vertices.length);
      expect(arcs.facts.arcs).toBe(vertices.filter(({ bulge }) => bulge).length);
      const lines = dxfOf(form, { chordMm: 220, release });
      expect(arcs.facts.points).toBeLessThan(0.6 * lines.facts.points);
      expect(Math.abs(arcs.facts.widthMm - lines.facts.widthMm)).toBeLessThanOrEqual(0.02);
      expect(Math.abs(arcs.facts.heightMm - lines.facts.heightMm)).toBeLessThanOrEqual(0.02);
    }
  });

  test('says what it is', () => {
    const { text, fileName, mediaType } = dxfOf(NACA_2412, { chordMm: 220, release });
    expect(fileName).toBe('marsh-2412_v3_220mm.dxf');
    expect(mediaType).toBe('image/vnd.dxf');
    for (const line of [
      'Marsh 2412 v3, released',
      'NACA 2412',
      'chord 220 mm, unit mm, tolerance 0.01 mm',
      'checksum 3f2a9c81b0de',
    ]) {
      expect(text.split('\r\n').filter((value) => value === line)).toHaveLength(2);
    }
  });

  test('has its text below the section', () => {
    const entities = (new DxfParser().parseSync(dxfOf(NACA_2412, { chordMm: 220, release }).text)?.entities ??
      []) as unknown as readonly {
      readonly type: string;
      readonly startPoint: { readonly y: number };
      readonly textHeight: number;
    }[];
    const texts = entities.filter(({ type }) => type === 'TEXT');
    expect(texts.length).toBeGreaterThanOrEqual(4);
    for (const { startPoint, textHeight } of texts)
      expect(startPoint.y + textHeight).toBeLessThan(-220 * 0.0424);
  });
});

describe('tolerance', () => {
  test('is kept in the file as written, after rounding, by straight pieces and by arcs', () => {
    const anyExport = fc.record({
      maxCamber: fc.double({ min: 0, max: 0.08, noNaN: true }),
      maxThickness: fc.double({ min: 0.06, max: 0.2, noNaN: true }),
      trailingEdge: fc.constantFrom('open' as const, 'closed' as const),
      chordMm: fc.double({ min: 30, max: 2000, noNaN: true }),
      toleranceMm: fc.constantFrom(0.001, 0.004, 0.02, 0.3),
      arcs: fc.boolean(),
    });
    fc.assert(
      fc.property(anyExport, ({ chordMm, toleranceMm, arcs, ...over }) => {
        const form = { ...NACA_2412, ...over };
        const file = dxfOf(form, { chordMm, toleranceMm, arcs, layers: 'OUTLINE' });
        const vertices = outlineVertices(file.text);
        const errors = closedForm(form, chordMm, 300).map((point) => distanceToArcs(point, vertices));
        expect(Math.max(...errors)).toBeLessThanOrEqual(toleranceMm);
        expect(file.facts.largestErrorMm).toBeLessThanOrEqual(toleranceMm);
      }),
      { numRuns: 25 },
    );
  });

  test('is kept by a coordinate file with few decimals', () => {
    const file = datOf(NACA_2412, { chordMm: 220, spacing: 'tolerance', toleranceMm: 0.001, decimals: 4 });
    const points = readDat(file.text).points.map(({ x, y }): XY => [x, y]);
    expect(largestDistance(closedForm(NACA_2412, 220, 2000), points, true)).toBeLessThanOrEqual(0.001);
    expect(file.facts.largestErrorMm).toBeLessThanOrEqual(0.001);
    expect(file.facts.points).toBe(points.length);
  });
});

describe('a coordinate file', () => {
  test('is the same to the byte each time', async () => {
    const { text } = datOf(NACA_2412, { points: 12 });
    expect(datOf(NACA_2412, { points: '12' }).text).toBe(text);
    await expect(text).toMatchFileSnapshot('./snapshots/marsh-unit.dat');
  });

  test('has a unit chord unless a chord is asked for, and says so', () => {
    const unit = datOf({ ...NACA_2412, trailingEdge: 'closed' }, {});
    expect(unit.fileName).toBe('marsh-2412_v3_unit.dat');
    expect(unit.mediaType).toBe('text/plain; charset=utf-8');
    expect(unit.text.split('\n')[0]).toBe(
      'Marsh 2412 v3, released, NACA 2412, unit chord, 100 points per surface, checksum 3f2a9c81b0de',
    );
    expect(unit.facts).toMatchObject({ points: 198, arcs: 0, unit: 'chord' });
    // The nose lies 0.000078 ahead of x = 0 (from the polynomial of NACA Report 460); the file has points near it, not on it.
    expect(unit.facts.widthMm).toBeGreaterThan(1);
    expect(unit.facts.widthMm).toBeLessThanOrEqual(1.000079);
    const cut = datOf(NACA_2412, { chordMm: '215.9', spacing: 'tolerance' });
    expect(cut.fileName).toBe('marsh-2412_v3_215.9mm.dat');
    expect(cut.text.split('\n')[0]).toContain('chord 215.9 mm, unit mm, tolerance 0.01 mm');
    expect(cut.facts.unit).toBe('mm');
  });

  test.each(FORMS)('has its points on the closed-form section of %j', (form) => {
    const points = readDat(datOf(form, { decimals: 8 }).text).points.map(({ x, y }): XY => [x, y]);
    expect(largestDistance(points, closedForm(form, 1, 4000), false)).toBeLessThanOrEqual(1e-6);
  });

  test('is refused where rounding would make points coincide', () => {
    expect(() => datOf(NACA_2412, { points: 1000, decimals: 4 })).toThrow(
      /^decimals: with 4 decimals points 1 and 2/,
    );
  });
});

describe('an SVG drawing', () => {
  test('has its outline on the closed-form section at true size', () => {
    const file = svgOf(NACA_2412, { chordMm: 220 });
    expect(file).toMatchObject({ fileName: 'marsh-2412_v3_220mm.svg', mediaType: 'image/svg+xml' });
    const path = /<g id="OUTLINE"[^>]*><path d="M([^"]+)Z"/.exec(file.text)?.[1] ?? '';
    const points = path.split('L').map((pair): XY => {
      const [x = NaN, y = NaN] = pair.split(' ').map(Number);
      return [x, -y];
    });
    expect(points).toHaveLength(file.facts.points);
    expect(largestDistance(points, closedForm(NACA_2412, 220), false)).toBeLessThanOrEqual(0.0005);
    expect(largestDistance(closedForm(NACA_2412, 220), points, true)).toBeLessThanOrEqual(0.01);
  });
});

describe('every format', () => {
  const FREE_FORM = checkShape({
    kind: 'cst',
    upper: [0.17, 0.16, 0.14, 0.16],
    lower: [-0.1, -0.08, -0.12, 0.05],
    n1: 0.5,
    n2: 1,
    trailingEdgeGap: 0,
  });

  test('writes finite numbers at both ends of every range', () => {
    for (const shape of [FREE_FORM, NACA_2412]) {
      for (const chordMm of [10, 5000]) {
        for (const toleranceMm of [0.001, 1]) {
          for (const arcs of [false, true]) {
            const file = dxfOf(shape, { chordMm, toleranceMm, arcs });
            expect(file.text).not.toMatch(/NaN|Infinity/);
            expect(file.facts.largestErrorMm).toBeLessThanOrEqual(toleranceMm);
            expect(file.facts.points).toBeGreaterThanOrEqual(3);
          }
          expect(svgOf(shape, { chordMm, toleranceMm }).text).not.toMatch(/NaN|Infinity/);
        }
      }
    }
  });

  test('states a finite error and its points where points fall together when rounded', () => {
    const flat = checkShape({
      kind: 'cst',
      upper: [0.07, 0.033, 0.14, 0.02],
      lower: [0, 0, 0, 1e-9, 0, 0],
      n1: 0.5356,
      n2: 0.559,
      trailingEdgeGap: 0.002,
    });
    for (const arcs of [false, true]) {
      const { text, facts } = dxfOf(flat, { chordMm: 18, toleranceMm: 1, arcs });
      expect(facts.points).toBe(outlineVertices(text).length);
      expect(facts.largestErrorMm).toBeLessThanOrEqual(1);
    }
  });

  test('checks the options again', () => {
    const hostile = {
      ...parseExportOptions('dxf', { chordMm: 220 }),
      chordMm: NaN,
    } satisfies ExportOptions['dxf'];
    expect(() => exportFile('dxf', NACA_2412, MARSH, hostile)).toThrow(ShapeError);
  });

  test.each(NASTY_NAMES)('keeps its line structure with the name %j', (sectionName) => {
    const identity = { ...MARSH, sectionName, status: sectionName, designation: sectionName };
    const named = [
      datOf(NACA_2412, {}, identity),
      dxfOf(NACA_2412, { chordMm: 220, release: 'r12' }, identity),
      dxfOf(NACA_2412, { chordMm: 220 }, identity),
      svgOf(NACA_2412, { chordMm: 220 }, identity),
    ];
    const plain = [
      datOf(NACA_2412, {}),
      dxfOf(NACA_2412, { chordMm: 220, release: 'r12' }),
      dxfOf(NACA_2412, { chordMm: 220 }),
      svgOf(NACA_2412, { chordMm: 220 }),
    ];
    expect(named.map(({ text }) => text.split(/\r\n|[\r\n\u0085\u2028\u2029]/).length)).toEqual(
      plain.map(({ text }) => text.split('\n').length),
    );
  });
});
