import { type ComponentProps, type ReactNode, useId } from 'react';
import { describedBy, fieldClass, fieldHeight, FieldFrame } from './field.tsx';

interface OwnProps {
  label: string;
  options: readonly { readonly value: string; readonly label: string }[];
  hint?: ReactNode;
  error?: string | undefined;
  /** The label is spoken but not shown. */
  hideLabel?: boolean | undefined;
  /** `large` for the machines' desk. */
  size?: 'normal' | 'large' | undefined;
  className?: string | undefined;
}
type SelectFieldProps = OwnProps & Omit<ComponentProps<'select'>, keyof OwnProps | 'id' | 'children'>;

/** A labelled native select. */
export function SelectField({
  label,
  options,
  hint,
  error,
  hideLabel = false,
  size = 'normal',
  className,
  ...rest
}: SelectFieldProps) {
  const id = useId();
  const select = (
    <select
      {...rest}
      id={id}
      aria-label={hideLabel ? label : undefined}
      aria-invalid={error !== undefined}
      aria-describedby={describedBy(id, hint, error)}
      className={`${fieldClass} ${size === 'large' ? 'h-12 text-base' : fieldHeight}`}
    >
      {options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </select>
  );
  if (hideLabel) return <div className={className}>{select}</div>;
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      {select}
    </FieldFrame>
  );
}
