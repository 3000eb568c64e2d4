import { type ComponentProps, type ReactNode, useId } from 'react';
import { describedBy, fieldClass, fieldHeight, FieldFrame } from './field.tsx';

interface CommonProps {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  /** Classes of the frame, for its place in a layout. */
  className?: string | undefined;
}
type TextFieldProps = CommonProps & Omit<ComponentProps<'input'>, keyof CommonProps | 'id'>;
type TextAreaFieldProps = CommonProps & Omit<ComponentProps<'textarea'>, keyof CommonProps | 'id'>;

/** A labelled line of text; takes the props of a form library's `register`. */
export function TextField({ label, hint, error, className, type = 'text', ...rest }: TextFieldProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      <input
        {...rest}
        id={id}
        type={type}
        aria-invalid={error !== undefined}
        aria-describedby={describedBy(id, hint, error)}
        className={`${fieldClass} ${fieldHeight}`}
      />
    </FieldFrame>
  );
}

/** A labelled field of several lines. */
export function TextAreaField({ label, hint, error, className, rows = 3, ...rest }: TextAreaFieldProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} className={className}>
      <textarea
        {...rest}
        id={id}
        rows={rows}
        aria-invalid={error !== undefined}
        aria-describedby={describedBy(id, hint, error)}
        className={`${fieldClass} resize-y py-1.5`}
      />
    </FieldFrame>
  );
}
