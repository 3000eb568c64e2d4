import { type Point } from '../../point.ts';
import { CAUTIONS } from '../cautions.ts';
import { LETTER, fittedText, wrappedText } from '../lettering.ts';
import { WIDTH, area, corners, line, outlined, text } from '../marks.ts';
import { type Mark, type Rect, type Weight, type PageDetails } from '../page.ts';
import { qrMarks } from '../qr.ts';
import { scaleBar } from '../scale-bar.ts';
import { checksumText } from '../words.ts';
import { type Tile, type Tiling } from './tiles.ts';

/** What the foot of a template's page says. */
export interface BandContent {
  readonly title: string;
  /** "Root template, chord 220 mm" */
  readonly part: string;
  readonly status: string;
  readonly lines: readonly string[];
  readonly shortCode: string;
  readonly checksum: string;
  readonly address: string;
  /** "Sheet 2 of 6" */
  readonly sheet: string;
  /** "Root template: row A, column 2" */
  readonly tile: string;
}

/** Height of the foot of a template's page, mm. */
export const BAND_MM = 54;

const PAD = 3;
const QR_MM = 36;
const SMALL_LINE = 2.9;
const JOIN = 'Cut one sheet at the dashed line; crosses on crosses.';

/** The foot of a template's page: QR code, what the template is, tile map, scale bar and cautions. */
export function templateBand(
  content: BandContent,
  map: { readonly tiling: Tiling; readonly tile: Tile; readonly outline: readonly Point[] },
  details: PageDetails,
  band: Rect,
): Mark[] {
  const middle = { x: band.x + QR_MM + PAD, width: (band.width - QR_MM) * 0.42 };
  const right = middle.x + middle.width + PAD;
  const last: Rect = { ...band, x: right, width: band.x + band.width - right - PAD };
  return [
    outlined(band, { widthMm: WIDTH.edge }),
    ...qrMarks(details.qr, { x: band.x, y: band.y + 1, width: QR_MM, height: QR_MM }),
    ...codeUnder(content, { x: band.x, y: band.y + QR_MM, width: QR_MM + PAD, height: BAND_MM - QR_MM }),
    ...identityColumn(content, { ...band, ...middle }),
    ...sheetColumn(content, map, last),
  ];
}

/** The short code in large type, and the checksum under it. */
function codeUnder({ shortCode, checksum }: BandContent, room: Rect): Mark[] {
  const width = room.width - PAD;
  const code = fittedText(shortCode, width - PAD, LETTER.largest);
  const sum = fittedText(`SHA-256 ${checksumText(checksum)}`, width - PAD, LETTER.small);
  const x = room.x + PAD;
  return [
    text({ x, y: room.y + 9 }, code.text, code.heightMm, { weight: 800 }),
    text({ x, y: room.y + 14 }, sum.text, sum.heightMm, { ink: 'graphite' }),
  ];
}

function identityColumn(content: BandContent, { x, y, width }: Rect): Mark[] {
  const marks: Mark[] = [];
  let baseline = y + 2;
  const write = (words: string, height: number, weight: Weight, after: number) => {
    const fit = fittedText(words, width - PAD, height);
    baseline += height;
    marks.push(text({ x, y: baseline }, fit.text, fit.heightMm, { weight }));
    baseline += after;
  };
  write(content.title, LETTER.large, 800, 2.2);
  write(content.part, LETTER.title, 600, 1.8);
  write(content.status, LETTER.plain, 600, 2.4);
  for (const words of content.lines) write(words, LETTER.small, 400, 1.3);
  const last = y + BAND_MM - 2;
  const address = wrappedText(content.address, width, LETTER.least).slice(0, 2);
  address.forEach((words, i) => {
    const at = { x, y: last - (address.length - 1 - i) * 2.4 };
    marks.push(text(at, words, LETTER.least, { ink: 'graphite' }));
  });
  return marks;
}

function sheetColumn(
  content: BandContent,
  map: { readonly tiling: Tiling; readonly tile: Tile; readonly outline: readonly Point[] },
  { x, y, width }: Rect,
): Mark[] {
  const mapRoom: Rect = { x: x + width - 44, y: y + 2, width: 44, height: 15 };
  const tile = fittedText(content.tile, width - 48, LETTER.plain);
  const join = map.tiling.tiles.length > 1 ? wrappedText(JOIN, width - 48, LETTER.small).slice(0, 2) : [];
  const bar = { x: x + 0.5, y: y + 26.5 };
  const cautions = [CAUTIONS.print, CAUTIONS.wire, CAUTIONS.fumes].flatMap((of) =>
    wrappedText(of, width, LETTER.small),
  );
  return [
    text({ x, y: y + 5.5 }, content.sheet, LETTER.title, { weight: 800 }),
    text({ x, y: y + 10.5 }, tile.text, tile.heightMm, { weight: 600 }),
    ...join.map((words, i) => text({ x, y: y + 14.5 + 2.6 * i }, words, LETTER.small, { ink: 'graphite' })),
    ...tileMap(map, mapRoom),
    ...scaleBar(bar, 'level'),
    ...cautions.map((words, i) =>
      text({ x, y: y + 32.5 + i * SMALL_LINE }, words, LETTER.small, {
        weight: i < wrappedText(CAUTIONS.print, width, LETTER.small).length ? 600 : 400,
      }),
    ),
  ];
}

/** All tiles in small, this one tinted, with the template across them. */
function tileMap(
  { tiling, tile, outline }: { tiling: Tiling; tile: Tile; outline: readonly Point[] },
  room: Rect,
): Mark[] {
  const minX = Math.min(...tiling.tiles.map((of) => of.minX));
  const maxX = Math.max(...tiling.tiles.map((of) => of.maxX));
  const minY = Math.min(...tiling.tiles.map((of) => of.minY));
  const maxY = Math.max(...tiling.tiles.map((of) => of.maxY));
  const scale = Math.min(room.width / (maxX - minX), room.height / (maxY - minY));
  const left = room.x + room.width - scale * (maxX - minX);
  const place = (px: number, py: number): Point => ({
    x: left + scale * (px - minX),
    y: room.y + scale * (maxY + py),
  });
  const box = (of: Tile): Rect => {
    const { x, y } = place(of.minX, -of.maxY);
    return { x, y, width: scale * (of.maxX - of.minX), height: scale * (of.maxY - of.minY) };
  };
  return [
    area(corners(box(tile)), 'foam'),
    ...tiling.tiles.map((of) => outlined(box(of), { widthMm: WIDTH.hair, ink: 'graphite' })),
    line(
      outline.map(({ x, y }) => place(x, y)),
      { closed: true, widthMm: WIDTH.hair },
    ),
    outlined(box(tile), { widthMm: WIDTH.edge }),
  ];
}
