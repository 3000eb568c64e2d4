import { type SheetIdentity } from '../cutting/files/identity.ts';
import { LETTER, fittedText } from './lettering.ts';
import { WIDTH, outlined, segment, text } from './marks.ts';
import { type Mark, type Rect, type Weight } from './page.ts';
import { checksumText, dayOf, sectionLine } from './words.ts';

/** Size of the title block (ISO 7200 asks for a width of 180 mm), mm. */
export const TITLE_BLOCK = { width: 180, height: 42 } as const;

/** What changes from sheet to sheet. */
export interface SheetWords {
  readonly owner: string;
  readonly documentType: string;
  /** Scales of the views on it. */
  readonly scale: string;
  readonly paper: string;
  readonly number: number;
  readonly of: number;
}

interface Cell {
  readonly label: string;
  readonly words: string;
  readonly row: number;
  /** Shares of the block. */
  readonly from: number;
  readonly width: number;
  readonly heightMm?: number;
  readonly weight?: Weight;
}

const ROWS = [0, 0.34, 0.56, 0.78, 1] as const;
const PAD = 1.6;

/** The title block with the data fields of ISO 7200. */
export function titleBlock(identity: SheetIdentity, words: SheetWords, at: Pick<Rect, 'x' | 'y'>): Mark[] {
  const block: Rect = { ...at, ...TITLE_BLOCK };
  const edge = (row: number) => block.y + (ROWS[row] ?? 1) * block.height;
  const cells = cellsOf(identity, words);
  return [
    outlined(block, { widthMm: WIDTH.frame }),
    ...[1, 2, 3].map((row) => segment(block.x, edge(row), block.x + block.width, edge(row))),
    ...cells
      .filter(({ from }) => from > 0)
      .map(({ from, row }) => {
        const x = block.x + from * block.width;
        return segment(x, edge(row), x, edge(row + 1));
      }),
    ...cells.flatMap((cell) => cellMarks(cell, block, edge(cell.row), edge(cell.row + 1))),
  ];
}

function cellsOf(identity: SheetIdentity, of: SheetWords): Cell[] {
  const large = { heightMm: LETTER.large, weight: 800 } as const;
  const { releasedBy, releasedAt } = identity;
  return [
    { label: 'Title', words: identity.sheetName, row: 0, from: 0, width: 0.6, ...large },
    { label: 'Short code', words: identity.shortCode, row: 0, from: 0.6, width: 0.28, ...large },
    { label: 'Version', words: String(identity.versionNumber), row: 0, from: 0.88, width: 0.12, ...large },
    { label: 'Root section', words: sectionLine(identity, 'root'), row: 1, from: 0, width: 0.38 },
    { label: 'Tip section', words: sectionLine(identity, 'tip'), row: 1, from: 0.38, width: 0.38 },
    { label: 'Status', words: identity.status, row: 1, from: 0.76, width: 0.24 },
    { label: 'Drawn', words: identity.author, row: 2, from: 0, width: 0.22 },
    { label: 'Date', words: dayOf(identity.createdAt), row: 2, from: 0.22, width: 0.16 },
    { label: 'Released by', words: releasedBy ?? 'not released', row: 2, from: 0.38, width: 0.22 },
    { label: 'Date of issue', words: dayOf(releasedAt) || '–', row: 2, from: 0.6, width: 0.16 },
    { label: 'Document', words: of.documentType, row: 2, from: 0.76, width: 0.24 },
    { label: 'Owner', words: of.owner || '–', row: 3, from: 0, width: 0.38 },
    { label: 'SHA-256', words: checksumText(identity.checksum), row: 3, from: 0.38, width: 0.22 },
    { label: 'Scale, size', words: `${of.scale}, ${of.paper}`, row: 3, from: 0.6, width: 0.28 },
    { label: 'Sheet', words: `${of.number} / ${of.of}`, row: 3, from: 0.88, width: 0.12 },
  ];
}

function cellMarks(cell: Cell, block: Rect, top: number, bottom: number): Mark[] {
  const x = block.x + cell.from * block.width + PAD;
  const room = cell.width * block.width - 2.5 * PAD;
  const fit = fittedText(cell.words, room, cell.heightMm ?? LETTER.plain);
  return [
    text({ x, y: top + LETTER.least + 1.1 }, cell.label, LETTER.least, { ink: 'graphite' }),
    text({ x, y: bottom - 1.7 }, fit.text, fit.heightMm, { weight: cell.weight ?? 600 }),
  ];
}
