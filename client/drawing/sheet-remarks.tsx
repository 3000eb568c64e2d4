import { memo } from 'react';
import { textWidth } from './line-types.ts';
import { type SheetLayout } from './sheet-layout.ts';

const WIDE = { size: 11, lineHeight: 16, lines: 6, inset: 14, bottom: 12 };
const COMPACT = { size: 10, lineHeight: 13, lines: 2, inset: 8, bottom: 7 };

/** The sheet's own remarks: at the lower left beside the title block, or in two lines above it on a narrow sheet. */
export const SheetRemarks = memo(function SheetRemarks({
  layout,
  remarks,
}: {
  layout: SheetLayout;
  remarks: readonly string[];
}) {
  const { remark, compact } = layout;
  const { size, lineHeight, lines, inset, bottom } = compact ? COMPACT : WIDE;
  const shown = wrapped(remarks, remark.width - 2 * inset, size).slice(0, lines);
  const last = remark.y + remark.height - bottom;
  return (
    <text className="fill-graphite" fontSize={size}>
      {shown.map((line, i) => (
        <tspan key={line} x={remark.x + inset} y={last - (shown.length - 1 - i) * lineHeight}>
          {line}
        </tspan>
      ))}
    </text>
  );
});

/** Sentences joined to lines no wider than the room. */
function wrapped(sentences: readonly string[], room: number, size: number): string[] {
  const lines: string[] = [];
  for (const sentence of sentences) {
    const last = lines.at(-1);
    if (last !== undefined && textWidth(`${last} ${sentence}`, size) <= room)
      lines[lines.length - 1] = `${last} ${sentence}`;
    else lines.push(sentence);
  }
  return lines;
}
