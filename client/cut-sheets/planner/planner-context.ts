import { createContext, useContext } from 'react';
import { type Control, type FieldValues, useController } from 'react-hook-form';
import { type Severity } from '#geometry/cutting/findings.ts';
import { type PlanErrors, type PlanValues } from './plan-values.ts';

/** What every field of the planner knows. */
export interface PlannerFields {
  readonly control: Control<FieldValues>;
  readonly values: PlanValues;
  /** What the schema refuses, by path. */
  readonly errors: PlanErrors;
  /** The gravest finding at each path. */
  readonly marks: ReadonlyMap<string, Severity>;
  readonly enabled: boolean;
  /** Sets the value of one field; the steps of one `run` are undone together. */
  readonly setValue: (path: string, value: unknown, run?: string) => void;
  /** The run of changes in a field is over. */
  readonly settle: () => void;
  /** Takes other values on as one step: several at once, or a group that comes or goes. */
  readonly replace: (values: PlanValues) => void;
}

const PlannerContext = createContext<PlannerFields | null>(null);
export const PlannerProvider = PlannerContext.Provider;

export function usePlannerFields(): PlannerFields {
  const fields = useContext(PlannerContext);
  if (!fields) throw new Error('A field of the planner stands outside of it.');
  return fields;
}

/** What stands in the form at a path, right or wrong. */
export function useStored(path: string): unknown {
  const { control } = usePlannerFields();
  const { value } = useController({ name: path, control }).field;
  return value as unknown;
}
