import { type Box } from '../../cutting/arrays.ts';

/** One page's part of a template, in the template's frame (y up). */
export interface Tile extends Box {
  /** Counted from 0: rows from the top, columns from the left. */
  readonly row: number;
  readonly column: number;
  /** "A1": row letter and column number. */
  readonly name: string;
}

/** How a template is spread over pages. */
export interface Tiling {
  readonly rows: number;
  readonly columns: number;
  readonly tiles: readonly Tile[];
  /** Where neighbouring pages are joined: the middles of the overlaps, x of the upright and y of the level ones. */
  readonly joins: { readonly x: readonly number[]; readonly y: readonly number[] };
}

/** Neighbouring tiles share this much, mm; common practice is 10 to 15. */
export const OVERLAP_MM = 12;

/**
 * Spreads a box over as few tiles as hold it, centred on them.
 * @param window what one page shows, mm; wider and higher than the overlap
 */
export function tilingOf(content: Box, window: { readonly width: number; readonly height: number }): Tiling {
  const across = spread(content.minX, content.maxX, window.width);
  const down = spread(content.minY, content.maxY, window.height);
  const tiles = down.starts.toReversed().flatMap((minY, row) =>
    across.starts.map((minX, column): Tile => ({
      row,
      column,
      name: `${rowLetters(row)}${column + 1}`,
      minX,
      maxX: minX + window.width,
      minY,
      maxY: minY + window.height,
    })),
  );
  return {
    rows: down.starts.length,
    columns: across.starts.length,
    tiles,
    joins: { x: across.joins, y: down.joins },
  };
}

function spread(from: number, to: number, size: number): { starts: number[]; joins: number[] } {
  const step = size - OVERLAP_MM;
  const count = Math.max(1, Math.ceil((to - from - OVERLAP_MM) / step - 1e-9));
  const first = (from + to - (count * step + OVERLAP_MM)) / 2;
  const starts = Array.from({ length: count }, (_, i) => first + i * step);
  return { starts, joins: starts.slice(1).map((start) => start + OVERLAP_MM / 2) };
}

/** A … Z, then AA, AB … as in drawings and ledgers. */
export function rowLetters(row: number): string {
  const letter = String.fromCharCode(65 + (row % 26));
  return row < 26 ? letter : rowLetters(Math.floor(row / 26) - 1) + letter;
}
