import { LETTER } from './lettering.ts';
import { WIDTH, outlined, segment, text } from './marks.ts';
import { type Mark, type Rect } from './page.ts';

/** Sheets that drawings stand on, lying (ISO 216). */
export const SHEETS = {
  A4: { widthMm: 297, heightMm: 210 },
  A3: { widthMm: 420, heightMm: 297 },
} as const;
export type SheetSize = keyof typeof SHEETS;

/** Borders and fields of ISO 5457: 20 mm at the left for filing, 10 mm elsewhere, fields of 50 mm from the centring marks. */
const FILING_MM = 20;
const BORDER_MM = 10;
const FIELD_MM = 50;
const MARK_MM = 4;
/** Letters of the fields, without I and O. */
const LETTERS = 'ABCDEFGHJKLMNPQRSTUVWXYZ';

/** The frame of a sheet: what is drawn stands inside of it. */
export function frameOf(size: SheetSize): Rect {
  const { widthMm, heightMm } = SHEETS[size];
  return {
    x: FILING_MM,
    y: BORDER_MM,
    width: widthMm - FILING_MM - BORDER_MM,
    height: heightMm - 2 * BORDER_MM,
  };
}

/** Frame, centring marks, and the fields by which places on the sheet are named: numbers along it, letters down its sides. */
export function sheetFrame(size: SheetSize): Mark[] {
  const { widthMm, heightMm } = SHEETS[size];
  const frame = frameOf(size);
  const [right, bottom] = [frame.x + frame.width, frame.y + frame.height];
  const columns = fields(widthMm / 2, frame.x, right);
  const rows = fields(heightMm / 2, frame.y, bottom);
  const thin = { widthMm: WIDTH.hair, ink: 'graphite' } as const;
  const name = { anchor: 'middle', ink: 'graphite' } as const;
  const down = LETTER.plain / 2;
  const out = MARK_MM / 2 + 0.6;
  return [
    outlined(frame, { widthMm: WIDTH.frame }),
    ...columns.edges.flatMap((x) => [
      segment(x, frame.y - MARK_MM, x, frame.y, thin),
      segment(x, bottom, x, bottom + MARK_MM, thin),
    ]),
    ...rows.edges.flatMap((y) => [
      segment(frame.x - MARK_MM, y, frame.x, y, thin),
      segment(right, y, right + MARK_MM, y, thin),
    ]),
    ...columns.middles.flatMap((x, i) => [
      text({ x, y: frame.y - out + down }, String(i + 1), LETTER.plain, name),
      text({ x, y: bottom + out + down }, String(i + 1), LETTER.plain, name),
    ]),
    ...rows.middles.flatMap((y, i) => [
      text({ x: frame.x - out, y: y + down }, LETTERS.charAt(i), LETTER.plain, name),
      text({ x: right + out, y: y + down }, LETTERS.charAt(i), LETTER.plain, name),
    ]),
  ];
}

/** Edges of fields counted from the middle of the sheet, and the middles between them. */
function fields(middle: number, from: number, to: number): { edges: number[]; middles: number[] } {
  const first = middle - Math.floor((middle - from) / FIELD_MM) * FIELD_MM;
  const edges: number[] = [];
  // A field narrower than half of one goes with its neighbour.
  for (let at = first; at < to - FIELD_MM / 2; at += FIELD_MM) if (at > from + FIELD_MM / 2) edges.push(at);
  const all = [from, ...edges, to];
  return { edges, middles: all.slice(1).map((at, i) => (at + (all[i] ?? at)) / 2) };
}
