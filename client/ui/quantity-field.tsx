import { type KeyboardEvent, useId, useState } from 'react';
import {
  formatAngle,
  formatLength,
  formatPercent,
  MM_PER_INCH,
  parseQuantity,
  type QuantityKind,
  type Units,
  useUnits,
} from '#client/app/units.ts';
import { describedBy, fieldClass, FieldError } from './field.tsx';

export interface QuantityFieldProps {
  label: string;
  /** A fraction of chord, mm or degrees, by `kind`. */
  value: number;
  /** A new value within the limits, after Enter, leaving the field or an arrow key. */
  onCommit: (value: number) => void;
  /** The value while it is being typed, as far as it can be read; null when typing ended or was taken back. */
  onPreview?: ((value: number | null) => void) | undefined;
  kind: QuantityKind;
  chordMm: number;
  min: number;
  max: number;
  /** Decimals shown; an inch gets one more. An arrow key steps by one of the last, with Shift by ten. */
  decimals: number;
  /** The same quantity in another unit, in grey beside the field. */
  secondary?: string | undefined;
  /** An error from outside, such as the server's answer for this field. */
  error?: string | undefined;
  disabled?: boolean | undefined;
  className?: string | undefined;
}

interface Typing {
  readonly text: string;
  readonly error: string | undefined;
}

/** A labelled quantity that is typed with a unit and simple arithmetic; text that cannot be used stays, with the reason. */
export function QuantityField(props: QuantityFieldProps) {
  const { label, secondary, disabled, className = '' } = props;
  const id = useId();
  const { text, error, handlers } = useTypedQuantity(props);
  return (
    <div className={className}>
      <div className="grid grid-cols-[minmax(0,1fr)_7rem_5.5rem] items-center gap-x-2">
        <label htmlFor={id} className="text-sm">
          {label}
        </label>
        <input
          id={id}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          spellCheck={false}
          disabled={disabled}
          value={text}
          {...handlers}
          aria-invalid={error !== undefined}
          aria-describedby={describedBy(id, secondary, error)}
          className={`${fieldClass} h-7 text-right font-semibold focus:border-wire focus:shadow-[inset_3px_0_0_var(--wire)] pointer-coarse:h-11`}
        />
        <span id={`${id}-hint`} className="truncate text-right text-graphite">
          {secondary}
        </span>
      </div>
      <FieldError id={id} error={error} />
    </div>
  );
}

function useTypedQuantity(props: QuantityFieldProps) {
  const units = useUnits();
  const [typing, setTyping] = useState<Typing | null>(null);
  const { value, onCommit, onPreview, disabled } = props;

  const commit = () => {
    if (typing === null) return;
    const read = readWithinLimits(typing.text, props, units);
    if (read.error !== undefined) {
      setTyping({ text: typing.text, error: read.error });
      return;
    }
    setTyping(null);
    onPreview?.(null);
    if (read.value !== value) onCommit(read.value);
  };
  const change = (text: string) => {
    setTyping({ text, error: undefined });
    const read = readWithinLimits(text, props, units);
    if (read.error === undefined) onPreview?.(read.value);
  };
  const keyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') {
      // Enter settles this value; it does not send the form around it.
      event.preventDefault();
      commit();
    } else if (event.key === 'Escape' && typing !== null) {
      event.preventDefault();
      event.stopPropagation();
      setTyping(null);
      onPreview?.(null);
    } else if ((event.key === 'ArrowUp' || event.key === 'ArrowDown') && disabled !== true) {
      event.preventDefault();
      setTyping(null);
      onPreview?.(null);
      const stepped = stepFrom(
        value,
        props,
        units,
        (event.key === 'ArrowUp' ? 1 : -1) * (event.shiftKey ? 10 : 1),
      );
      if (stepped !== value) onCommit(stepped);
    }
  };
  return {
    text: typing?.text ?? formatQuantity(value, props, units),
    error: typing?.error ?? props.error,
    handlers: {
      onChange: (event: { target: { value: string } }) => {
        change(event.target.value);
      },
      onFocus: (event: { target: HTMLInputElement }) => {
        event.target.select();
      },
      onBlur: commit,
      onKeyDown: keyDown,
    },
  };
}

type Quantity = Pick<QuantityFieldProps, 'kind' | 'chordMm' | 'min' | 'max' | 'decimals'>;

function formatQuantity(value: number, { kind, decimals }: Quantity, units: Units): string {
  if (kind === 'fraction') return formatPercent(value, decimals);
  if (kind === 'length') return formatLength(value, units, decimals);
  return formatAngle(value, decimals);
}

function readWithinLimits(text: string, quantity: Quantity, units: Units) {
  const { kind, chordMm, min, max } = quantity;
  const read = parseQuantity(text, { kind, chordMm, units });
  if (read.error !== undefined) return read;
  if (read.value < min || read.value > max) {
    return {
      error: `From ${formatQuantity(min, quantity, units)} to ${formatQuantity(max, quantity, units)}.`,
    };
  }
  return read;
}

/** One step of the last shown decimal, on that grid, and no further than the limits. */
function stepFrom(
  value: number,
  { kind, min, max, decimals }: Quantity,
  units: Units,
  steps: number,
): number {
  const inch = kind === 'length' && units === 'inch';
  const perShown = kind === 'fraction' ? 100 : inch ? 1 / MM_PER_INCH : 1;
  const grid = 10 ** (inch ? decimals + 1 : decimals);
  const stepped = (Math.round(value * perShown * grid) + steps) / grid / perShown;
  return Number(Math.min(max, Math.max(min, stepped)).toPrecision(15));
}
