import { type Point } from '#geometry/point.ts';
import { type Surface } from '#geometry/shapes/cst.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { withField, type FieldId } from './fields.ts';
import { handlePoint } from './handle-points.ts';
import { moveHandle, nudgeHandle, toLimit, type NudgeSteps } from './handle-moves.ts';
import { type HandleId } from './handle-ids.ts';
import { type Notice } from './notices.ts';
import { convertToDigits, convertToFreeForm, withEdge, withEqualNose, withOrder } from './operations.ts';
import { type Edit, type Present, samePresent } from './present.ts';

interface Drag {
  readonly handle: HandleId;
  readonly start: Present;
  /** Where the handle was when it was taken, in fractions of chord. */
  readonly from: Point;
  /** Where it stands now. */
  readonly at: Point;
}

export interface EditorState {
  readonly present: Present;
  readonly past: readonly Present[];
  readonly future: readonly Present[];
  readonly drag: Drag | null;
  /** A run of key steps on one handle, joined to one undo step. */
  readonly nudge: { readonly handle: HandleId; readonly at: number } | null;
  /** Number of the version that the draft stands on. */
  readonly basedOn: number;
  readonly notice: Notice | null;
}

export type EditorAction =
  | { type: 'load'; present: Present; basedOn: number; notice?: Notice }
  | { type: 'saved'; number: number }
  | { type: 'rebase'; number: number }
  | { type: 'drag-start'; handle: HandleId }
  | { type: 'drag-move'; by: Point; snap: boolean }
  | { type: 'drag-end' }
  | { type: 'drag-cancel' }
  | { type: 'nudge'; handle: HandleId; steps: NudgeSteps; at: number }
  | { type: 'to-limit'; handle: HandleId; end: 'smallest' | 'largest' }
  | { type: 'set'; field: FieldId; value: number }
  | { type: 'set-shape'; shape: Shape; notice?: Notice }
  | { type: 'to-free-form'; order: number }
  | { type: 'to-digits' }
  | { type: 'order'; surface: Surface | 'both'; order: number }
  | { type: 'edge'; trailingEdge: 'open' | 'closed' }
  | { type: 'equal-nose'; on: boolean }
  | { type: 'undo' }
  | { type: 'redo' }
  | { type: 'dismiss' };

/**
 * How undo treats each action: a `step` of its own, a run that `joins` into one step, a step that `ends` a drag, a
 * `move` through the history, `none` (nothing that undo knows of), or `resets` the history.
 */
export const UNDO = {
  load: 'resets',
  saved: 'none',
  rebase: 'none',
  'drag-start': 'none',
  'drag-move': 'none',
  'drag-end': 'ends',
  'drag-cancel': 'none',
  nudge: 'joins',
  'to-limit': 'step',
  set: 'step',
  'set-shape': 'step',
  'to-free-form': 'step',
  'to-digits': 'step',
  order: 'step',
  edge: 'step',
  'equal-nose': 'step',
  undo: 'move',
  redo: 'move',
  dismiss: 'none',
} as const satisfies Record<EditorAction['type'], 'step' | 'joins' | 'ends' | 'move' | 'none' | 'resets'>;

/** Key steps on one handle within this time are one undo step. */
export const NUDGE_PAUSE_MS = 1000;
const LONGEST_HISTORY = 300;

export function startState(present: Present, basedOn: number, notice: Notice | null = null): EditorState {
  return { present, past: [], future: [], drag: null, nudge: null, basedOn, notice };
}

/** The one reducer of the editor: pure; time and pointer positions come in as data. */
export function reduceEditor(state: EditorState, action: EditorAction): EditorState {
  switch (action.type) {
    case 'load':
      return startState(action.present, action.basedOn, action.notice ?? null);
    case 'saved':
    case 'rebase':
      return { ...state, basedOn: action.number, nudge: null };
    case 'drag-start':
    case 'drag-move':
    case 'drag-end':
    case 'drag-cancel':
      return reduceDrag(state, action);
    case 'nudge':
      return reduceNudge(state, action);
    case 'undo':
    case 'redo':
      return reduceHistory(state, action.type);
    case 'dismiss':
      return { ...state, notice: null };
    default:
      return state.drag ? state : step(state, edit(state.present, action));
  }
}

type StepAction = Extract<
  EditorAction,
  { type: 'to-limit' | 'set' | 'set-shape' | 'to-free-form' | 'to-digits' | 'order' | 'edge' | 'equal-nose' }
>;

function edit(present: Present, action: StepAction): Edit {
  switch (action.type) {
    case 'to-limit':
      return toLimit(present, action.handle, action.end);
    case 'set':
      return withField(present, action.field, action.value);
    case 'set-shape':
      return {
        present: { ...present, shape: action.shape, equalNose: false },
        notice: action.notice ?? null,
      };
    case 'to-free-form':
      return convertToFreeForm(present, action.order);
    case 'to-digits':
      return convertToDigits(present);
    case 'order':
      return withOrder(present, action.surface, action.order);
    case 'edge':
      return withEdge(present, action.trailingEdge);
    case 'equal-nose':
      return withEqualNose(present, action.on);
  }
}

function reduceDrag(
  state: EditorState,
  action: Extract<EditorAction, { type: 'drag-start' | 'drag-move' | 'drag-end' | 'drag-cancel' }>,
): EditorState {
  if (action.type === 'drag-start') {
    if (state.drag) return state;
    const from = handlePoint(state.present.shape, action.handle);
    if (!from) return state;
    return {
      ...state,
      drag: { handle: action.handle, start: state.present, from, at: from },
      nudge: null,
      notice: null,
    };
  }
  const { drag } = state;
  if (!drag) return state;
  if (action.type === 'drag-move') {
    const to = { x: drag.from.x + action.by.x, y: drag.from.y + action.by.y };
    const { present, notice, at } = moveHandle(drag.start, drag.handle, to, { snap: action.snap });
    return { ...state, present: present ?? state.present, drag: { ...drag, at: at ?? drag.at }, notice };
  }
  if (action.type === 'drag-cancel') return { ...state, present: drag.start, drag: null, notice: null };
  return step(
    { ...state, present: drag.start, drag: null },
    { present: state.present, notice: state.notice },
  );
}

function reduceNudge(state: EditorState, action: Extract<EditorAction, { type: 'nudge' }>): EditorState {
  if (state.drag) return state;
  const { handle, at } = action;
  const joins = state.nudge?.handle === handle && at - state.nudge.at <= NUDGE_PAUSE_MS;
  const { present, notice } = nudgeHandle(state.present, handle, action.steps);
  if (!present || samePresent(present, state.present)) return { ...state, notice };
  if (joins) return { ...state, present, notice, nudge: { handle, at }, future: [] };
  return { ...step(state, { present, notice }), nudge: { handle, at } };
}

function reduceHistory(state: EditorState, direction: 'undo' | 'redo'): EditorState {
  if (state.drag) return state;
  const { past, future, present } = state;
  const rest = { nudge: null, notice: null };
  if (direction === 'undo') {
    const before = past.at(-1);
    if (!before) return state;
    return { ...state, ...rest, present: before, past: past.slice(0, -1), future: [present, ...future] };
  }
  const [after, ...later] = future;
  if (!after) return state;
  return { ...state, ...rest, present: after, past: [...past, present], future: later };
}

/** One undo step, or none where the edit changed nothing. */
function step(state: EditorState, { present, notice }: Edit): EditorState {
  if (!present || samePresent(present, state.present)) return { ...state, nudge: null, notice };
  return {
    ...state,
    present,
    past: [...state.past, state.present].slice(-LONGEST_HISTORY),
    future: [],
    nudge: null,
    notice,
  };
}
