import { type Finding } from '#geometry/cutting/findings.ts';
import { planSheetStrip } from '#geometry/cutting/sheet-strip.ts';
import { planWireStrip, STRIP_WIDTHS_MM } from '#geometry/cutting/test-strip.ts';
import { writeDxfDocument } from '#geometry/formats/dxf.ts';
import { slugOf } from '#geometry/formats/file-name.ts';
import { type MachineSettings, type MaterialSettings } from '#server/contracts/shop.ts';
import { Refusal } from '#server/refusal.ts';

interface Thing<Settings> {
  readonly name: string;
  readonly settings: Settings;
}

/** What a test strip is made from. */
export interface StripOrder {
  readonly machine: Thing<MachineSettings>;
  readonly material: Thing<MaterialSettings>;
  /** The kerf expected; 0 when nothing is known of it. */
  readonly kerfMm: number;
}

interface StripFile {
  readonly fileName: string;
  readonly mediaType: string;
  readonly text: string;
}

/** An off-cut of this size is enough for the wire; its height is what all pieces and the foam above and below them need. */
const PIECE_MM = { length: 100, height: 90, span: 300 } as const;
const CLEARANCE_MM = 10;
const WARM_UP_S = 3;

/** @throws Refusal `invalid` with what keeps the strip from being cut */
function refuse(findings: readonly Finding[]): never {
  const errors = findings.filter(({ severity }) => severity === 'error');
  throw new Refusal('invalid', { errors: errors.map(({ path, message }) => ({ path, message })) });
}

type Foam = MaterialSettings & { readonly kind: 'foam' };

/**
 * The piece of foam to cut from: as it lies when it is high enough, otherwise an off-cut of its length that stands on edge.
 * @throws Refusal `invalid` when the foam gives none
 */
function pieceOf({ blockLengthMm, blockHeightMm, blockSpanMm }: Foam) {
  const spanMm = Math.min(blockSpanMm, PIECE_MM.span);
  if (blockHeightMm >= PIECE_MM.height) {
    return { lengthMm: Math.min(blockLengthMm, PIECE_MM.length), heightMm: blockHeightMm, spanMm };
  }
  if (blockLengthMm >= PIECE_MM.height) {
    return { lengthMm: blockHeightMm, heightMm: PIECE_MM.height, spanMm };
  }
  const message = `The test strip needs a piece ${PIECE_MM.height} mm high, which this foam does not give.`;
  throw new Refusal('invalid', { errors: [{ path: 'block.heightMm', message }] });
}

function wireProgram({ machine, material, kerfMm }: StripOrder): string | null {
  if (machine.settings.kind !== 'wire' || material.settings.kind !== 'foam') return null;
  const { kind: _kind, ...settings } = machine.settings;
  const { densityKgM3, feedMmMin, maxFeedMmMin } = material.settings;
  const { strip, findings } = planWireStrip({
    machine: { name: machine.name, ...settings },
    material: { name: material.name, densityKgM3, feedMmMin, maxFeedMmMin },
    block: pieceOf(material.settings),
    widthsMm: STRIP_WIDTHS_MM,
    kerfMm,
    clearanceMm: CLEARANCE_MM,
    warmUpS: WARM_UP_S,
  });
  if (!strip || findings.some(({ severity }) => severity === 'error')) refuse(findings);
  return strip.program.text;
}

function sheetDrawing({ machine, material }: StripOrder): string | null {
  const { settings } = machine;
  if (settings.kind === 'wire' || settings.kind === 'bow' || material.settings.kind !== 'sheet') return null;
  const { strip, findings } = planSheetStrip({
    kind: settings.kind,
    machineName: machine.name,
    materialName: material.name,
    sheet: {
      widthMm: Math.min(settings.sheetWidthMm, material.settings.sheetWidthMm),
      heightMm: Math.min(settings.sheetHeightMm, material.settings.sheetHeightMm),
    },
    widthsMm: STRIP_WIDTHS_MM,
  });
  if (!strip) refuse(findings);
  return writeDxfDocument(strip.document, 'r2000');
}

const files = {
  'strip.nc': { of: wireProgram, mediaType: 'text/plain; charset=utf-8', extension: 'nc' },
  'strip.dxf': { of: sheetDrawing, mediaType: 'image/vnd.dxf', extension: 'dxf' },
} as const;
export type StripName = keyof typeof files;

/**
 * The file that cuts a test strip for the kerf: a program for a wire machine in foam, a drawing for a laser or router in sheet.
 * @throws Refusal `not-found` for a pair that has no such file; `invalid` when the strip cannot be cut there
 */
export function stripFile(name: StripName, order: StripOrder): StripFile {
  const { of, mediaType, extension } = files[name];
  const text = of(order);
  if (text === null) {
    const detail =
      order.machine.settings.kind === 'bow'
        ? 'A hand bow has no program: cut a piece between two straight rails and measure it.'
        : 'This machine cuts no such test strip in this material.';
    throw new Refusal('not-found', { detail });
  }
  const slug = (thing: { readonly name: string }, otherwise: string) => slugOf(thing.name) || otherwise;
  const parts = ['test-strip', slug(order.machine, 'machine'), slug(order.material, 'material')];
  return { fileName: `${parts.join('_')}.${extension}`, mediaType, text };
}
