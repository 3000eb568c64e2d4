import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { exportFile, parseExportOptions } from '#geometry/formats/export.ts';
import { readCoordinates } from '#geometry/imports/coordinates.ts';
import { measuredSchema } from '#geometry/shapes/measured.ts';
import { MARSH } from '#tests/geometry/formats/identity-example.ts';
import { naca4, naca4Shapes } from '#tests/geometry/shapes/samples.ts';
import { OPEN, SHARP, bytesOf, largestShift, listed, refusalOf } from './files.ts';

const read = (text: string, name = 'marsh.dat') => readCoordinates(bytesOf(text), name);
const [upper, lower] = [SHARP.slice(0, 20).reverse(), SHARP.slice(19)];
const surfaces = 'joined the surfaces: upper trailing edge, nose, lower trailing edge';

describe('one section in many dialects', () => {
  test.each<readonly [string, string, readonly string[]]>([
    ['round', listed(SHARP), []],
    ['the other way round', listed(SHARP.toReversed()), ['reversed the direction of the points']],
    ['a title and CR LF', `Marsh 2412\r\n${listed(SHARP).replaceAll('\n', '\r\n')}\r\n`, []],
    ['a byte order mark and CR', `\ufeff${listed(SHARP).replaceAll('\n', '\r')}`, []],
    ['tabs', listed(SHARP).replaceAll(' ', '\t'), []],
    ['comma-separated with headings', `x,y\n${listed(SHARP).replaceAll(' ', ',')}`, []],
    ['decimal commas and semicolons', listed(SHARP).replaceAll('.', ',').replaceAll(' ', ';'), ['read decimal commas']],
    ['surfaces from nose to edge', `${listed(upper)}\n\n${listed(lower)}`, [surfaces]],
    ['surfaces without a blank line', `${listed(upper)}\n${listed(lower)}`, [surfaces]],
    ['surfaces towards the nose', `${listed(upper.toReversed())}\n\n${listed(lower.toReversed())}`, [surfaces]],
    ['the lower surface first', `${listed(lower)}\n\n${listed(upper)}`, [surfaces]],
    ['counts first', `20. 20.\n\n${listed(upper)}\n\n${listed(lower)}`, ['passed over the number of points: 20 and 20 in line 1', surfaces]],
    ['a blank line after every point', listed(SHARP).replaceAll('\n', '\n\n'), []],
    ['without its last point', listed(SHARP.slice(0, -1)), ['added the missing trailing-edge point of one surface']],
    ['duplicates', listed(SHARP.flatMap((point, i) => (i % 9 === 4 ? [point, point] : [point]))), ['removed 4 duplicate points']],
  ])('%s', (_, text, repairs) => {
    const contour = read(text);
    expect(largestShift(contour, SHARP)).toBeLessThan(1e-15);
    expect(contour.repairs).toEqual(repairs);
    expect(contour.sourceChordMm).toBe(null);
  }); // prettier-ignore

  test('a table of stations with both ordinates, in per cent', () => {
    const symmetric = upper.map(({ x }) => ({ x, y: 0.6 * (0.2969 * Math.sqrt(x) - 0.126 * x - 0.3516 * x ** 2 + 0.2843 * x ** 3 - 0.1036 * x ** 4) }));
    const { repairs, x } = read(symmetric.map((p) => `${100 * p.x} ${100 * p.y} ${-100 * p.y}`).join('\n'));
    expect(repairs).toEqual(['read the columns as station, upper and lower ordinate', surfaces, 'scaled from per cent of chord']);
    expect(x).toHaveLength(39);
  }); // prettier-ignore

  test('mm and per cent, and what tells 100 mm from per cent', () => {
    const by = (factor: number) => listed(SHARP.map(({ x, y }) => ({ x: factor * x, y: factor * y })));
    expect(read(by(250))).toMatchObject({ sourceChordMm: 250, repairs: ['scaled from 250 mm chord'] });
    expect(read(by(100))).toMatchObject({ sourceChordMm: null, repairs: ['scaled from per cent of chord'] });
    expect(read(`Marsh, in mm\n${by(100)}`)).toMatchObject({ sourceChordMm: 100, name: 'Marsh, in mm' });
    expect(largestShift(read(by(100)), SHARP)).toBeLessThan(1e-14);
  });

  test('a blunt trailing edge keeps its two points', () => {
    expect(largestShift(read(listed(OPEN)), OPEN)).toBeLessThan(1e-15);
  });

  test('an outline listed from the nose, turned and moved', () => {
    const [c, s] = [Math.cos(0.2), Math.sin(0.2)];
    const turned = SHARP.slice(0, -1).map(({ x, y }) => ({ x: 250 * (c * x - s * y) + 40, y: 250 * (s * x + c * y) }));
    const { repairs } = read(listed([...turned.slice(19), ...turned.slice(0, 19)]));
    expect(repairs.join('; ')).toMatch(/^began the outline at its trailing edge; added the missing trailing-edge point of one surface; rotated 11\.\d\d° clockwise; moved the nose to the origin; scaled from 250\.\d+ mm chord$/);
  }); // prettier-ignore

  test('a flat lower side drawn with two points stays one', () => {
    const flat = [[1, 0], [0.9, 0.02], [0.7, 0.06], [0.5, 0.09], [0.3, 0.1], [0.2, 0.09], [0.1, 0.07], [0.05, 0.05], [0.02, 0.03], [0, 0], [0.02, -0.01], [1, 0]]; // prettier-ignore
    const contour = read(listed(flat.map(([x, y]) => ({ x: x!, y: y! }))));
    expect(contour.x).toHaveLength(12);
    expect(contour.repairs).toEqual([]);
  });

  test('what this program writes is read as it was: any 4-digit section, either order, unit chord and mm', () => {
    fc.assert(
      fc.property(naca4Shapes, fc.constantFrom('round', 'surfaces'), fc.constantFrom(undefined, 180), (shape, order, chordMm) => {
        const options = parseExportOptions('dat', { order, decimals: 8, points: 40, ...(chordMm ? { chordMm } : {}) });
        const contour = read(exportFile('dat', shape, MARSH, options).text);
        const plain = read(exportFile('dat', shape, MARSH, parseExportOptions('dat', { decimals: 10, points: 40 })).text);
        expect(largestShift(contour, plain.x.map((x, i) => ({ x, y: plain.y[i]! })))).toBeLessThan(1e-6);
        expect(contour.sourceChordMm === null).toBe(chordMm === undefined);
        expect(measuredSchema.safeParse({ kind: 'measured', x: contour.x, y: contour.y }).error).toBeUndefined();
      }),
      { numRuns: 10 },
    ); // prettier-ignore
  });
});

describe('refused', () => {
  const small = SHARP.map(({ x, y }) => ({ x: 0.3 * x + 1.1, y: 0.3 * y }));
  test.each([
    ['nothing but blanks', ' \n\t\n', 'a.txt', 'empty', null],
    ['nine points', listed(SHARP.slice(0, 9)), 'a.txt', 'too-few-points', null],
    ['two outlines', `${listed(SHARP)}\n\n${listed(small)}`, 'a.txt', 'several-contours', 41],
    ['one outline twice', `${listed(SHARP)}\n${listed(SHARP)}`, 'a.txt', 'several-contours', 39],
    ['an outline that crosses', listed(SHARP.map((point, i) => (i > 5 && i < 9 ? { ...point, y: -0.2 } : point))), 'a.txt', 'crossing', 9],
    ['a line', listed(SHARP.map(({ x }, i) => ({ x: x + i, y: 0 }))), 'a.txt', 'not-a-section', null],
    ['HTML', '\n <!DOCTYPE html><p>1 0</p>', 'a.txt', 'markup', 1],
    ['an XML bomb', '<?xml version="1.0"?><!DOCTYPE a [<!ENTITY b "bbbb"><!ENTITY c "&b;&b;&b;">]><a>&c;</a>', 'a.xml', 'markup', 1],
    ['JSON', '{"x":[1,0]}', 'a.json', 'wrong-type', null],
    ['a drawing', '  0\nSECTION\n  2\nHEADER', 'a.txt', 'wrong-type', null],
    ['a spreadsheet by its name', listed(SHARP), 'Marsh.XLSX', 'wrong-type', null],
    ['a formula', `${listed(SHARP)}\n=1+1,0`, 'a.csv', 'formula', 40],
  ])('%s', (_, text, name, code, line) => {
    const refusal = refusalOf(() => read(text, name));
    expect(refusal.code).toBe(code);
    if (line !== null) expect(refusal.line).toBe(line);
  }); // prettier-ignore

  test('the sentence names the line', () => {
    expect(refusalOf(() => read(listed(SHARP).replace('\n', '\n0.9 zz\n'))).message).toBe(
      'Line 2 should hold two numbers, but holds “0.9 zz”.',
    );
  });

  test('names without an ending, and endings that objects have of themselves, are no kinds', () => {
    for (const name of ['marsh', 'marsh.constructor', ''])
      expect(read(listed(SHARP), name).x).toHaveLength(39);
    expect(naca4('2412').kind).toBe('naca4');
  });
});
