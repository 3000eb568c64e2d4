import { useMemo, useReducer } from 'react';
import { type FieldValues, type Resolver, useForm } from 'react-hook-form';
import { type Finding, type Severity } from '#geometry/cutting/findings.ts';
import { type SheetPlan } from '#server/contracts/cut-sheets.ts';
import { fieldOf } from './focus-path.ts';
import { reduceHistory, startHistory } from './history.ts';
import { type PlannerFields } from './planner-context.ts';
import { type PlanValues, readPlan, valueAt, withValue } from './plan-values.ts';

/** The form's answer to a save: the plan as the schema reads it, or its refusals at their fields. */
const resolver: Resolver<FieldValues, unknown, SheetPlan> = (values) => {
  const { plan, errors } = readPlan(values as PlanValues);
  if (plan) return { values: plan, errors: {} };
  return {
    values: {},
    errors: Object.fromEntries([...errors].map(([path, message]) => [path, { type: 'value', message }])),
  };
};

/**
 * The planner's form and its history. Every change goes through here, so that it can be undone; the values are read by the schema at once.
 */
export function usePlanForm(start: PlanValues) {
  const [history, dispatch] = useReducer(reduceHistory, start, startHistory);
  const form = useForm<FieldValues, unknown, SheetPlan>({ defaultValues: structuredClone(start), resolver });
  const { present, past, future } = history;
  const show = (values: PlanValues) => form.reset(structuredClone(values), { keepDirty: false });
  const replace = (values: PlanValues, run: string | null = null) => {
    show(values);
    dispatch({ type: 'change', values, run });
  };
  const setValue = (path: string, value: unknown, run?: string) => {
    const next = withValue(present, path, value);
    const isLeaf = [value, valueAt(present, path)].every((of) => typeof of !== 'object' || of === null);
    if (!isLeaf) {
      replace(next, run ?? null);
      return;
    }
    form.setValue(path, value, { shouldDirty: true });
    dispatch({ type: 'change', values: next, run: run ?? null });
  };
  return {
    form,
    present,
    read: useMemo(() => readPlan(present), [present]),
    canUndo: past.length > 0,
    canRedo: future.length > 0,
    undo: () => {
      const before = past.at(-1);
      if (before) show(before);
      dispatch({ type: 'undo' });
    },
    redo: () => {
      const [after] = future;
      if (after) show(after);
      dispatch({ type: 'redo' });
    },
    setValue,
    replace: (values: PlanValues) => replace(values),
    settle: () => dispatch({ type: 'settle' }),
  };
}

/** What the fields get. */
export function fieldsOf(
  planForm: ReturnType<typeof usePlanForm>,
  findings: readonly Finding[],
  enabled: boolean,
): PlannerFields {
  const { form, present, read, setValue, replace, settle } = planForm;
  return {
    control: form.control,
    values: present,
    errors: read.errors,
    marks: marksOf(findings),
    enabled,
    setValue,
    replace,
    settle,
  };
}

/** The gravest finding at each field. */
function marksOf(findings: readonly Finding[]): ReadonlyMap<string, Severity> {
  const marks = new Map<string, Severity>();
  for (const severity of ['note', 'warning', 'error'] as const)
    for (const finding of findings)
      if (finding.severity === severity) marks.set(fieldOf(finding.path), severity);
  return marks;
}
