import { type SheetSettings } from './sheet-settings.ts';
import { type EditorState } from './editor-state.ts';
import { type Present } from './present.ts';

/**
 * Where a piece of the editor's state is kept: `view` ends with the page, `browser` stays on this computer,
 * `draft` is kept on the server for the person (and mirrored in the browser until the server has it).
 */
type Place = 'view' | 'browser' | 'draft';

/** Every key has its row; a new key without one does not compile. */
export const KEPT: Record<
  keyof Present | Exclude<keyof EditorState, 'present'> | keyof SheetSettings,
  Place
> = {
  shape: 'draft',
  chordMm: 'draft',
  basedOn: 'draft',
  equalNose: 'view',
  past: 'view',
  future: 'view',
  drag: 'view',
  nudge: 'view',
  notice: 'view',
  grid: 'browser',
  comb: 'browser',
  exaggeration: 'browser',
  snap: 'browser',
  secondView: 'browser',
  station: 'browser',
  ghost: 'view',
};
