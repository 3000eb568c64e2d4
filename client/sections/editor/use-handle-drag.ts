import { useDrag } from '@use-gesture/react';
import { type RefObject, useEffect, useLayoutEffect, useRef } from 'react';
import { flushSync } from 'react-dom';
import { type SheetTransform } from '#client/drawing/sheet-view.ts';
import { isSecondFinger } from './second-finger.ts';
import { type EditorAction } from './editor-state.ts';
import { type HandleId } from './handle-ids.ts';

interface HandleDragOptions {
  readonly handle: HandleId;
  readonly transform: SheetTransform;
  readonly dispatch: (action: EditorAction) => void;
  /** Holding to whole digits; the Alt key inverts it while dragging. */
  readonly snap: boolean;
  /** A press without a move; such a handle starts to move only after some pixels. */
  readonly onTap?: (() => void) | undefined;
}

/** A drag under way: how far the pointer is from where it took the handle, in pixels. */
interface Hold {
  dx: number;
  dy: number;
  alt: boolean;
  frame: number;
}

/**
 * Turns the pointer on one handle into actions: at most one move in a frame, and one more when the Alt key changes while
 * the pointer rests. Pointer events end here; from here on a drag is data.
 */
export function useHandleDrag(options: HandleDragOptions) {
  const { handle, dispatch, onTap } = options;
  const latest = useRef(options);
  useLayoutEffect(() => {
    latest.current = options;
  });
  const hold = useRef<Hold | null>(null);
  useInterference(hold, latest);
  return useDrag(
    ({ first, last, tap, xy, initial, altKey, canceled, event }) => {
      event.stopPropagation();
      if (isSecondFinger(event)) return;
      if (tap && onTap) {
        onTap();
        return;
      }
      if (first) {
        hold.current = { dx: 0, dy: 0, alt: altKey, frame: 0 };
        dispatch({ type: 'drag-start', handle });
      }
      const held = hold.current;
      if (!held) return;
      held.dx = xy[0] - initial[0];
      held.dy = xy[1] - initial[1];
      held.alt = altKey;
      if (!last) {
        if (held.frame === 0) {
          held.frame = requestAnimationFrame(() => {
            held.frame = 0;
            move(latest.current, held);
          });
        }
        return;
      }
      cancelAnimationFrame(held.frame);
      hold.current = null;
      if (!canceled) move(latest.current, held);
      dispatch({ type: canceled ? 'drag-cancel' : 'drag-end' });
    },
    { filterTaps: onTap !== undefined, pointer: { keys: false, buttons: 1 } },
  );
}

/** What happens beside the pointer while it holds the handle: the Alt key, a second finger, the end of the handle. */
function useInterference(hold: RefObject<Hold | null>, latest: RefObject<HandleDragOptions>): void {
  useEffect(() => {
    const alt = (event: KeyboardEvent) => {
      if (!hold.current || event.key !== 'Alt') return;
      event.preventDefault();
      hold.current.alt = event.type === 'keydown';
      move(latest.current, hold.current);
    };
    // Two fingers move the paper: what the first of them did to the handle is taken back.
    const join = (event: PointerEvent) => {
      if (!hold.current || !isSecondFinger(event)) return;
      cancelAnimationFrame(hold.current.frame);
      hold.current = null;
      latest.current.dispatch({ type: 'drag-cancel' });
    };
    window.addEventListener('keydown', alt);
    window.addEventListener('keyup', alt);
    window.addEventListener('pointerdown', join);
    return () => {
      window.removeEventListener('pointerdown', join);
      window.removeEventListener('keydown', alt);
      window.removeEventListener('keyup', alt);
      if (hold.current) cancelAnimationFrame(hold.current.frame);
      hold.current = null;
    };
  }, [hold, latest]);
}

/** Draws in the frame of the move itself, not in a later one: the surface stays under the pointer. */
function move({ transform, snap, dispatch }: HandleDragOptions, held: Hold): void {
  const { scale } = transform;
  flushSync(() => {
    dispatch({
      type: 'drag-move',
      by: { x: held.dx / scale / transform.chordPixels, y: -held.dy / scale / transform.crossPixels },
      snap: snap !== held.alt,
    });
  });
}
