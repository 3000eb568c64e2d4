import { memo, useId } from 'react';
import { fieldClass, FieldError } from '#client/ui/field.tsx';
import { type ReadText, useTypedText } from './use-typed-text.ts';

interface NumberFieldProps {
  readonly label: string;
  /** Shown in the label's place, when shorter than the spoken label. */
  readonly short?: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  readonly decimals: number;
  readonly onCommit: (value: number) => void;
}

/** The look of a field for one value in the list beside the sheet. */
export const valueFieldClass = `${fieldClass} h-7 font-semibold focus:border-wire focus:shadow-[inset_3px_0_0_var(--wire)] pointer-coarse:h-11`;

/** A plain number without unit, such as a weight. Text that cannot be used stays, with the reason. */
export const NumberField = memo(function NumberField(props: NumberFieldProps) {
  const { label, short = label, value, min, max, decimals, onCommit } = props;
  const id = useId();
  const { text, error, close, handlers } = useTypedText(
    value.toFixed(decimals),
    (typed) => readNumber(typed, min, max),
    onCommit,
  );
  const step = (steps: number) => {
    const next = Number((value + steps * 10 ** -(decimals - 1)).toFixed(decimals + 2));
    close();
    onCommit(Math.min(max, Math.max(min, next)));
  };
  return (
    <div className="min-w-0">
      <div className="flex items-center gap-1.5">
        <label htmlFor={id} className="min-w-6 shrink-0 text-xs text-graphite">
          <span aria-hidden="true">{short}</span>
          <span className="sr-only">{label}</span>
        </label>
        <input
          {...handlers}
          id={id}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          spellCheck={false}
          aria-invalid={error !== undefined}
          aria-describedby={error === undefined ? undefined : `${id}-error`}
          value={text}
          onKeyDown={(event) => {
            if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') {
              handlers.onKeyDown(event);
              return;
            }
            event.preventDefault();
            step((event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? 10 : 1));
          }}
          className={`${valueFieldClass} text-right`}
        />
      </div>
      <FieldError id={id} error={error} />
    </div>
  );
});

function readNumber(text: string, min: number, max: number): ReadText<number> {
  const trimmed = text.trim().replace(',', '.').replace('−', '-');
  const value = trimmed === '' ? Number.NaN : Number(trimmed);
  if (!Number.isFinite(value)) return { error: 'Type a number.' };
  return value < min || value > max ? { error: `From ${min} to ${max}.` } : { value };
}
