import { zodResolver } from '@hookform/resolvers/zod';
import { type FieldErrors, type Resolver } from 'react-hook-form';
import {
  datOptionsSchema,
  dxfOptionsSchema,
  type ExportFormat,
  svgOptionsSchema,
} from '#geometry/formats/export.ts';
import { type Layer, LAYERS } from '#geometry/formats/options.ts';

/** What the export form holds: numbers as they were typed, so that nothing typed is lost; the schemas read them. */
export interface ExportFields {
  format: ExportFormat;
  /** Only a coordinate file can do without a chord: its numbers are then fractions of chord. */
  unitChord: boolean;
  chordMm: number;
  /** A tolerance is in mm and needs a chord; a unit chord is spaced by cosine. */
  spacing: 'cosine' | 'tolerance';
  points: string;
  toleranceMm: number;
  layers: Layer[];
  release: 'r12' | 'r2000';
  arcs: boolean;
  decimals: string;
  newline: 'lf' | 'crlf';
  order: 'round' | 'surfaces';
}

export const exportSchemas = { dat: datOptionsSchema, dxf: dxfOptionsSchema, svg: svgOptionsSchema } as const;

/** The form as it opens; its values are the defaults of the schemas. */
export function startingFields(chordMm: number): ExportFields {
  const dat = datOptionsSchema.parse({});
  const dxf = dxfOptionsSchema.parse({ chordMm });
  return {
    format: 'dxf',
    unitChord: false,
    chordMm,
    spacing: dat.spacing,
    points: String(dat.points),
    toleranceMm: dxf.toleranceMm,
    layers: [...LAYERS],
    release: dxf.release,
    arcs: dxf.arcs,
    decimals: String(dat.decimals),
    newline: dat.newline,
    order: dat.order,
  };
}

/** The options of the chosen format, as its schema takes them; fields that do not concern the format are left out. */
export function optionsOf(fields: ExportFields): Readonly<Record<string, unknown>> {
  const { chordMm, toleranceMm, layers, release, arcs, points, spacing, order, decimals, newline } = fields;
  if (fields.format === 'svg') return { chordMm, toleranceMm, layers };
  if (fields.format === 'dxf') return { chordMm, toleranceMm, release, layers, arcs };
  const shared = { order, decimals: given(decimals), newline };
  if (fields.unitChord) return { ...shared, spacing: 'cosine', points: given(points) };
  const spaced = spacing === 'tolerance' ? { toleranceMm } : { points: given(points) };
  return { ...shared, chordMm, spacing, ...spaced };
}

/** The schemas take an empty field for an absent one and fall back to a default; a person who emptied it is told instead. */
function given(text: string): string {
  return text.trim() === '' ? 'nothing' : text;
}

/** The same options as a query string takes them. */
export function queryOf(fields: ExportFields): Record<string, string> {
  return Object.fromEntries(Object.entries(optionsOf(fields)).map(([name, value]) => [name, String(value)]));
}

/** Checks the chosen format's options with its own schema; a field of another format cannot stand in the way. */
export const exportResolver: Resolver<ExportFields> = async (fields, context, settings) => {
  const resolve = zodResolver<Record<string, unknown>, unknown, object>(exportSchemas[fields.format]);
  const answer = await resolve(optionsOf(fields), context, settings as never);
  const errors = answer.errors as FieldErrors<ExportFields>;
  return Object.keys(errors).length > 0 ? { values: {}, errors } : { values: fields, errors: {} };
};
