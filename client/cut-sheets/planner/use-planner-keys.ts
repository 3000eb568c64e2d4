import { useEffect, useEffectEvent } from 'react';
import { type KeyGroup, useHotkey, useKeys } from '#client/app/keys.tsx';
import { ZOOM_STEP } from '#client/sections/editor/use-sheet-view.ts';

const KEYS: KeyGroup = {
  title: 'Cut sheet',
  entries: [
    { keys: ['Space'], does: 'Run or stop the wire' },
    { keys: ['←', '→'], does: 'On the slider: to the next point of the way' },
    { keys: ['↑', '↓'], does: 'In a field: one step more or less' },
    { keys: ['Ctrl', 'Z'], does: 'Undo' },
    { keys: ['Ctrl', 'Shift', 'Z'], does: 'Redo' },
    { keys: ['Ctrl', 'S'], does: 'Save as a version' },
    { keys: ['+', '−', '0'], does: 'Zoom in, out, fit' },
  ],
};

/** The keys of zooming, for the sheet. */
export function useZoomKeys(onZoom: (factor: number) => void, onFit: () => void): void {
  useKeys(KEYS);
  useHotkey('+', () => onZoom(ZOOM_STEP));
  useHotkey('-', () => onZoom(1 / ZOOM_STEP));
  useHotkey('0', onFit);
}

interface PlannerKeysOptions {
  readonly onUndo: () => void;
  readonly onRedo: () => void;
  readonly onSave: () => void;
}

/** Undo, redo and save from anywhere but a text that is being typed. */
export function usePlannerKeys({ onUndo, onRedo, onSave }: PlannerKeysOptions): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    if (!(event.ctrlKey || event.metaKey) || event.altKey || document.querySelector('dialog[open]')) return;
    const key = event.key.toLowerCase();
    if (key === 's') {
      event.preventDefault();
      if (document.activeElement instanceof HTMLElement) document.activeElement.blur();
      onSave();
    } else if ((key === 'z' || key === 'y') && !isTyping(event.target)) {
      event.preventDefault();
      if (key === 'y' || event.shiftKey) onRedo();
      else onUndo();
    }
  });
  useEffect(() => {
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  }, []);
}

/** A field undoes its own typing; one whose value stands (it says so) leaves the keys to the plan. */
function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof Element &&
    target.closest('textarea, input:not([type="checkbox"], [type="range"], [data-settled])') !== null
  );
}
