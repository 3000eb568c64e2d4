import { type Chain, type SourcePoint } from './chains.ts';
import { blocksOf } from './coordinate-blocks.ts';
import { readRows } from './coordinate-rows.ts';
import { type ImportedContour, contourOf } from './imported.ts';
import { ImportRefusal } from './refusal.ts';
import { textOf } from './text.ts';

/** Kinds of file by the end of their name that are no text of coordinates, whatever is in them. */
const OTHER_KINDS: Readonly<Record<string, string>> = {
  dwg: 'a drawing in a closed format: write it as DXF',
  pdf: 'a PDF document',
  xls: 'a spreadsheet: write it as CSV',
  xlsx: 'a spreadsheet: write it as CSV',
  ods: 'a spreadsheet: write it as CSV',
  doc: 'a word processor’s document: write it as plain text',
  docx: 'a word processor’s document: write it as plain text',
  png: 'a picture',
  jpg: 'a picture',
  jpeg: 'a picture',
  zip: 'an archive: unpack it first',
};

/**
 * Reads a section from a file of coordinates: one `x y` on a line, in any of the usual dialects. The points may run round the outline in
 * either direction or surface by surface; the unit may be the chord, per cent of it, or mm; numbers may be parted by blanks, tabs,
 * commas or semicolons and have decimal commas; comments, title, count lines and blank lines may stand between. Work grows as
 * n log n with the size of the file.
 * @param fileName as the person's computer calls it: its ending tells other kinds of file
 * @throws ImportRefusal when the file is no outline of one section, with the line at fault
 */
export function readCoordinates(bytes: Uint8Array, fileName: string): ImportedContour {
  const ending = fileName.slice(fileName.lastIndexOf('.') + 1).toLowerCase();
  const other = Object.hasOwn(OTHER_KINDS, ending) ? OTHER_KINDS[ending] : undefined;
  if (other !== undefined) throw new ImportRefusal('wrong-type', `This is ${other}.`);
  const { text, note } = textOf(bytes);
  refuseOtherText(text);
  const rows = readRows(text);
  const { blocks, notes } = blocksOf(rows);
  const chains = surfacesApart(blocks);
  return contourOf({
    name: rows.name,
    groups: [chains],
    unit: { mm: null, hundred: rows.namesMm ? 'mm' : 'percent' },
    notes: [...(note === null ? [] : [note]), ...rows.notes, ...notes],
    divided: new Set(),
    joint: 1e-9,
    extras: false,
    ordered: true,
  });
}

const LOOKED_AT = 200;

function refuseOtherText(text: string): void {
  const start = text.slice(0, LOOKED_AT).trimStart();
  if (start === '' && text.trim() === '') throw new ImportRefusal('empty', 'The file holds blanks only.');
  if (start.startsWith('<')) {
    throw new ImportRefusal('markup', 'The file is HTML or XML, not a list of coordinates.', 1);
  }
  if (start.startsWith('{'))
    throw new ImportRefusal('wrong-type', 'The file is JSON or code, not coordinates.');
  if (/^0\s*[\r\n]\s*SECTION\b/.test(start)) {
    throw new ImportRefusal('wrong-type', 'The file is a DXF drawing: choose it as such.');
  }
}

/** Shares of the longest distance between two neighbours of a list. */
const JUMP = 0.6;
const SPAN = 0.7;
const LEAST_PART = 3;

/**
 * One list that holds the surfaces one after the other, each in the same direction, has one step along the whole chord, and reaches
 * along the chord before and after it. Such a list is parted there.
 */
function surfacesApart(blocks: readonly Chain[]): readonly Chain[] {
  const [block, more] = blocks;
  if (!block || more) return blocks;
  const reach = Math.max(...extent(block));
  let [at, longest] = [0, 0];
  for (let i = 1; i < block.length; i++) {
    const step = distance(block[i - 1], block[i]);
    if (step > longest) [at, longest] = [i, step];
  }
  const parts = [block.slice(0, at), block.slice(at)];
  const apart =
    longest > JUMP * reach &&
    parts.every((part) => part.length >= LEAST_PART && distance(part[0], part.at(-1)) > SPAN * reach);
  return apart ? parts : blocks;
}

function extent(block: Chain): readonly [number, number] {
  let [minX, maxX, minY, maxY] = [Infinity, -Infinity, Infinity, -Infinity];
  for (const { x, y } of block) {
    [minX, maxX] = [Math.min(minX, x), Math.max(maxX, x)];
    [minY, maxY] = [Math.min(minY, y), Math.max(maxY, y)];
  }
  return [maxX - minX, maxY - minY];
}

function distance(a: SourcePoint | undefined, b: SourcePoint | undefined): number {
  return a && b ? Math.hypot(a.x - b.x, a.y - b.y) : 0;
}
