import { type z } from 'zod';
import { arcContour, arcExtents, largestArcError } from '../contour/arcs.ts';
import { type Contour, extents, scaleContour } from '../contour/contour.ts';
import { largestChordalError, sampleCosine, sampleToTolerance } from '../contour/sampling.ts';
import { issuesOf, ShapeError } from '../shapes/error.ts';
import { type Outline } from '../shapes/outline.ts';
import { type Shape, outlineOf } from '../shapes/shape.ts';
import { writeDat } from './dat.ts';
import { DXF_DECIMALS } from './dxf-tags.ts';
import { writeDxf } from './dxf.ts';
import { fileNameOf } from './file-name.ts';
import { type FileIdentity, headerLines } from './identity.ts';
import {
  type DatOptions,
  type DxfOptions,
  type SvgOptions,
  datOptionsSchema,
  dxfOptionsSchema,
  svgOptionsSchema,
} from './options.ts';
import { roundContour, roundTo, withoutRepeats } from './rounding.ts';
import { sectionDrawing } from './section-drawing.ts';
import { SVG_DECIMALS, writeSvg } from './svg.ts';

export { fileNameOf } from './file-name.ts';
export { datOptionsSchema, dxfOptionsSchema, svgOptionsSchema } from './options.ts';
export type { FileIdentity } from './identity.ts';

/** The options of each format, as the schemas give them. */
export interface ExportOptions {
  readonly dat: DatOptions;
  readonly dxf: DxfOptions;
  readonly svg: SvgOptions;
}
export type ExportFormat = keyof ExportOptions;

/** What can be said about a file before it is opened. Measured on the rounded coordinates that stand in the file. */
interface ExportFacts {
  /** Different points of the outline. */
  readonly points: number;
  /** Pieces of the outline that are arcs; 0 for straight pieces only. */
  readonly arcs: number;
  /** Unit of the three lengths below: `mm`, or `chord` for a file in fractions of chord. */
  readonly unit: 'mm' | 'chord';
  readonly widthMm: number;
  readonly heightMm: number;
  /** Largest distance of the outline from the pieces in the file. */
  readonly largestErrorMm: number;
}

export interface ExportFile {
  readonly fileName: string;
  readonly mediaType: string;
  readonly text: string;
  readonly facts: ExportFacts;
}

const MEDIA_TYPES: Readonly<Record<ExportFormat, string>> = {
  dat: 'text/plain; charset=utf-8',
  dxf: 'image/vnd.dxf',
  svg: 'image/svg+xml',
};

/**
 * Options from a query string, a form or code.
 *
 * @throws ShapeError naming every option that is unknown, missing or out of range
 */
export function parseExportOptions<F extends ExportFormat>(format: F, options: unknown): ExportOptions[F] {
  const schemas: { readonly [K in ExportFormat]: z.ZodType<ExportOptions[K]> } = {
    dat: datOptionsSchema,
    dxf: dxfOptionsSchema,
    svg: svgOptionsSchema,
  };
  const result = schemas[format].safeParse(options);
  if (result.success) return result.data;
  throw new ShapeError(issuesOf(result.error, (key) => `${key} is not an option of a ${format} file`));
}

/**
 * The file of a section in one format: the one door for the server's routes and for the export panel. The same arguments
 * give the same bytes.
 *
 * @param shape a valid shape
 * @param options checked again here
 * @throws ShapeError naming the options that are refused, or `decimals` when rounding makes points of a coordinate file coincide
 */
export function exportFile<F extends ExportFormat>(
  format: F,
  shape: Shape,
  identity: FileIdentity,
  options: ExportOptions[F],
): ExportFile {
  const writers: {
    readonly [K in ExportFormat]: (
      outline: Outline,
      identity: FileIdentity,
      options: ExportOptions[K],
    ) => Written;
  } = {
    dat: datFile,
    dxf: dxfFile,
    svg: svgFile,
  };
  const { chordMm, text, facts } = writers[format](
    outlineOf(shape),
    identity,
    parseExportOptions(format, options),
  );
  return { fileName: fileNameOf(identity, chordMm, format), mediaType: MEDIA_TYPES[format], text, facts };
}

interface Written {
  readonly chordMm: number | null;
  readonly text: string;
  readonly facts: ExportFacts;
}

function datFile(outline: Outline, identity: FileIdentity, options: DatOptions): Written {
  const chordMm = options.chordMm ?? null;
  const toTolerance = options.spacing === 'tolerance' && chordMm !== null;
  const contour = toTolerance
    ? sampleToTolerance(outline, (options.toleranceMm - roundingReach(options.decimals)) / chordMm)
    : sampleCosine(outline, options.points);
  const spacing = toTolerance
    ? `tolerance ${options.toleranceMm} mm`
    : `${options.points} points per surface`;
  const rounded = roundContour(scaleContour(contour, chordMm ?? 1), options.decimals);
  const written = toTolerance ? withoutRepeats(rounded) : rounded;
  const title = headerLines(identity, { chordMm, spacing }).join(', ');
  return {
    chordMm,
    text: writeDat(written, title, options),
    facts: contourFacts(outline, written, chordMm, options.decimals),
  };
}

function dxfFile(outline: Outline, identity: FileIdentity, options: DxfOptions): Written {
  const { chordMm, toleranceMm, layers } = options;
  const form = options.arcs
    ? arcForm(outline, chordMm, toleranceMm)
    : lineForm(outline, chordMm, toleranceMm, DXF_DECIMALS);
  const spacing = `tolerance ${toleranceMm} mm${options.arcs ? ', tangent arcs' : ''}`;
  const drawing = sectionDrawing({ outline, identity, chordMm, toleranceMm, layers, spacing, ...form });
  return { chordMm, text: writeDxf(drawing, options.release), facts: form.facts };
}

function svgFile(
  outline: Outline,
  identity: FileIdentity,
  { chordMm, toleranceMm, layers }: SvgOptions,
): Written {
  const form = lineForm(outline, chordMm, toleranceMm, SVG_DECIMALS);
  const spacing = `tolerance ${toleranceMm} mm`;
  const drawing = sectionDrawing({ outline, identity, chordMm, toleranceMm, layers, spacing, ...form });
  return { chordMm, text: writeSvg(drawing), facts: form.facts };
}

function lineForm(outline: Outline, chordMm: number, toleranceMm: number, decimals: number) {
  const contour = sampleToTolerance(outline, (toleranceMm - roundingReach(decimals)) / chordMm);
  const chain = withoutRepeats(roundContour(scaleContour(contour, chordMm), decimals));
  return { chain, extents: extents(chain), facts: contourFacts(outline, chain, chordMm, decimals) };
}

/** Arcs shorter than this are noise to a controller. */
const SHORTEST_ARC_MM = 0.001;

function arcForm(outline: Outline, chordMm: number, toleranceMm: number) {
  const tolerance = toleranceMm - roundingReach(DXF_DECIMALS);
  const arcs = arcContour(outline, tolerance / chordMm, Math.min(SHORTEST_ARC_MM, tolerance) / chordMm);
  const x = arcs.x.map((value) => roundTo(value * chordMm, DXF_DECIMALS));
  const y = arcs.y.map((value) => roundTo(value * chordMm, DXF_DECIMALS));
  const written = { ...arcs, x: x.map((value) => value / chordMm), y: y.map((value) => value / chordMm) };
  const box = arcExtents(written);
  const facts: ExportFacts = {
    points: x.length,
    arcs: arcs.bulge.reduce((count, bulge) => (bulge === 0 ? count : count + 1), 0),
    unit: 'mm',
    widthMm: (box.maxX - box.minX) * chordMm,
    heightMm: (box.maxY - box.minY) * chordMm,
    largestErrorMm: largestArcError(outline, written) * chordMm,
  };
  const extentsMm = {
    minX: box.minX * chordMm,
    maxX: box.maxX * chordMm,
    minY: box.minY * chordMm,
    maxY: box.maxY * chordMm,
  };
  return { chain: { x, y, bulge: arcs.bulge }, extents: extentsMm, facts };
}

function contourFacts(
  outline: Outline,
  written: Contour,
  chordMm: number | null,
  decimals: number,
): ExportFacts {
  const scale = chordMm ?? 1;
  const box = extents(written);
  return {
    points: written.x.length,
    arcs: 0,
    unit: chordMm === null ? 'chord' : 'mm',
    widthMm: roundTo(box.maxX - box.minX, decimals),
    heightMm: roundTo(box.maxY - box.minY, decimals),
    largestErrorMm: largestChordalError(outline, scaleContour(written, 1 / scale)) * scale,
  };
}

/** How far rounding to `decimals` can move a point; taken off the tolerance beforehand, so that the written file keeps it. */
function roundingReach(decimals: number): number {
  return Math.SQRT1_2 * 10 ** -decimals;
}
