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
  readonly transform: SheetTransform;
  readonly snap: boolean;
  readonly dispatch: (action: EditorAction) => void;
  readonly onSelect: (handle: HandleId | null) => void;
}

/** Half the diagonal of the mark: a diamond 12 px high. */
const HALF = 6;

/**
 * A point of the section that can be taken: by pointer, touch or keys. `block`, because browsers heed `touch-action` on no
 * inline element, which groups are by default: a finger on the mark would scroll the page.
 */
export const HandleMark = memo(function HandleMark(props: HandleMarkProps) {
  const { handle, kind, value, selected, dragged, transform, snap, dispatch, onSelect } = props;
  return (
    <g
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
        keyDown(event, props);
      }}
      className={`group block touch-none outline-none ${dragged ? 'cursor-grabbing' : 'cursor-grab'}`}
    >
      <Grip
        {...{ handle, transform, snap, dispatch }}
        turns={kind === 'switch' ? (value > 0 ? 'closed' : 'open') : null}
        filled={selected || dragged}
      />
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

interface GripProps extends Pick<HandleMarkProps, 'handle' | 'transform' | 'snap' | 'dispatch'> {
  /** What a press on it makes of the trailing edge; null for handles that slide. */
  readonly turns: 'open' | 'closed' | null;
  readonly filled: boolean;
}

/**
 * The mark, its ring when it has the focus, and the room in which it can be taken: 24 px, 44 px by touch. Apart from its
 * place, so that the many handles that a drag carries along keep their listeners.
 */
const Grip = memo(function Grip({ handle, transform, snap, dispatch, turns, filled }: GripProps) {
  const turn = () => {
    if (turns !== null) dispatch({ type: 'edge', trailingEdge: turns });
  };
  const bind = useHandleDrag({ handle, transform, dispatch, snap, onTap: turns === null ? undefined : turn });
  return (
    <g {...bind()} className="block touch-none">
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
    </g>
  );
});

function keyDown(event: KeyboardEvent, { handle, kind, value, dispatch }: HandleMarkProps): void {
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  const steps = STEPS[event.key];
  if (steps) {
    const by = event.shiftKey ? COARSE : 1;
    dispatch({ type: 'nudge', handle, steps: { x: steps.x * by, y: steps.y * by }, at: event.timeStamp });
  } else if (event.key === 'Home' || event.key === 'End') {
    dispatch({ type: 'to-limit', handle, end: event.key === 'Home' ? 'smallest' : 'largest' });
  } else if (kind === 'switch' && (event.key === 'Enter' || event.key === ' ')) {
    dispatch({ type: 'edge', trailingEdge: value > 0 ? 'closed' : 'open' });
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
