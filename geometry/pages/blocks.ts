import { LETTER, fittedText, textWidth, wrappedText } from './lettering.ts';
import { WIDTH, segment, text } from './marks.ts';
import { type Mark, type Rect } from './page.ts';

export interface TableColumn {
  readonly label: string;
  /** Share of the width; the shares of a table sum up to 1. */
  readonly share: number;
  readonly align: 'start' | 'end';
}

/** A column of a table, left-aligned unless said otherwise. */
export function tableColumn(
  label: string,
  share: number,
  align: TableColumn['align'] = 'start',
): TableColumn {
  return { label, share, align };
}

/** A table with a heading; it may be continued in the next column or on the next page. */
export interface Table {
  readonly kind: 'table';
  readonly title: string;
  readonly columns: readonly TableColumn[];
  readonly rows: readonly (readonly string[])[];
  /** To be written in by hand: higher rows with lines between the columns. */
  readonly byHand: boolean;
}

/** Sentences under a heading, each with a word before it, which may be empty. */
export interface Notes {
  readonly kind: 'notes';
  readonly title: string;
  readonly sentences: readonly { readonly before: string; readonly words: string }[];
}

export type Block = Table | Notes;

/** A piece that is not divided, and how high it is. */
interface Piece {
  readonly heightMm: number;
  draw(x: number, y: number, width: number): Mark[];
}

const TITLE_MM = 7;
const HEAD_MM = 6;
const ROW_MM = 5.6;
const HAND_ROW_MM = 9;
const LINE_MM = 3.9;
const SPACE_MM = 5;
const PAD = 1;
/** A heading is not left alone at the foot of a column. */
const LEAST_ROWS = 2;

/**
 * Sets blocks one below the other into columns, and on further pages with the same columns as often as needed; each group begins in a column of its own. Long texts in cells are
 * written smaller and then cut with an ellipsis; sentences are broken into lines.
 * @param columns of one page, in the order in which they are filled, all equally wide
 * @param groups of blocks, none empty
 * @returns the marks of each page; none without blocks
 */
export function setBlocks(groups: readonly (readonly Block[])[], columns: readonly Rect[]): Mark[][] {
  const pages: Mark[][] = [];
  const first = columns[0];
  if (!first) return pages;
  let column = columns.length;
  let y = Infinity;
  let room = first;
  const turn = () => {
    column += 1;
    if (column >= columns.length) {
      column = 0;
      pages.push([]);
    }
    room = columns[column] ?? first;
    y = room.y;
  };
  const starts = new Set(groups.map((group) => group[0]));
  for (const block of groups.flat()) {
    const { head, body } = piecesOf(block, first.width);
    const least = [head(false), ...body.slice(0, LEAST_ROWS)].reduce((sum, of) => sum + of.heightMm, 0);
    if (starts.has(block) || y + least > room.y + room.height) turn();
    const put = (piece: Piece) => {
      pages.at(-1)?.push(...piece.draw(room.x, y, room.width));
      y += piece.heightMm;
    };
    put(head(false));
    for (const piece of body) {
      if (y + piece.heightMm > room.y + room.height) {
        turn();
        put(head(true));
      }
      put(piece);
    }
    y += SPACE_MM;
  }
  return pages;
}

function piecesOf(block: Block, width: number): { head: (again: boolean) => Piece; body: Piece[] } {
  if (block.kind === 'notes') {
    return {
      head: (again) => ({ heightMm: TITLE_MM, draw: (x, y, w) => titleMarks(block.title, again, x, y, w) }),
      body: block.sentences.map((of) => sentence(of, width)),
    };
  }
  return {
    head: (again) => ({
      heightMm: TITLE_MM + HEAD_MM,
      draw: (x, y, w) => [
        ...titleMarks(block.title, again, x, y, w),
        ...cells(
          block,
          block.columns.map(({ label }) => label),
          { x, y: y + TITLE_MM, width: w, height: HEAD_MM },
          true,
        ),
      ],
    }),
    body: block.rows.map((row) => {
      const heightMm = block.byHand ? HAND_ROW_MM : ROW_MM;
      return { heightMm, draw: (x, y, w) => cells(block, row, { x, y, width: w, height: heightMm }, false) };
    }),
  };
}

function titleMarks(title: string, again: boolean, x: number, y: number, width: number): Mark[] {
  const fit = fittedText(again ? `${title}, continued` : title, width, LETTER.title);
  const below = y + TITLE_MM - 1;
  return [
    text({ x, y: y + LETTER.title }, fit.text, fit.heightMm, { weight: 800 }),
    segment(x, below, x + width, below),
  ];
}

function cells({ columns, byHand }: Table, row: readonly string[], rect: Rect, head: boolean): Mark[] {
  const bottom = rect.y + rect.height;
  const rule = {
    widthMm: head ? WIDTH.narrow : WIDTH.hair,
    ink: head || byHand ? 'graphite' : 'hair',
  } as const;
  const marks: Mark[] = [segment(rect.x, bottom, rect.x + rect.width, bottom, rule)];
  let x = rect.x;
  columns.forEach(({ share, align }, i) => {
    const width = share * rect.width;
    const fit = fittedText(row[i] ?? '', width - 2 * PAD, LETTER.plain);
    const at = { x: align === 'start' ? x + PAD : x + width - PAD, y: bottom - (byHand && !head ? 3 : 1.6) };
    if (fit.text !== '') {
      const ink = head ? 'graphite' : 'ink';
      marks.push(text(at, fit.text, fit.heightMm, { anchor: align, ink }));
    }
    if (byHand && i > 0) marks.push(segment(x, rect.y, x, bottom, rule));
    x += width;
  });
  return marks;
}

function sentence({ before, words }: Notes['sentences'][number], width: number): Piece {
  const indent = before === '' ? 0 : textWidth(`${before} `, LETTER.plain) + PAD;
  const lines = wrappedText(words, width - indent, LETTER.plain);
  return {
    heightMm: lines.length * LINE_MM + 1.2,
    draw: (x, y) => [
      ...(before === '' ? [] : [text({ x, y: y + 2.9 }, before, LETTER.plain, { weight: 800 })]),
      ...lines.map((of, i) => text({ x: x + indent, y: y + 2.9 + i * LINE_MM }, of, LETTER.plain)),
    ],
  };
}
