import { type PlanValues, sameValues } from './plan-values.ts';

/** The values of the form with those before and after them. */
export interface History {
  readonly present: PlanValues;
  readonly past: readonly PlanValues[];
  readonly future: readonly PlanValues[];
  /** The field in which a run of changes goes on that is one step to undo. */
  readonly run: string | null;
}

export type HistoryAction =
  | { readonly type: 'change'; readonly values: PlanValues; readonly run: string | null }
  | { readonly type: 'settle' }
  | { readonly type: 'undo' }
  | { readonly type: 'redo' };

const LONGEST = 300;

export function startHistory(present: PlanValues): History {
  return { present, past: [], future: [], run: null };
}

/** Changes of one run (typing in one field) are one step; a change to the same values is none. */
export function reduceHistory(history: History, action: HistoryAction): History {
  const { present, past, future, run } = history;
  switch (action.type) {
    case 'change':
      if (sameValues(action.values, present)) return history;
      return {
        present: action.values,
        past: run !== null && run === action.run ? past : [...past, present].slice(-LONGEST),
        future: [],
        run: action.run,
      };
    case 'settle':
      return run === null ? history : { ...history, run: null };
    case 'undo': {
      const before = past.at(-1);
      if (!before) return history;
      return { present: before, past: past.slice(0, -1), future: [present, ...future], run: null };
    }
    case 'redo': {
      const [after, ...later] = future;
      if (!after) return history;
      return { present: after, past: [...past, present], future: later, run: null };
    }
  }
}
