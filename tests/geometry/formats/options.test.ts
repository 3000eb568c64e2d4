import { describe, expect, test } from 'vitest';
import { type ExportFormat, parseExportOptions } from '#geometry/formats/export.ts';
import { ShapeError, type ShapeIssue } from '#geometry/shapes/error.ts';

function issuesOf(format: ExportFormat, options: unknown): readonly ShapeIssue[] {
  try {
    parseExportOptions(format, options);
  } catch (error) {
    if (error instanceof ShapeError) return error.issues;
    throw error;
  }
  return [];
}

describe('options of a coordinate file', () => {
  test('have defaults', () => {
    expect(parseExportOptions('dat', {})).toEqual({
      points: 100,
      order: 'round',
      decimals: 6,
      newline: 'lf',
      spacing: 'cosine',
      toleranceMm: 0.01,
    });
  });

  test('read a query string', () => {
    const query = Object.fromEntries(
      new URLSearchParams('points=60&chordMm=220.5&order=surfaces&decimals=8&newline=crlf'),
    );
    expect(parseExportOptions('dat', query)).toEqual({
      points: 60,
      chordMm: 220.5,
      order: 'surfaces',
      decimals: 8,
      newline: 'crlf',
      spacing: 'cosine',
      toleranceMm: 0.01,
    });
  });

  test('take an empty form field as absent', () => {
    expect(parseExportOptions('dat', { chordMm: ' ', points: '', order: '' })).not.toHaveProperty(
      'chordMm',
      0,
    );
    expect(parseExportOptions('dat', { chordMm: '', points: '' }).points).toBe(100);
  });

  test('need the chord for a tolerance in mm', () => {
    expect(issuesOf('dat', { spacing: 'tolerance' })).toEqual([
      { path: 'chordMm', message: 'The chord is needed for spacing to a tolerance in mm.' },
    ]);
    expect(issuesOf('dat', { spacing: 'tolerance', chordMm: 220 })).toEqual([]);
  });

  test.each([
    [{ points: 9 }, 'points', 'The number of points per surface must be a whole number from 10 to 1000.'],
    [{ points: 1001 }, 'points', 'The number of points per surface must be a whole number from 10 to 1000.'],
    [{ points: 20.5 }, 'points', 'The number of points per surface must be a whole number from 10 to 1000.'],
    [{ chordMm: 9.99 }, 'chordMm', 'The chord must be a number from 10 to 5000 mm.'],
    [{ decimals: 3 }, 'decimals', 'The number of decimals must be a whole number from 4 to 10.'],
    [{ decimals: 11 }, 'decimals', 'The number of decimals must be a whole number from 4 to 10.'],
    [{ order: 'backwards' }, 'order', 'The order must be one of round, surfaces.'],
    [{ newline: 'cr' }, 'newline', 'The line end must be one of lf, crlf.'],
    [{ spacing: 'even' }, 'spacing', 'The spacing must be one of cosine, tolerance.'],
    [{ toleranceMm: 0.0009 }, 'toleranceMm', 'The tolerance must be a number from 0.001 to 1 mm.'],
    [{ layers: 'TEXT' }, 'layers', 'layers is not an option of a dat file'],
  ])('%j is refused by name', (options, path, message) => {
    expect(issuesOf('dat', options)).toEqual([{ path, message }]);
  });
});

describe('options of a DXF drawing', () => {
  test('have defaults beside the chord', () => {
    expect(parseExportOptions('dxf', { chordMm: '220' })).toEqual({
      chordMm: 220,
      toleranceMm: 0.01,
      release: 'r2000',
      layers: ['OUTLINE', 'CHORD', 'CAMBER', 'TEXT'],
      arcs: false,
    });
  });

  test('are their own fixed point', () => {
    const parsed = parseExportOptions('dxf', {
      chordMm: '220',
      layers: 'text, outline',
      arcs: 'true',
      release: 'r12',
    });
    expect(parsed).toEqual({
      chordMm: 220,
      toleranceMm: 0.01,
      release: 'r12',
      layers: ['OUTLINE', 'TEXT'],
      arcs: true,
    });
    expect(parseExportOptions('dxf', parsed)).toEqual(parsed);
  });

  test.each(['false', '0', 'off', '', false, undefined])('arcs=%j means none', (arcs) => {
    expect(parseExportOptions('dxf', { chordMm: 220, arcs }).arcs).toBe(false);
  });

  test.each([NaN, Infinity, '0x1F4', '1e3', '12,5', 'wide', null, true, [220], ['220', '230'], {}])(
    'a chord of %j is refused',
    (chordMm) => {
      expect(issuesOf('dxf', { chordMm })).toEqual([
        { path: 'chordMm', message: 'The chord must be a number from 10 to 5000 mm.' },
      ]);
    },
  );

  test('every refused option is named', () => {
    const issues = issuesOf('dxf', {
      toleranceMm: 2,
      release: 'r14',
      layers: 'OUTLINE,HATCH',
      arcs: 'maybe',
      zoom: 1,
      x: 2,
    });
    expect(issues.map(({ path }) => path).sort()).toEqual(
      ['arcs', 'chordMm', 'layers.1', 'release', 'toleranceMm', 'x', 'zoom'].sort(),
    );
    expect(issues.find(({ path }) => path === 'layers.1')?.message).toBe(
      'The layers must be a comma list of OUTLINE, CHORD, CAMBER, TEXT.',
    );
  });

  test('a drawing without a layer is refused', () => {
    expect(issuesOf('svg', { chordMm: 220, layers: [] })).toEqual([
      { path: 'layers', message: 'Choose at least one layer.' },
    ]);
  });
});
