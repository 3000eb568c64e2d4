import { memo } from 'react';
import { type DimensionId } from './section-dimensions.ts';
import { type Arrow, DIMENSION_TEXT, type PlacedDimension } from './dimension-layout.ts';
import { ARROW, LINE } from './line-types.ts';

export type PlacedSectionDimension = PlacedDimension<DimensionId>;

/** Lines and arrowheads of all dimensions; `live` ones, of the handle in hand, are drawn in the accent. */
export const DimensionLines = memo(function DimensionLines({
  dimensions,
  live,
}: {
  dimensions: readonly PlacedSectionDimension[];
  live: readonly DimensionId[];
}) {
  const group = (of: readonly PlacedSectionDimension[], accent: boolean) =>
    of.length > 0 && (
      <g>
        <path
          d={of.map(({ path }) => path).join('')}
          className={`fill-none ${accent ? 'stroke-wire' : 'stroke-graphite'}`}
          strokeWidth={LINE.narrow}
        />
        <path
          d={of.flatMap(({ arrows }) => arrows.map(arrowPath)).join('')}
          className={accent ? 'fill-wire' : 'fill-graphite'}
        />
      </g>
    );
  return (
    <g aria-hidden="true">
      {group(
        dimensions.filter(({ id }) => !live.includes(id)),
        false,
      )}
      {group(
        dimensions.filter(({ id }) => live.includes(id)),
        true,
      )}
    </g>
  );
});

/** The text of a dimension, centred in its box. */
export function DimensionText({
  dimension,
  className,
}: {
  dimension: PlacedSectionDimension;
  className: string;
}) {
  const { textBox, text, ground } = dimension;
  return (
    <text
      x={textBox.x + textBox.width / 2}
      y={textBox.y + textBox.height / 2 + DIMENSION_TEXT * 0.35}
      fontSize={DIMENSION_TEXT}
      textAnchor="middle"
      paintOrder="stroke"
      strokeWidth={4}
      strokeLinejoin="round"
      className={`font-semibold ${ground === 'foam' ? 'stroke-foam' : 'stroke-sheet'} ${className}`}
    >
      {text}
    </text>
  );
}

function arrowPath({ x, y, dx, dy }: Arrow): string {
  const { length, halfWidth } = ARROW;
  const baseX = x - dx * length;
  const baseY = y - dy * length;
  const at = (px: number, py: number) => `${px.toFixed(2)} ${py.toFixed(2)}`;
  return `M${at(x, y)}L${at(baseX - dy * halfWidth, baseY + dx * halfWidth)}L${at(baseX + dy * halfWidth, baseY - dx * halfWidth)}Z`;
}
