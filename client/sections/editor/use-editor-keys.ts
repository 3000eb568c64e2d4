import { useEffect, useEffectEvent } from 'react';
import { type KeyGroup, useHotkey, useKeys } from '#client/app/keys.tsx';
import { type EditorAction } from './editor-state.ts';
import { ZOOM_STEP } from './use-sheet-view.ts';

const KEYS: KeyGroup = {
  title: 'Drawing sheet',
  entries: [
    { keys: ['←', '↑', '→', '↓'], does: 'Move the marked point by 0.05 % of chord' },
    { keys: ['Shift', '←'], does: 'Ten times as far' },
    { keys: ['Home', 'End'], does: 'To the limits' },
    { keys: ['Esc'], does: 'Take back the drag' },
    { keys: ['Alt'], does: 'While dragging: whole digits on or off' },
    { keys: ['Ctrl', 'Z'], does: 'Undo' },
    { keys: ['Ctrl', 'Shift', 'Z'], does: 'Redo' },
    { keys: ['Ctrl', 'S'], does: 'Save as a version' },
    { keys: ['+', '−', '0'], does: 'Zoom in, out, fit' },
    { keys: ['Space'], does: 'Hold and drag: move the paper' },
  ],
};

interface EditorKeysOptions {
  readonly dispatch: (action: EditorAction) => void;
  readonly dragging: boolean;
  readonly onSave?: (() => void) | undefined;
  readonly onZoom: (factor: number) => void;
  readonly onFit: () => void;
}

/** The keys of the whole editor; those of a single handle are with the handle. */
export function useEditorKeys({ dispatch, dragging, onSave, onZoom, onFit }: EditorKeysOptions): void {
  useKeys(KEYS);
  useHotkey('+', () => {
    onZoom(ZOOM_STEP);
  });
  useHotkey('-', () => {
    onZoom(1 / ZOOM_STEP);
  });
  useHotkey('0', onFit);
  const press = useEffectEvent((event: KeyboardEvent) => {
    if (event.key === 'Escape' && dragging) {
      event.preventDefault();
      dispatch({ type: 'drag-cancel' });
      return;
    }
    if (!(event.ctrlKey || event.metaKey) || event.altKey || document.querySelector('dialog[open]')) return;
    const key = event.key.toLowerCase();
    if (key === 's' && onSave) {
      event.preventDefault();
      onSave();
    } else if ((key === 'z' || key === 'y') && !isTyping(event.target)) {
      event.preventDefault();
      dispatch({ type: key === 'y' || event.shiftKey ? 'redo' : 'undo' });
    }
  });
  useEffect(() => {
    document.addEventListener('keydown', press);
    return () => {
      document.removeEventListener('keydown', press);
    };
  }, []);
}

/** A field undoes its own typing. */
function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof Element &&
    target.closest('input:not([type="radio"], [type="checkbox"]), textarea') !== null
  );
}
