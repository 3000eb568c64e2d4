import { useId } from 'react';

export interface Segment<Value extends string> {
  readonly value: Value;
  readonly label: string;
  readonly disabled?: boolean | undefined;
}

interface SegmentedControlProps<Value extends string> {
  /** Spoken name of the group; shown above it unless `hideLabel`. */
  label: string;
  segments: readonly Segment<Value>[];
  value: Value;
  onChange: (value: Value) => void;
  hideLabel?: boolean | undefined;
  className?: string | undefined;
}

/** One of a few: native radio buttons side by side, so arrows and form semantics come from the browser. */
export function SegmentedControl<Value extends string>({
  label,
  segments,
  value,
  onChange,
  hideLabel = false,
  className = '',
}: SegmentedControlProps<Value>) {
  const name = useId();
  return (
    <fieldset className={`min-w-0 ${className}`}>
      <legend className={hideLabel ? 'sr-only' : 'mb-1 text-xs text-graphite'}>{label}</legend>
      <div className="flex rounded border border-edge bg-sheet p-px">
        {segments.map((segment) => (
          <label
            key={segment.value}
            className="relative flex h-7 min-w-0 flex-1 items-center justify-center rounded-[1px] px-2 text-center text-sm whitespace-nowrap has-checked:bg-ink has-checked:font-semibold has-checked:text-sheet has-disabled:cursor-not-allowed has-disabled:text-graphite has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-wire pointer-coarse:h-10"
          >
            <input
              type="radio"
              name={name}
              value={segment.value}
              checked={segment.value === value}
              disabled={segment.disabled}
              onChange={() => {
                onChange(segment.value);
              }}
              className="absolute inset-0 cursor-[inherit] opacity-0"
            />
            <span className="truncate">{segment.label}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}
