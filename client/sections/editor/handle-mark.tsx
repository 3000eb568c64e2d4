import { type KeyboardEvent, memo } from 'react';
import { type SheetTransform } from '#client/drawing/sheet-view.ts';
import { type EditorAction } from './editor-state.ts';
import { COARSE } from './handle-moves.ts';
import { type HandleId } from './handle-ids.ts';
import { useHandleDrag } from './use-handle-drag.ts';

interface HandleMarkProps {
  readonly handle: HandleId;
  readonly x: number;
  readonly y: number;
  readonly name: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  readonly spoken: string;
  readonly kind: 'slider' | 'plane' | 'switch';
  readonly selected: boolean;
  readonly dragged: boolean;
  readonly enabled: boolean;
  readonly transform: SheetTransform;
  readonly snap: boolean;
  readonly dispatch: (action: EditorAction) => void;
  readonly onSelect: (handle: HandleId | null) => void;
}

/** Half the diagonal of the mark: a diamond 12 px high. */
const HALF = 6;

/** A point of the section that can be taken: by pointer, touch or keys. */
export const HandleMark = memo(function HandleMark(props: HandleMarkProps) {
  const { handle, kind, value, selected, dragged, enabled, transform, snap, dispatch, onSelect } = props;
  const turn = () => {
    dispatch({ type: 'edge', trailingEdge: value > 0 ? 'closed' : 'open' });
  };
  const bind = useHandleDrag({
    handle,
    transform,
    dispatch,
    snap,
    enabled,
    onTap: kind === 'switch' ? turn : undefined,
  });
  return (
    <g
      {...bind()}
      {...roleOf(props)}
      tabIndex={0}
      aria-label={props.name}
      aria-roledescription={kind === 'plane' ? 'two-dimensional slider' : undefined}
      data-handle={handle}
      transform={`translate(${props.x.toFixed(2)} ${props.y.toFixed(2)})`}
      onFocus={() => {
        onSelect(handle);
      }}
      onBlur={() => {
        onSelect(null);
      }}
      onKeyDown={(event) => {
        keyDown(event, handle, kind, dispatch, turn);
      }}
      className={`group touch-none outline-none ${enabled ? (dragged ? 'cursor-grabbing' : 'cursor-grab') : ''}`}
    >
      <Diamond filled={selected || dragged} />
    </g>
  );
});

function roleOf({ kind, value, min, max, spoken }: HandleMarkProps) {
  if (kind === 'switch') return { role: 'switch', 'aria-checked': value > 0 };
  return {
    role: 'slider',
    'aria-valuenow': value,
    'aria-valuemin': min,
    'aria-valuemax': max,
    'aria-valuetext': spoken,
  };
}

/** The mark, its ring when it has the focus, and the room in which it can be taken: 24 px, 44 px by touch. */
function Diamond({ filled }: { filled: boolean }) {
  return (
    <>
      <circle r={12} className="fill-transparent pointer-coarse:hidden" />
      <circle r={22} className="hidden fill-transparent pointer-coarse:block" />
      <rect
        x={-HALF - 4.5}
        y={-HALF - 4.5}
        width={2 * HALF + 9}
        height={2 * HALF + 9}
        transform="scale(0.78) rotate(45)"
        className="hidden fill-none stroke-ink group-focus-visible:block"
        strokeWidth={2}
      />
      <path
        d={`M0 ${-HALF}L${HALF} 0L0 ${HALF}L${-HALF} 0Z`}
        className={
          filled
            ? 'fill-wire stroke-wire'
            : 'fill-sheet stroke-wire group-hover:fill-wire transition-[fill] duration-100'
        }
        strokeWidth={1.6}
      />
    </>
  );
}

function keyDown(
  event: KeyboardEvent,
  handle: HandleId,
  kind: HandleMarkProps['kind'],
  dispatch: (action: EditorAction) => void,
  turn: () => void,
): void {
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  const steps = STEPS[event.key];
  if (steps) {
    const by = event.shiftKey ? COARSE : 1;
    dispatch({ type: 'nudge', handle, steps: { x: steps.x * by, y: steps.y * by }, at: event.timeStamp });
  } else if (event.key === 'Home' || event.key === 'End') {
    dispatch({ type: 'to-limit', handle, end: event.key === 'Home' ? 'smallest' : 'largest' });
  } else if (kind === 'switch' && (event.key === 'Enter' || event.key === ' ')) {
    turn();
  } else return;
  event.preventDefault();
  event.stopPropagation();
}

const STEPS: Readonly<Record<string, { x: number; y: number } | undefined>> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: 1 },
  ArrowDown: { x: 0, y: -1 },
};
