import { type KeyboardEvent, useId, useState } from 'react';
import { useUnits } from '#client/app/units.ts';
import { FieldError } from '#client/ui/field.tsx';
import { usePlannerFields, useStored } from './planner-context.ts';
import { formatList, type QuantityForm, readList } from './quantities.ts';
import { planFieldClass } from './quantity-input.tsx';

interface ListInputProps {
  readonly path: string;
  readonly label: string;
  readonly as: 'length' | 'station';
}

/** Several numbers with one unit in one field. */
export function ListInput({ path, label, as }: ListInputProps) {
  const id = useId();
  const units = useUnits();
  const { errors, enabled, setValue, settle } = usePlannerFields();
  const stored = useStored(path);
  const [typed, setTyped] = useState<string | null>(null);
  const form: QuantityForm = { as, decimals: 1, chordMm: 1, units };
  const { shown, readError } = shownList(stored, form);
  const error =
    (typed === null ? readError : undefined) ??
    errors.get(path) ??
    [...errors].find(([at]) => at.startsWith(`${path}.`))?.[1];
  const commit = () => {
    if (typed !== null) {
      const read = readList(typed, form);
      setValue(path, 'error' in read ? typed : read.values, path);
    }
    setTyped(null);
    settle();
  };
  const keyDown = (event: KeyboardEvent) => {
    if (event.key === 'Enter') {
      event.preventDefault();
      commit();
    } else if (event.key === 'Escape' && typed !== null) {
      event.preventDefault();
      event.stopPropagation();
      setTyped(null);
    }
  };
  return (
    <div className="min-w-0">
      <label htmlFor={id} className="mb-1 block">
        {label}
      </label>
      <input
        id={id}
        name={path}
        data-settled={typed === null || undefined}
        type="text"
        autoComplete="off"
        spellCheck={false}
        disabled={!enabled}
        aria-invalid={error !== undefined}
        aria-describedby={error === undefined ? undefined : `${id}-error`}
        value={typed ?? shown}
        onChange={(event) => setTyped(event.target.value)}
        onBlur={commit}
        onKeyDown={keyDown}
        className={planFieldClass}
      />
      <FieldError id={id} error={error} />
    </div>
  );
}

/** The list as text, or the text that could not be read, with the reason. */
function shownList(stored: unknown, form: QuantityForm): { shown: string; readError?: string } {
  if (Array.isArray(stored)) {
    const numbers = stored.filter((value) => typeof value === 'number');
    return { shown: formatList(numbers, form) };
  }
  if (typeof stored !== 'string') return { shown: '' };
  const read = readList(stored, form);
  return 'error' in read ? { shown: stored, readError: read.error } : { shown: stored };
}
