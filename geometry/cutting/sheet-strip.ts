import { z } from 'zod';
import { type DxfDocument, type DxfEntity } from '../formats/dxf-document.ts';
import { type Polyline, boxOf, polylineOf } from './arrays.ts';
import { name } from './fields.ts';
import { RIB_LAYERS } from './files/layers.ts';
import { type Finding, error, findingsOf, mm } from './findings.ts';
import { ribsSchema } from './plan.ts';
import { strokeText, strokeWidth } from './strokes.ts';
import { stripWidthsSchema } from './test-strip.ts';

/** A test strip on a laser or a router. */
export const sheetStripSchema = z.strictObject({
  kind: z.enum(['laser', 'router'], { error: 'A sheet is cut by a laser or a router.' }),
  machineName: name,
  materialName: name,
  sheet: ribsSchema.shape.sheet.pick({ widthMm: true, heightMm: true }),
  widthsMm: stripWidthsSchema,
});
type SheetStripPlan = z.infer<typeof sheetStripSchema>;

/** A plate with a row of squares, its lower left corner at the origin, all lengths in mm. */
export interface SheetStrip {
  readonly squares: readonly { readonly commandedMm: number; readonly outline: Polyline }[];
  readonly plate: Polyline;
  /** The widths, in single strokes under the squares. */
  readonly engraved: readonly Polyline[];
  /** The drawing to write: squares first, the plate last, so that nothing moves before it is cut. */
  readonly document: DxfDocument;
}

const MARGIN_MM = 10;
/** Between squares: more than the widest kerf. */
const GAP_MM = 10;
const DIGITS_MM = 4;
const TEXT_MM = 3;

/** Those of a sheet of ribs that a strip needs. */
const LAYERS = RIB_LAYERS.filter(({ name: layer }) => layer !== 'REFERENCE');

const CAUTIONS = {
  laser: 'Caution: beam and fumes, cut behind the closed cover, with extraction, and stay with it.',
  router: 'Caution: rotating cutter and dust, hold the small squares down, protect eyes and ears.',
} as const;

/**
 * A test strip for the kerf of a laser or router: squares of commanded widths, cut with the beam's or cutter's centre on the line, so that each square
 * that falls out is narrower than commanded by one kerf, half of it on either side.
 * @returns no strip while its values are refused or it does not fit on the sheet
 */
export function planSheetStrip(values: unknown): {
  readonly strip: SheetStrip | null;
  readonly findings: readonly Finding[];
} {
  const parsed = sheetStripSchema.safeParse(values);
  if (!parsed.success) return { strip: null, findings: findingsOf(parsed.error) };
  const plan = parsed.data;
  const floor = MARGIN_MM + DIGITS_MM + MARGIN_MM / 2;
  let pen = MARGIN_MM;
  const squares = plan.widthsMm.map((commandedMm) => {
    const outline = rectangle(pen, floor, commandedMm, commandedMm);
    // Digits may be wider than a small square.
    const room = Math.max(commandedMm, strokeWidth(String(commandedMm)) * DIGITS_MM);
    pen += room + GAP_MM;
    return { commandedMm, outline };
  });
  const [width, height] = [pen - GAP_MM + MARGIN_MM, floor + Math.max(...plan.widthsMm) + MARGIN_MM];
  const findings = fitFindings(plan, width, height);
  if (findings.length > 0) return { strip: null, findings };
  const plate = rectangle(0, 0, width, height);
  const engraved = squares.flatMap(({ commandedMm, outline }) => {
    const text = String(commandedMm);
    const x = boxOf(outline).minX + (strokeWidth(text) * DIGITS_MM) / 2;
    return strokeText(text, { x, y: MARGIN_MM + DIGITS_MM / 2 }, DIGITS_MM);
  });
  const drawn = { squares, plate, engraved };
  return { strip: { ...drawn, document: documentOf(plan, drawn, width, height) }, findings };
}

function rectangle(x: number, y: number, width: number, height: number): Polyline {
  return polylineOf([
    { x, y },
    { x: x + width, y },
    { x: x + width, y: y + height },
    { x, y: y + height },
  ]);
}

function fitFindings({ sheet }: SheetStripPlan, width: number, height: number): Finding[] {
  return (
    [
      ['widthMm', 'wide', width],
      ['heightMm', 'high', height],
    ] as const
  ).flatMap(([field, word, size]) => {
    if (size <= sheet[field]) return [];
    const message = `The strip needs a sheet ${mm(size)} ${word}, this one has ${mm(sheet[field])}.`;
    return [error('strip-larger-than-sheet', `sheet.${field}`, message)];
  });
}

function documentOf(
  plan: SheetStripPlan,
  { squares, plate, engraved }: Omit<SheetStrip, 'document'>,
  width: number,
  height: number,
): DxfDocument {
  const closed = (chain: Polyline): DxfEntity => ({ kind: 'polyline', layer: 'CUT', chain, closed: true });
  const notes = notesOf(plan);
  const lineOf = (i: number) => -2 * TEXT_MM * (i + 1);
  return {
    comments: notes,
    layers: LAYERS,
    entities: [
      ...engraved.map((chain): DxfEntity => ({ kind: 'polyline', layer: 'ENGRAVE', chain, closed: false })),
      ...squares.map(({ outline }) => closed(outline)),
      closed(plate),
      ...notes.map((text, i): DxfEntity => ({
        kind: 'text',
        layer: 'TEXT',
        text: { text, x: 0, y: lineOf(i), height: TEXT_MM },
      })),
    ],
    extents: { minX: 0, maxX: width, minY: lineOf(notes.length - 1), maxY: height },
  };
}

function notesOf({ kind, machineName, materialName, widthsMm }: SheetStripPlan): string[] {
  return [
    `Test strip for the kerf, ${machineName}, ${materialName}`,
    `Squares of ${widthsMm.join(', ')} mm: cut with the ${kind === 'laser' ? 'beam' : 'cutter'} on the line, its own compensation off`,
    'Measure each square in both directions: the kerf is commanded less measured',
    CAUTIONS[kind],
  ];
}
