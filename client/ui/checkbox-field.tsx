import { type ComponentProps, type ReactNode, useId } from 'react';
import { describedBy, FieldError } from './field.tsx';

interface OwnProps {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  className?: string | undefined;
}
type CheckboxFieldProps = OwnProps & Omit<ComponentProps<'input'>, keyof OwnProps | 'id' | 'type'>;

/** A native checkbox with its label at the right; the whole row can be pressed. */
export function CheckboxField({ label, hint, error, className = '', ...rest }: CheckboxFieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <label htmlFor={id} className="flex min-h-7 items-center gap-2 pointer-coarse:min-h-11">
        <input
          {...rest}
          id={id}
          type="checkbox"
          aria-invalid={error !== undefined}
          aria-describedby={describedBy(id, hint, error)}
          className="size-4 shrink-0 accent-ink"
        />
        <span>{label}</span>
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="pl-6 text-xs text-graphite">
          {hint}
        </p>
      )}
      <FieldError id={id} error={error} />
    </div>
  );
}
