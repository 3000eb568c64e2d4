import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import { useUnits } from '#client/app/units.ts';
import { fieldClass, FieldError } from '#client/ui/field.tsx';
import { usePlannerFields, useStored } from './planner-context.ts';
import { type PlanValues, valueAt } from './plan-values.ts';
import {
  formatQuantity,
  type PlanQuantity,
  type QuantityForm,
  readQuantity,
  stepQuantity,
} from './quantities.ts';

export interface QuantityInputProps {
  readonly path: string;
  /** Spoken; the visible label is the row's. */
  readonly label: string;
  readonly as: PlanQuantity;
  readonly decimals?: number | undefined;
  /** Whose chord a station is a share of. */
  readonly end?: 'root' | 'tip' | undefined;
  /** The field may be empty: what that means, shown in it. */
  readonly empty?: string | undefined;
  readonly className?: string | undefined;
}

/** Typing this long without a key shows what it would do. */
const PAUSE_MS = 350;

const MARKS = {
  error: 'border-brick shadow-[inset_3px_0_0_var(--brick)]',
  warning: 'border-amber shadow-[inset_3px_0_0_var(--amber)]',
  note: '',
} as const;

/** The look of a field for one value of the plan. */
export const planFieldClass = `${fieldClass} h-7 font-semibold focus:border-wire focus:shadow-[inset_3px_0_0_var(--wire)] pointer-coarse:h-11`;

/** One number of the plan, typed with its unit and simple arithmetic. Text that cannot be read stays as it was typed, and is kept so. */
export function QuantityInput(props: QuantityInputProps) {
  const { path, label, empty, className = '' } = props;
  const id = useId();
  const { errors, marks, enabled } = usePlannerFields();
  const { text, settled, readError, handlers } = useTypedValue(props);
  const error = readError ?? errors.get(path);
  const mark = marks.get(path);
  return (
    <div className={`min-w-0 ${className}`}>
      <input
        {...handlers}
        id={id}
        name={path}
        data-settled={settled || undefined}
        type="text"
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        disabled={!enabled}
        aria-label={label}
        placeholder={empty}
        aria-invalid={error !== undefined}
        aria-describedby={error === undefined ? undefined : `${id}-error`}
        value={text}
        className={`${planFieldClass} pr-1.5 pl-0.5 text-right ${mark === undefined ? '' : MARKS[mark]}`}
      />
      <FieldError id={id} error={error} />
    </div>
  );
}

function chordOf(values: PlanValues, end: 'root' | 'tip'): number {
  const chord = valueAt(values, `panel.${end}.chordMm`);
  return typeof chord === 'number' && chord > 0 ? chord : 1;
}

function useTypedValue({ path, as, decimals = 1, end = 'root', empty }: QuantityInputProps) {
  const units = useUnits();
  const { values, setValue, settle, enabled } = usePlannerFields();
  const stored = useStored(path);
  const [typed, setTyped] = useState<string | null>(null);
  const before = useRef<unknown>(null);
  const form: QuantityForm = { as, decimals, units, chordMm: chordOf(values, end) };
  const shown = shownText(stored, form);
  const read = (text: string): unknown => {
    if (text.trim() === '' && empty !== undefined) return null;
    return readQuantity(text, form).value ?? text;
  };
  const pause = usePause();
  const commit = () => {
    pause.cancel();
    if (typed !== null) setValue(path, read(typed), path);
    setTyped(null);
    settle();
  };
  const keyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') {
      event.preventDefault();
      commit();
    } else if (event.key === 'Escape' && typed !== null) {
      event.preventDefault();
      event.stopPropagation();
      pause.cancel();
      setTyped(null);
      setValue(path, before.current, path);
    } else if ((event.key === 'ArrowUp' || event.key === 'ArrowDown') && enabled) {
      const value = typed === null ? stored : read(typed);
      if (typeof value !== 'number') return;
      event.preventDefault();
      setTyped(null);
      const steps = (event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? 10 : 1);
      setValue(path, stepQuantity(value, steps, form), path);
    }
  };
  return {
    text: typed ?? shown,
    settled: typed === null,
    readError: typed === null && typeof stored === 'string' ? readQuantity(stored, form).error : undefined,
    handlers: {
      onChange: (event: { target: { value: string } }) => {
        const text = event.target.value;
        setTyped(text);
        pause.begin(() => {
          const value = read(text);
          if (typeof value === 'number') setValue(path, value, path);
        });
      },
      onFocus: (event: { target: HTMLInputElement }) => {
        before.current = stored;
        event.target.select();
      },
      onBlur: commit,
      onKeyDown: keyDown,
    },
  };
}

/** A number in its unit, or the text that could not be read. */
function shownText(stored: unknown, form: QuantityForm): string {
  if (typeof stored === 'number') return formatQuantity(stored, form);
  return typeof stored === 'string' ? stored : '';
}

function usePause() {
  const timer = useRef<ReturnType<typeof setTimeout> | undefined>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  return {
    begin: (action: () => void) => {
      clearTimeout(timer.current);
      timer.current = setTimeout(action, PAUSE_MS);
    },
    cancel: () => {
      clearTimeout(timer.current);
    },
  };
}
