import { memo } from 'react';
import { LINE } from './line-types.ts';
import { type SheetLayout } from './sheet-layout.ts';

/** Frame of the sheet with its zones (ISO 5457): numbers along the top, letters down the side. */
export const SheetFrame = memo(function SheetFrame({ layout }: { layout: SheetLayout }) {
  const { frame, zones, compact, width, height } = layout;
  const columns = Array.from(
    { length: zones.columns },
    (_, i) => frame.x + ((i + 0.5) * frame.width) / zones.columns,
  );
  const rows = Array.from(
    { length: zones.rows },
    (_, i) => frame.y + ((i + 0.5) * frame.height) / zones.rows,
  );
  return (
    <g aria-hidden="true">
      <rect
        x={frame.x}
        y={frame.y}
        width={frame.width}
        height={frame.height}
        className="fill-none stroke-ink"
        strokeWidth={LINE.frame}
      />
      {!compact && (
        <>
          <path d={zoneTicks(layout)} className="fill-none stroke-graphite" strokeWidth={LINE.hair} />
          <g className="fill-graphite text-[9px]" textAnchor="middle">
            {columns.map((x, i) => (
              <g key={x}>
                <text x={x} y={frame.y - 8}>
                  {i + 1}
                </text>
                <text x={x} y={height - 9}>
                  {i + 1}
                </text>
              </g>
            ))}
            {rows.map((y, i) => (
              <g key={y}>
                <text x={frame.x / 2} y={y + 3}>
                  {'ABCD'.charAt(i)}
                </text>
                <text x={width - frame.x / 2} y={y + 3}>
                  {'ABCD'.charAt(i)}
                </text>
              </g>
            ))}
          </g>
        </>
      )}
    </g>
  );
});

/** Marks between the zones, outside the frame on all four sides. */
function zoneTicks({ frame, zones }: SheetLayout): string {
  const length = 9;
  const bottom = frame.y + frame.height;
  const right = frame.x + frame.width;
  const parts: string[] = [];
  for (let i = 1; i < zones.columns; i++) {
    const x = frame.x + (i * frame.width) / zones.columns;
    parts.push(`M${x} ${frame.y - length}V${frame.y}M${x} ${bottom}V${bottom + length}`);
  }
  for (let i = 1; i < zones.rows; i++) {
    const y = frame.y + (i * frame.height) / zones.rows;
    parts.push(`M${frame.x - length} ${y}H${frame.x}M${right} ${y}H${right + length}`);
  }
  return parts.join('');
}
