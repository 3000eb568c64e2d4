import DxfParser from 'dxf-parser';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { writeDxf, writeDxfDocument } from '#geometry/formats/dxf.ts';
import { SMALL_DOCUMENT, SMALL_DRAWING } from './drawing-example.ts';
import { pairsOf, recordsOf, valuesOf, type Pair } from './dxf-pairs.ts';
import { NASTY_NAMES } from './identity-example.ts';

const RELEASES = ['r12', 'r2000'] as const;

interface ReadVertex {
  readonly x: number;
  readonly y: number;
  readonly bulge?: number;
}

interface ReadEntity {
  readonly type: string;
  readonly layer: string;
  readonly shape?: boolean;
  readonly vertices?: readonly ReadVertex[];
  readonly text?: string;
  readonly center?: { readonly x: number; readonly y: number };
  readonly radius?: number;
}

function read(text: string) {
  const dxf = new DxfParser().parseSync(text);
  if (!dxf) throw new Error('The reader gave nothing back.');
  return {
    header: dxf.header,
    tables: dxf.tables,
    entities: dxf.entities as unknown as readonly ReadEntity[],
  };
}

describe.each(RELEASES)('a %s drawing', (release) => {
  const text = writeDxf(SMALL_DRAWING, release);
  const pairs = pairsOf(text);
  const records = recordsOf(pairs);

  test('is the same to the byte each time', async () => {
    expect(writeDxf(SMALL_DRAWING, release)).toBe(text);
    await expect(text).toMatchFileSnapshot(`./snapshots/small-${release}.dxf`);
  });

  test('is read back by an independent reader', () => {
    const { header, tables, entities } = read(text);
    expect(header['$ACADVER']).toBe(release === 'r12' ? 'AC1009' : 'AC1015');
    expect(Object.keys(tables.layer.layers)).toEqual(['0', 'OUTLINE', 'CHORD', 'CAMBER', 'TEXT']);
    expect(entities.slice(0, 4).map(({ layer }) => layer)).toEqual(['OUTLINE', 'CHORD', 'CAMBER', 'TEXT']);
    const [outline, chord, camber, words] = entities;
    expect(outline?.shape).toBe(true);
    expect(outline?.vertices?.map(({ x, y }) => [x, y])).toEqual([
      [100, 0.25],
      [40, 9.5],
      [0, 0],
      [40, -4],
      [100, -0.25],
    ]);
    expect(outline?.vertices?.map(({ bulge }) => bulge ?? 0)).toEqual([0.0625, 0, 0, 0, 0]);
    expect(chord?.type).toBe('LINE');
    expect(camber?.shape).toBe(false);
    expect(camber?.vertices).toHaveLength(3);
    expect(words?.text).toBe('Marsh 2412 v3, released');
  });

  test('states the unit', () => {
    const { header } = read(text);
    if (release === 'r2000') {
      expect(header['$INSUNITS']).toBe(4);
      expect(header['$MEASUREMENT']).toBe(1);
    } else {
      expect(pairs.slice(0, 5)).toContainEqual({ code: 999, value: 'All lengths in millimetres' });
      expect(header).not.toHaveProperty('$INSUNITS');
    }
  });

  test('begins with comments and then holds whole sections up to its end', () => {
    const comments = pairs.findIndex(({ code }) => code !== 999);
    expect(pairs.slice(0, 4).map(({ value }) => value)).toEqual(SMALL_DRAWING.header);
    expect(comments).toBe(release === 'r12' ? 5 : 4);
    const frame = pairs
      .slice(comments)
      .filter(({ code, value }) => code === 0 && /SECTION|ENDSEC|EOF/.test(value));
    expect(frame.at(-1)?.value).toBe('EOF');
    frame.slice(0, -1).forEach(({ value }, i) => expect(value).toBe(i % 2 === 0 ? 'SECTION' : 'ENDSEC'));
    const names = records.filter(([first]) => first?.value === 'SECTION').map((record) => record[1]?.value);
    expect(names).toEqual(
      release === 'r12'
        ? ['HEADER', 'TABLES', 'BLOCKS', 'ENTITIES']
        : ['HEADER', 'CLASSES', 'TABLES', 'BLOCKS', 'ENTITIES', 'OBJECTS'],
    );
    expect(pairs.at(-1)).toEqual({ code: 0, value: 'EOF' });
  });

  test('refers to nothing that its tables do not hold', () => {
    const tables = records.filter((record) => ['LTYPE', 'LAYER', 'STYLE'].includes(record[0]?.value ?? ''));
    const named = (type: string) =>
      new Set(tables.filter(([first]) => first?.value === type).map((record) => valuesOf(record, 2)[0]));
    const used = (code: number) => records.flatMap((record) => valuesOf(record, code));
    expect(used(8).length).toBeGreaterThan(5);
    for (const layer of used(8)) expect(named('LAYER')).toContain(layer);
    for (const lineType of used(6)) expect(named('LTYPE')).toContain(lineType);
    const styles = records
      .filter(([first]) => first?.value === 'TEXT')
      .flatMap((record) => valuesOf(record, 7));
    expect(styles.length).toBeGreaterThan(0);
    for (const style of styles) expect(named('STYLE')).toContain(style);
  });

  test('counts its table records right and draws chord and camber as centre lines', () => {
    let open: readonly Pair[] | undefined;
    let found = 0;
    for (const record of [...records]) {
      const type = record[0]?.value;
      if (type === 'TABLE') [open, found] = [record, 0];
      else if (type === 'ENDTAB') {
        expect(found, valuesOf(open!, 2)[0]).toBe(Number(valuesOf(open!, 70)[0]));
        open = undefined;
      } else if (open) found += 1;
    }
    const lineTypeOf = (layer: string) =>
      records
        .filter((r) => r[0]?.value === 'LAYER' && valuesOf(r, 2)[0] === layer)
        .map((r) => valuesOf(r, 6)[0]);
    expect(lineTypeOf('CHORD')).toEqual(['CENTER']);
    expect(lineTypeOf('CAMBER')).toEqual(['CENTER']);
    const center = records.find((r) => r[0]?.value === 'LTYPE' && valuesOf(r, 2)[0] === 'CENTER')!;
    const dashes = valuesOf(center, 49).map(Number);
    expect(dashes).toHaveLength(Number(valuesOf(center, 73)[0]));
    expect(dashes.reduce((sum, dash) => sum + Math.abs(dash), 0)).toBeCloseTo(
      Number(valuesOf(center, 40)[0]),
      9,
    );
  });

  test('writes numbers with a decimal point, five decimals or more, and no exponent', () => {
    const reals = pairs.filter(({ code }) => code >= 10 && code <= 59);
    expect(reals.length).toBeGreaterThan(50);
    for (const { value } of reals) expect(value).toMatch(/^-?\d+\.\d{5,10}$/);
    expect(reals.map(({ value }) => value)).not.toContain('-0.00000');
    expect(text).toMatch(/^[\x20-\x7e\r\n]*$/);
  });

  test('leaves out layers that are not asked for', () => {
    const { entities, tables } = read(writeDxf({ ...SMALL_DRAWING, layers: ['OUTLINE'] }, release));
    expect(entities.map(({ layer }) => layer)).toEqual(['OUTLINE']);
    expect(Object.keys(tables.layer.layers)).toEqual(['0', 'OUTLINE']);
  });

  test('has no piece of zero length', () => {
    const outline = {
      x: [100, 50, 50.000001, 0, 50, 100],
      y: [0, 9, 9, 0, -9, 0.000001],
      bulge: [0, 0, 0.25, 0, 0, 0],
    };
    const vertices = read(writeDxf({ ...SMALL_DRAWING, outline }, release)).entities[0]?.vertices ?? [];
    expect(vertices.map(({ x, y }) => [x, y])).toEqual([
      [100, 0],
      [50, 9],
      [0, 0],
      [50, -9],
    ]);
    expect(vertices[1]?.bulge).toBe(0.25);
  });

  test('holds each kind of entity, and keeps repeated vertices where they must stay in step', () => {
    const document = SMALL_DOCUMENT;
    const [polyline, line, circle, words] = read(writeDxfDocument(document, release)).entities;
    expect(polyline?.vertices?.map(({ x, y }) => [x, y])).toEqual([
      [50, 0],
      [0, 5],
    ]);
    expect(line?.vertices?.map(({ x, y }) => [x, y])).toEqual([
      [0, 1],
      [2, 3],
    ]);
    expect(circle).toMatchObject({ type: 'CIRCLE', layer: 'CUT', radius: 1.5, center: { x: 20, y: 2 } });
    expect(words).toMatchObject({ layer: 'TEXT', text: 'Reed wing v1' });
    const [first, ...others] = document.entities;
    if (first?.kind !== 'polyline') throw new Error('no polyline');
    const inStep = { ...document, entities: [{ ...first, keepRepeats: true }, ...others] };
    const vertices = read(writeDxfDocument(inStep, release)).entities[0]?.vertices;
    expect(vertices?.map(({ x, y }) => [x, y])).toEqual([
      [50, 0],
      [50, 0],
      [0, 5],
      [50, 0],
    ]);
  });

  test('refuses coordinates that are no numbers', () => {
    const outline = { x: [0, NaN, 1], y: [0, 1, 0] };
    expect(() => writeDxf({ ...SMALL_DRAWING, outline }, release)).toThrow(RangeError);
  });

  test('keeps its line structure whatever its text says', () => {
    const names = fc.oneof(fc.constantFrom(...NASTY_NAMES), fc.string({ unit: 'binary', maxLength: 300 }));
    const structure = pairs.map(({ code }) => code);
    fc.assert(
      fc.property(names, (name) => {
        const drawing = { ...SMALL_DRAWING, header: [name, ...SMALL_DRAWING.header.slice(1)] };
        const written = writeDxf(
          { ...drawing, texts: [{ ...SMALL_DRAWING.texts[0]!, text: name }] },
          release,
        );
        expect(written).toMatch(/^[\x20-\x7e\r\n]*$/);
        expect(pairsOf(written).map(({ code }) => code)).toEqual(structure);
        expect(read(written).entities[0]?.vertices).toHaveLength(5);
      }),
      { numRuns: 60 },
    );
  });
});

describe('an R12 drawing', () => {
  const records = recordsOf(pairsOf(writeDxf(SMALL_DRAWING, 'r12')));

  test('announces vertices and ends them, and has no handles', () => {
    const polylines = records.filter(([first]) => first?.value === 'POLYLINE');
    expect(polylines.map((record) => valuesOf(record, 66)[0]?.trim())).toEqual(['1', '1']);
    expect(records.filter(([first]) => first?.value === 'SEQEND')).toHaveLength(2);
    expect(records.flatMap((record) => valuesOf(record, 5))).toEqual([]);
    expect(records.flatMap((record) => valuesOf(record, 100))).toEqual([]);
  });

  test('carries a line of 100 mm, because it cannot state its unit', () => {
    const line = records.find((r) => r[0]?.value === 'LINE' && valuesOf(r, 8)[0] === 'TEXT')!;
    expect(Number(valuesOf(line, 11)[0]) - Number(valuesOf(line, 10)[0])).toBe(100);
    expect(records.flatMap((record) => valuesOf(record, 1))).toContain('Test line 100 mm');
  });
});

describe('an R2000 drawing', () => {
  const pairs = pairsOf(writeDxf(SMALL_DRAWING, 'r2000'));
  const records = recordsOf(pairs);
  const handles = [
    ...records.filter(([first]) => first?.value !== 'SECTION').flatMap((record) => valuesOf(record, 5)),
    ...records.flatMap((record) => valuesOf(record, 105)),
  ];

  test('has handles that are unique and below the first free one', () => {
    const seedAt = pairs.findIndex(({ value }) => value === '$HANDSEED');
    const seed = Number.parseInt(pairs[seedAt + 1]!.value, 16);
    expect(handles.length).toBeGreaterThan(30);
    expect(new Set(handles).size).toBe(handles.length);
    for (const handle of handles) {
      expect(handle).toMatch(/^[1-9A-F][0-9A-F]*$/);
      expect(Number.parseInt(handle, 16)).toBeLessThan(seed);
    }
  });

  test('points only at handles that exist', () => {
    const pointers = records.flatMap((r) => [330, 340, 350, 390].flatMap((code) => valuesOf(r, code)));
    expect(pointers.length).toBeGreaterThan(30);
    for (const pointer of pointers) expect(['0', ...handles]).toContain(pointer);
  });

  test('holds the tables and records of its release', () => {
    const tables = records
      .filter(([first]) => first?.value === 'TABLE')
      .map((record) => valuesOf(record, 2)[0]);
    expect(tables).toEqual([
      'VPORT',
      'LTYPE',
      'LAYER',
      'STYLE',
      'VIEW',
      'UCS',
      'APPID',
      'DIMSTYLE',
      'BLOCK_RECORD',
    ]);
    const names = records.flatMap((record) => valuesOf(record, 2));
    for (const name of [
      '*Active',
      'ByBlock',
      'ByLayer',
      'Continuous',
      'Standard',
      'ACAD',
      '*Model_Space',
      '*Paper_Space',
    ]) {
      expect(names).toContain(name);
    }
  });

  test('owns its entities by the model space and counts their vertices', () => {
    const space = records.find(
      (r) => r[0]?.value === 'BLOCK_RECORD' && valuesOf(r, 2)[0] === '*Model_Space',
    )!;
    const entities = records.filter((r) => ['LWPOLYLINE', 'LINE', 'TEXT'].includes(r[0]?.value ?? ''));
    expect(entities).toHaveLength(4);
    for (const entity of entities) expect(valuesOf(entity, 330)).toEqual(valuesOf(space, 5));
    for (const polyline of entities.filter(([first]) => first?.value === 'LWPOLYLINE')) {
      expect(valuesOf(polyline, 10)).toHaveLength(Number(valuesOf(polyline, 90)[0]));
    }
  });
});
