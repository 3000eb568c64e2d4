import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import { formatAngle, formatLength, useUnits } from '#client/app/units.ts';
import { type PlacedSectionDimension } from '#client/drawing/dimension-lines.tsx';
import { type DimensionId } from '#client/drawing/section-dimensions.ts';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { DIMENSION_NAMES } from './dimension-buttons.tsx';
import { readDimension } from './dimension-value.ts';
import { type FieldId } from './fields.ts';
import { type Present } from './present.ts';

interface DimensionInputProps {
  readonly dimension: PlacedSectionDimension & { readonly id: FieldId & DimensionId };
  readonly layout: SheetLayout;
  readonly present: Present;
  /** The value in use, in mm for lengths, in degrees for angles. */
  readonly value: number;
  readonly onCommit: (field: FieldId, value: number) => void;
  /** Leaves the field; `step` goes on to the next or the previous dimension. */
  readonly onLeave: (step: -1 | 0 | 1) => void;
}

const WIDTH = 108;

/** A dimension being typed, at its place on the sheet. Text that cannot be used stays, with the reason under it. */
export function DimensionInput({
  dimension,
  layout,
  present,
  value,
  onCommit,
  onLeave,
}: DimensionInputProps) {
  const units = useUnits();
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const isAngle = dimension.id.startsWith('boatTail');
  const shown = isAngle ? formatAngle(value, 2) : formatLength(value, units);
  const [text, setText] = useState(shown);
  const [error, setError] = useState<string | null>(null);
  useEffect(() => {
    input.current?.focus();
    input.current?.select();
  }, []);

  /** True when the typed text was taken over, or was left as it stood. */
  const commit = (): boolean => {
    if (text === shown) return true;
    const read = readDimension(text, present, dimension.id, units);
    setError(read.error ?? null);
    if (read.error !== undefined) return false;
    onCommit(dimension.id, read.value);
    return true;
  };
  const { textBox } = dimension;
  const { scale } = layout;
  const left = Math.min(layout.width - WIDTH - 4, Math.max(4, textBox.x + textBox.width / 2 - WIDTH / 2));
  const top = textBox.y + textBox.height / 2 - 15;
  return (
    <div className="absolute z-10" style={{ left: left * scale, top: top * scale, width: WIDTH * scale }}>
      <input
        ref={input}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        spellCheck={false}
        aria-label={DIMENSION_NAMES[dimension.id]}
        aria-invalid={error !== null}
        aria-describedby={error === null ? undefined : id}
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          setError(null);
        }}
        onKeyDown={(event) => {
          keyDown(event, commit, onLeave);
        }}
        onBlur={() => {
          if (commit()) onLeave(0);
        }}
        className="h-7.5 w-full rounded border border-wire bg-sheet px-2 text-center text-sm font-semibold text-ink outline-none aria-invalid:border-brick aria-invalid:shadow-[inset_3px_0_0_var(--brick)]"
      />
      {error !== null && <Reason id={id} text={error} />}
    </div>
  );
}

function Reason({ id, text }: { id: string; text: string }) {
  return (
    <p
      id={id}
      role="alert"
      className="mt-1 w-52 border-l-2 border-brick bg-sheet px-2 py-1 text-xs text-brick"
    >
      {text}
    </p>
  );
}

/** Enter takes the text over, Tab goes on to the next dimension, Esc leaves it as it was. */
function keyDown(event: KeyboardEvent, commit: () => boolean, onLeave: DimensionInputProps['onLeave']): void {
  if (event.key === 'Escape') onLeave(0);
  else if (event.key === 'Enter') {
    if (commit()) onLeave(0);
  } else if (event.key === 'Tab') {
    if (commit()) onLeave(event.shiftKey ? -1 : 1);
  } else return;
  event.preventDefault();
  event.stopPropagation();
}
