import { useId } from 'react';
import { FieldError } from '#client/ui/field.tsx';
import { usePlannerFields, useStored } from './planner-context.ts';
import { planFieldClass } from './quantity-input.tsx';

/** A name that may stay empty. */
export function NameRow({ path }: { path: string }) {
  const id = useId();
  const { errors, enabled, setValue, settle } = usePlannerFields();
  const stored = useStored(path);
  const error = errors.get(path);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_10.875rem] items-start gap-x-1.5">
      <label htmlFor={id} className="flex min-h-7 items-center pointer-coarse:min-h-11">
        Name
      </label>
      <div className="min-w-0">
        <input
          id={id}
          name={path}
          type="text"
          autoComplete="off"
          disabled={!enabled}
          placeholder="none"
          aria-invalid={error !== undefined}
          aria-describedby={error === undefined ? undefined : `${id}-error`}
          value={typeof stored === 'string' ? stored : ''}
          onChange={(event) => setValue(path, event.target.value, path)}
          onBlur={settle}
          className={planFieldClass}
        />
        <FieldError id={id} error={error} />
      </div>
    </div>
  );
}
