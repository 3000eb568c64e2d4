import { createContext, useContext } from 'react';
import { type EditorState } from './editor-state.ts';

/**
 * The state of the editor as it is now, also in the middle of a drag. Only what must follow every move of the pointer
 * takes it from here; everything else is given what the last finished step left, and is left alone by a drag.
 */
export const LiveState = createContext<EditorState | null>(null);

/** The state as it is now. Throws outside of an editor. */
export function useLiveState(): EditorState {
  const state = useContext(LiveState);
  if (state === null) throw new Error('There is no editor around this part.');
  return state;
}
