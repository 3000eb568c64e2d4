import { memo } from 'react';
import { textWidth } from './line-types.ts';
import { type SheetLayout } from './sheet-layout.ts';

const SIZE = 11;
const LINE_HEIGHT = 16;

/** The sheet's own remarks: at the lower left beside the title block, or in one line above it on a narrow sheet. */
export const SheetRemarks = memo(function SheetRemarks({
  layout,
  remarks,
}: {
  layout: SheetLayout;
  remarks: readonly string[];
}) {
  const { remark, compact } = layout;
  const size = compact ? 10 : SIZE;
  const lines = wrapped(remarks, remark.width - 28, size);
  const shown = compact ? lines.slice(0, 1) : lines.slice(-6);
  const last = remark.y + remark.height - (compact ? 7 : 12);
  return (
    <text className="fill-graphite" fontSize={size}>
      {shown.map((line, i) => (
        <tspan key={line} x={remark.x + (compact ? 8 : 14)} y={last - (shown.length - 1 - i) * LINE_HEIGHT}>
          {line}
        </tspan>
      ))}
    </text>
  );
});

/** Sentences joined to lines no wider than the room. */
export function wrapped(sentences: readonly string[], room: number, size: number): string[] {
  const lines: string[] = [];
  for (const sentence of sentences) {
    const last = lines.at(-1);
    if (last !== undefined && textWidth(`${last} ${sentence}`, size) <= room)
      lines[lines.length - 1] = `${last} ${sentence}`;
    else lines.push(sentence);
  }
  return lines;
}
