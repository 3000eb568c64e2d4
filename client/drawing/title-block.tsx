import { memo } from 'react';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { LINE, textWidth } from './line-types.ts';
import { type Box, type SheetLayout } from './sheet-layout.ts';

/** What the title block says (fields of ISO 7200). */
export interface TitleBlockFields {
  readonly title: string;
  /** "NACA 2412" or the like. */
  readonly designation: string;
  /** "3", or "draft on 3" for unsaved work. */
  readonly version: string;
  readonly status: VersionStatus;
  readonly author: string;
  /** ISO 8601; the date of it is shown. */
  readonly date: string;
  /** SHA-256 of the saved version's shape; null for a draft, which has none. */
  readonly checksum: string | null;
  /** Legal owner: the workshop. */
  readonly owner: string;
}

interface TitleBlockProps {
  readonly layout: SheetLayout;
  readonly fields: TitleBlockFields;
  /** The chord with its unit. */
  readonly chord: string;
  /** Scale along the chord, and how thickness is shown when not at the same scale. */
  readonly scale: string;
}

/** One field of a title block. */
export interface TitleCell {
  readonly label: string;
  readonly text: string;
  /** Left edge and width as shares of the block. */
  readonly from: number;
  readonly width: number;
  readonly row: number;
  readonly size?: number;
}

/** The title block at the lower right of the sheet. */
export const TitleBlock = memo(function TitleBlock({ layout, fields, chord, scale }: TitleBlockProps) {
  const cells = layout.compact ? compactCells(fields, chord, scale) : wideCells(fields, chord, scale);
  return <TitleGrid layout={layout} cells={cells} />;
});

/** A title block with any fields, in three rows. */
export function TitleGrid({
  layout,
  cells,
}: {
  readonly layout: SheetLayout;
  readonly cells: readonly TitleCell[];
}) {
  const { titleBlock: block, compact } = layout;
  const rows = rowEdges(block, compact);
  return (
    <g role="group" aria-label="Title block">
      <rect {...block} className="fill-sheet stroke-ink" strokeWidth={LINE.frame} />
      <path d={rulesOf(cells, block, rows)} className="fill-none stroke-ink" strokeWidth={LINE.narrow} />
      {cells.map((cell) => (
        <CellText
          key={cell.label}
          cell={cell}
          block={block}
          top={rows[cell.row] ?? 0}
          bottom={rows[cell.row + 1] ?? 0}
        />
      ))}
    </g>
  );
}

function wideCells(fields: TitleBlockFields, chord: string, scale: string): TitleCell[] {
  return [
    { label: 'Title', text: fields.title, from: 0, width: 0.52, row: 0, size: 16 },
    { label: 'Version', text: fields.version, from: 0.52, width: 0.22, row: 0 },
    { label: 'Status', text: fields.status, from: 0.74, width: 0.26, row: 0 },
    { label: 'Designation', text: fields.designation, from: 0, width: 0.52, row: 1 },
    { label: 'Chord', text: chord, from: 0.52, width: 0.22, row: 1 },
    { label: 'Scale', text: scale, from: 0.74, width: 0.26, row: 1 },
    { label: 'Drawn', text: fields.author, from: 0, width: 0.3, row: 2 },
    { label: 'Date', text: fields.date.slice(0, 10), from: 0.3, width: 0.22, row: 2 },
    { label: 'Shape SHA-256', text: checksumText(fields.checksum), from: 0.52, width: 0.22, row: 2 },
    { label: 'Owner', text: fields.owner, from: 0.74, width: 0.26, row: 2 },
  ];
}

function compactCells(fields: TitleBlockFields, chord: string, scale: string): TitleCell[] {
  return [
    { label: 'Title', text: fields.title, from: 0, width: 0.6, row: 0, size: 14 },
    { label: 'Version', text: fields.version, from: 0.6, width: 0.4, row: 0 },
    { label: 'Designation', text: fields.designation, from: 0, width: 0.6, row: 1 },
    { label: 'Status', text: fields.status, from: 0.6, width: 0.4, row: 1 },
    { label: 'Chord', text: chord, from: 0, width: 0.3, row: 2 },
    { label: 'Scale', text: scale, from: 0.3, width: 0.3, row: 2 },
    { label: 'Date', text: fields.date.slice(0, 10), from: 0.6, width: 0.4, row: 2 },
  ];
}

/** Twelve digits in groups of four, as the exported files carry them. */
export function checksumText(checksum: string | null): string {
  return checksum === null ? 'not saved' : (checksum.slice(0, 12).match(/.{4}/g) ?? []).join(' ');
}

function rowEdges(block: Box, compact: boolean): readonly number[] {
  const shares = compact ? [0, 0.36, 0.68, 1] : [0, 0.38, 0.69, 1];
  return shares.map((share) => Math.round(block.y + share * block.height));
}

function rulesOf(cells: readonly TitleCell[], block: Box, rows: readonly number[]): string {
  const across = rows.slice(1, -1).map((y) => `M${block.x} ${y}H${block.x + block.width}`);
  const down = cells
    .filter((cell) => cell.from > 0)
    .map((cell) => {
      const x = Math.round(block.x + cell.from * block.width) + 0.5;
      return `M${x} ${rows[cell.row] ?? 0}V${rows[cell.row + 1] ?? 0}`;
    });
  return [...across, ...down].join('');
}

const PAD = 7;

function CellText({
  cell,
  block,
  top,
  bottom,
}: {
  cell: TitleCell;
  block: Box;
  top: number;
  bottom: number;
}) {
  const x = block.x + cell.from * block.width + PAD;
  const room = cell.width * block.width - 2 * PAD;
  const { text, size } = fitted(cell.text, room, cell.size ?? 12);
  return (
    <g>
      <text x={x} y={top + 11} className="fill-graphite text-[9px]">
        {cell.label}
      </text>
      <text
        x={x}
        y={bottom - 7}
        fontSize={size}
        className={`fill-ink ${(cell.size ?? 12) > 13 ? 'font-extrabold' : 'font-semibold'}`}
      >
        {text}
        {text !== cell.text && <title>{cell.text}</title>}
      </text>
    </g>
  );
}

/** Smaller down to 9 px where the text is too long for its cell, then cut with an ellipsis; the whole is in its title. */
function fitted(text: string, room: number, size: number): { text: string; size: number } {
  for (let fit = size; fit >= 9; fit -= 0.5) if (textWidth(text, fit) <= room) return { text, size: fit };
  const count = Math.max(1, Math.floor(room / textWidth('0', 9)) - 1);
  return { text: `${[...text].slice(0, count).join('').trimEnd()}…`, size: 9 };
}
