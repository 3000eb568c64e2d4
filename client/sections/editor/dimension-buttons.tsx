import { memo } from 'react';
import { DimensionText, type PlacedSectionDimension } from '#client/drawing/dimension-lines.tsx';
import { type DimensionId } from '#client/drawing/section-dimensions.ts';
import { type FieldId } from './fields.ts';

/** Names of the dimensions as they are spoken. */
export const DIMENSION_NAMES: Readonly<Record<DimensionId, string>> = {
  chordMm: 'Chord',
  maxCamber: 'Camber',
  maxCamberPosition: 'Camber position',
  maxThickness: 'Thickness',
  maxThicknessPosition: 'Position of the largest thickness',
  noseRadius: 'Nose radius',
  trailingEdgeGap: 'Trailing-edge gap',
  'boatTail-upper': 'Boat-tail angle, upper surface',
  'boatTail-lower': 'Boat-tail angle, lower surface',
};

export type TypedDimensionId = FieldId & DimensionId;

/** Can a dimension be typed? Those in brackets follow from others. */
export function isTyped(
  dimension: PlacedSectionDimension,
): dimension is PlacedSectionDimension & { id: TypedDimensionId } {
  return !dimension.text.startsWith('(');
}

interface DimensionButtonsProps {
  readonly dimensions: readonly PlacedSectionDimension[];
  readonly live: readonly DimensionId[];
  readonly editing: DimensionId | null;
  readonly enabled: boolean;
  readonly onEdit: (id: TypedDimensionId) => void;
}

/** The texts of the dimensions; those that can be typed are buttons. */
export const DimensionButtons = memo(function DimensionButtons(props: DimensionButtonsProps) {
  const { dimensions, live, editing, enabled, onEdit } = props;
  return (
    <g>
      {dimensions.map((dimension) => {
        const colour = live.includes(dimension.id) ? 'fill-wire' : 'fill-ink';
        if (!enabled || !isTyped(dimension)) {
          return (
            <DimensionText
              key={dimension.id}
              dimension={dimension}
              className={isTyped(dimension) ? colour : 'fill-graphite'}
            />
          );
        }
        if (dimension.id === editing) return null;
        const { id, text, textBox } = dimension;
        return (
          <g
            key={id}
            role="button"
            tabIndex={0}
            aria-label={`${DIMENSION_NAMES[id]} ${text}, change`}
            data-dimension={id}
            onClick={() => {
              onEdit(id);
            }}
            onKeyDown={(event) => {
              if (event.key !== 'Enter' && event.key !== ' ') return;
              event.preventDefault();
              onEdit(id);
            }}
            className="group cursor-text outline-none"
          >
            <rect
              x={textBox.x - 5}
              y={textBox.y - 5}
              width={textBox.width + 10}
              height={textBox.height + 10}
              rx={1}
              className="fill-transparent stroke-transparent group-hover:stroke-edge group-focus-visible:stroke-wire"
              strokeWidth={1.5}
            />
            <DimensionText dimension={dimension} className={`${colour} group-hover:underline`} />
          </g>
        );
      })}
    </g>
  );
});
