import { describe, expect, it } from 'vitest';
import {
  exportResolver,
  exportSchemas,
  optionsOf,
  queryOf,
  startingFields,
} from '#client/versions/export-fields.ts';

const start = startingFields(220);
const resolve = (fields: typeof start) =>
  exportResolver(fields, undefined, { fields: {}, shouldUseNativeValidation: false });

describe('the export form', () => {
  it('opens with options that every schema takes', () => {
    for (const format of ['dat', 'dxf', 'svg'] as const) {
      expect(exportSchemas[format].safeParse(optionsOf({ ...start, format })).success, format).toBe(true);
    }
  });

  it('writes a query that the schema reads as the same options', () => {
    for (const format of ['dat', 'dxf', 'svg'] as const) {
      const fields = {
        ...start,
        format,
        layers: ['OUTLINE', 'TEXT'],
        arcs: true,
        points: '57',
      } as typeof start;
      expect(exportSchemas[format].parse(queryOf(fields))).toEqual(
        exportSchemas[format].parse(optionsOf(fields)),
      );
    }
  });

  it('leaves the chord out for a unit chord', () => {
    expect(queryOf({ ...start, format: 'dat', unitChord: true })).not.toHaveProperty('chordMm');
    expect(queryOf({ ...start, format: 'dxf', unitChord: true })).toHaveProperty('chordMm', '220');
  });

  it('names the field at fault', async () => {
    const { errors } = await resolve({ ...start, format: 'dat', points: '9', decimals: '' });
    expect(Object.keys(errors).sort()).toEqual(['decimals', 'points']);
    expect(errors.points?.message).toMatch(/from 10 to 1000/);
  });

  it('does not let a field of another format stand in the way', async () => {
    expect((await resolve({ ...start, format: 'dxf', points: 'many' })).errors).toEqual({});
  });

  it('refuses a drawing without layers', async () => {
    expect((await resolve({ ...start, layers: [] })).errors.layers?.message).toMatch(/at least one layer/i);
  });

  it('spaces a unit chord by cosine, since a tolerance in mm needs a chord in mm', () => {
    const fields = { ...start, format: 'dat', unitChord: true, spacing: 'tolerance' } as const;
    expect(queryOf(fields)).toMatchObject({ spacing: 'cosine', points: '100' });
    expect(queryOf({ ...fields, unitChord: false })).toMatchObject({ spacing: 'tolerance', chordMm: '220' });
  });
});
