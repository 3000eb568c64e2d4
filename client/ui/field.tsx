import { type ReactNode } from 'react';

export const fieldClass =
  'w-full min-w-0 rounded border border-edge bg-sheet px-2 text-ink placeholder:text-graphite hover:border-graphite aria-invalid:border-brick aria-invalid:shadow-[inset_3px_0_0_var(--brick)] disabled:bg-transparent disabled:text-graphite';
export const fieldHeight = 'h-8 pointer-coarse:h-11';

/** The ids that tie a hint and an error to their control; undefined when there is neither. */
export function describedBy(id: string, hint: ReactNode, error: string | undefined): string | undefined {
  const ids = [
    ...(hint === undefined ? [] : [`${id}-hint`]),
    ...(error === undefined ? [] : [`${id}-error`]),
  ];
  return ids.length === 0 ? undefined : ids.join(' ');
}

interface FieldFrameProps {
  id: string;
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  children: ReactNode;
  className?: string | undefined;
}

/** Label above, control, hint, and the error in words under it. */
export function FieldFrame({ id, label, hint, error, children, className = '' }: FieldFrameProps) {
  return (
    <div className={`flex min-w-0 flex-col gap-1 ${className}`}>
      <label htmlFor={id} className="text-xs text-graphite">
        {label}
      </label>
      {children}
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-xs text-graphite">
          {hint}
        </p>
      )}
      <FieldError id={id} error={error} />
    </div>
  );
}

export function FieldError({ id, error }: { id: string; error: string | undefined }) {
  if (error === undefined) return null;
  return (
    <p id={`${id}-error`} className="text-xs text-brick">
      {error}
    </p>
  );
}
