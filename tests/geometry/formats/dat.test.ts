import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Contour, contourPoints } from '#geometry/contour/contour.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { readDat, writeDat } from '#geometry/formats/dat.ts';
import { ShapeError } from '#geometry/shapes/error.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { NACA_2412 } from './closed-form.ts';
import { NASTY_NAMES } from './identity-example.ts';

const PLAIN = { order: 'round', decimals: 6, newline: 'lf' } as const;

function section(trailingEdge: 'open' | 'closed', pointsPerSurface = 30, maxCamber = 0.02): Contour {
  return sampleCosine(outlineOf({ ...NACA_2412, maxCamber, trailingEdge }), pointsPerSurface);
}

describe('writeDat', () => {
  test('runs from the upper trailing edge round the nose to the lower trailing edge', () => {
    const lines = writeDat(section('open'), 'Marsh v3', PLAIN).split('\n');
    expect(lines[0]).toBe('Marsh v3');
    expect(lines).toHaveLength(1 + 59 + 1);
    expect(lines.at(-1)).toBe('');
    expect(lines[1]).toBe(' 1.000084  0.001257');
    expect(lines[30]).toBe(' 0.000000  0.000000');
    expect(lines[59]).toBe(' 0.999916 -0.001257');
  });

  test('has a sharp trailing edge on the first and on the last line', () => {
    const lines = writeDat(section('closed'), 'Marsh v3', PLAIN).trimEnd().split('\n');
    expect(lines).toHaveLength(1 + 59);
    expect(lines[1]).toBe(' 1.000000  0.000000');
    expect(lines.at(-1)).toBe(lines[1]);
  });

  test('writes surface by surface from nose to trailing edge, a blank line between', () => {
    const text = writeDat(section('closed'), 'Marsh v3', { ...PLAIN, order: 'surfaces' });
    const [upper, lower] = text.split('\n\n').map((block) => block.trim().split('\n'));
    expect(upper).toHaveLength(1 + 30);
    expect(lower).toHaveLength(30);
    expect(upper?.[1]?.trim()).toBe(lower?.[0]?.trim());
    expect(upper?.at(-1)?.trim()).toBe('1.000000  0.000000');
    expect(lower?.at(-1)?.trim()).toBe('1.000000  0.000000');
    expect(Number(upper?.[10]?.trim().split(/\s+/)[1])).toBeGreaterThan(0.01);
    expect(Number(lower?.[10]?.trim().split(/\s+/)[1])).toBeLessThan(-0.01);
  });

  test.each([
    ['lf', '\n'],
    ['crlf', '\r\n'],
  ] as const)('ends every line with %s', (newline, end) => {
    const text = writeDat(section('open'), 'Marsh v3', { ...PLAIN, newline });
    expect(text.split(end)).toHaveLength(61);
    expect(text.replaceAll(end, '')).not.toMatch(/[\r\n]/);
  });

  test('aligns both columns and keeps the decimals asked for', () => {
    const lines = writeDat(section('open'), 'Marsh v3', { ...PLAIN, decimals: 10 })
      .trimEnd()
      .split('\n')
      .slice(1);
    expect(new Set(lines.map((line) => line.length)).size).toBe(1);
    for (const line of lines) expect(line).toMatch(/^ *-?\d\.\d{10} +-?\d\.\d{10}$/);
  });

  test('refuses decimals that let neighbouring points coincide, and says what to do', () => {
    const write = () => writeDat(section('open', 1000), 'Marsh v3', { ...PLAIN, decimals: 4 });
    expect(write).toThrow(ShapeError);
    expect(write).toThrow(
      'decimals: with 4 decimals points 1 and 2 both become 1.0001 0.0013: write more decimals or fewer points',
    );
    expect(() => writeDat(section('open', 1000), 'Marsh v3', { ...PLAIN, decimals: 8 })).not.toThrow();
  });

  test('refuses coordinates that are no numbers', () => {
    const contour = section('open');
    contour.y[3] = NaN;
    expect(() => writeDat(contour, 'Marsh v3', PLAIN)).toThrow(RangeError);
  });

  test.each(NASTY_NAMES)('the name %j stays on the first line and is told from numbers', (name) => {
    const contour = section('closed');
    const text = writeDat(contour, name, PLAIN);
    expect(text.split('\n').slice(1)).toEqual(writeDat(contour, 'Marsh', PLAIN).split('\n').slice(1));
    expect(text.split('\n')[0]).not.toMatch(/^\s*[\d+.-]|^$/);
    expect(readDat(text).points).toHaveLength(59);
  });
});

describe('readDat', () => {
  test('gives back what was written, in either order, with any line end', () => {
    const anySection = fc.record({
      trailingEdge: fc.constantFrom('open', 'closed'),
      points: fc.integer({ min: 10, max: 200 }),
      camber: fc.double({ min: 0, max: 0.09, noNaN: true }),
      order: fc.constantFrom('round', 'surfaces'),
      decimals: fc.integer({ min: 7, max: 10 }),
      newline: fc.constantFrom('lf', 'crlf'),
    } as const);
    fc.assert(
      fc.property(anySection, ({ trailingEdge, points, camber, ...options }) => {
        const contour = section(trailingEdge, points, camber);
        const text = writeDat(contour, 'Marsh v3', options);
        const read = readDat(text);
        const expected = contourPoints(contour);
        if (contour.sharp) expected.push(expected[0]!);
        expect(read.name).toBe('Marsh v3');
        expect(read.order).toBe(options.order);
        expect(read.points).toHaveLength(expected.length);
        const reach = 0.5000001 * 10 ** -options.decimals;
        for (const [i, { x, y }] of read.points.entries()) {
          expect(Math.abs(x - expected[i]!.x)).toBeLessThanOrEqual(reach);
          expect(Math.abs(y - expected[i]!.y)).toBeLessThanOrEqual(reach);
        }
        const again: Contour = {
          x: Float64Array.from(read.points.slice(0, contour.x.length), ({ x }) => x),
          y: Float64Array.from(read.points.slice(0, contour.x.length), ({ y }) => y),
          noseIndex: contour.noseIndex,
          sharp: contour.sharp,
        };
        expect(writeDat(again, 'Marsh v3', options)).toBe(text);
      }),
      { numRuns: 60 },
    );
  });

  const FIVE = ['1 0.01', '0.5 0.1', '0 0', '0.5 -0.1', '1 -0.01'];
  const POINTS = [
    { x: 1, y: 0.01 },
    { x: 0.5, y: 0.1 },
    { x: 0, y: 0 },
    { x: 0.5, y: -0.1 },
    { x: 1, y: -0.01 },
  ];

  test.each([
    ['commas', FIVE.map((line) => line.replace(' ', ',')).join('\n')],
    ['semicolons and blanks', FIVE.map((line) => ` ${line.replace(' ', ' ; ')} `).join('\r\n')],
    ['tabs, old line ends', FIVE.map((line) => line.replace(' ', '\t\t')).join('\r')],
    ['blank lines', `\n\n${FIVE.join('\n')}\n\n\n`],
    ['exponents', '1.0E0 1.0D-2\n5e-1 .1\n0. 0.\n+0.5 -.1\n1 -1.0d-02'],
    ['a byte order mark', `\ufeff${FIVE.join('\n')}`],
    ['counts', `3. 3.\n\n0 0\n0.5 0.1\n1 0.01\n\n0 0\n0.5 -0.1\n1 -0.01`],
    ['a blank line at the nose', '1 0.01\n0.5 0.1\n0 0\n\n0.5 -0.1\n1 -0.01'],
  ])('reads %s', (_, text) => {
    expect(readDat(text).points).toEqual(POINTS);
    expect(readDat(text).name).toBeNull();
    expect(readDat(`A name\n${text.replace('\ufeff', '')}`)).toMatchObject({
      name: 'A name',
      points: POINTS,
    });
  });

  test.each([
    ['Marsh\n1 0\n0.5 0.1\nx y\n0 0', 'line 4'],
    ['Marsh\n1 0\n0.5\n0 0', 'line 3'],
    ['Marsh\n1 0 7\n0 0', 'line 2'],
    ['Marsh\n1 0\n1e999 0', 'line 3'],
    ['Marsh\n1 NaN', 'line 2'],
    ['', 'points'],
    ['Marsh', 'points'],
    ['1 0\n0 0\n1 0', 'points'],
  ])('refuses %j, naming %s', (text, path) => {
    expect(() => readDat(text)).toThrow(ShapeError);
    expect(() => readDat(text)).toThrow(new RegExp(`^${path}: `));
  });
});
