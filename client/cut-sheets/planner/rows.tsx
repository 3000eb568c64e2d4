import { type ReactNode, useId, useState } from 'react';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { usePlannerFields, useStored } from './planner-context.ts';
import { QuantityInput, type QuantityInputProps } from './quantity-input.tsx';

const ROW = 'grid grid-cols-[minmax(0,1fr)_5.25rem_5.25rem] items-start gap-x-1.5';
const LABEL = 'flex min-h-7 items-center leading-tight pointer-coarse:min-h-11';

/** A titled part of the form. */
export function Group({ title, aside, children }: { title: string; aside?: ReactNode; children: ReactNode }) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="flex flex-col gap-1">
      <div className="mb-1 flex items-end justify-between gap-2 border-b border-rule pb-1 text-xs text-graphite">
        <h2 id={id} className="font-semibold tracking-wide uppercase">
          {title}
        </h2>
        {aside}
      </div>
      {children}
    </section>
  );
}

/** A part of the form that opens when it is needed; says in a few words what is in it. */
export function FoldedGroup(props: { title: string; summary: string; children: ReactNode }) {
  const { title, summary, children } = props;
  return (
    <details className="group border-b border-rule pb-2">
      <summary className="flex min-h-7 list-none items-baseline justify-between gap-2 text-xs text-graphite pointer-coarse:min-h-11 pointer-coarse:items-center [&::-webkit-details-marker]:hidden">
        <span className="font-semibold tracking-wide uppercase">
          <Triangle />
          {title}
        </span>
        <span className="min-w-0 truncate">{summary}</span>
      </summary>
      <div className="flex flex-col gap-1 pt-1">{children}</div>
    </details>
  );
}

function Triangle() {
  return (
    <svg
      viewBox="0 0 8 8"
      aria-hidden="true"
      className="mr-1.5 inline size-2 fill-current group-open:rotate-90"
    >
      <path d="M1 0 7 4 1 8Z" />
    </svg>
  );
}

/** Heads of the two columns. */
export function EndHeads() {
  return (
    <div className={`${ROW} text-xs text-graphite`} aria-hidden="true">
      <span />
      <span className="text-right">root</span>
      <span className="text-right">tip</span>
    </div>
  );
}

interface PairRowProps extends Omit<QuantityInputProps, 'path' | 'end'> {
  readonly root: string;
  readonly tip: string;
}

/** One quantity at both ends. */
export function PairRow({ label, root, tip, ...rest }: PairRowProps) {
  return (
    <div className={ROW}>
      <span className={LABEL}>{label}</span>
      <QuantityInput {...rest} path={root} end="root" label={`${label} at the root`} />
      <QuantityInput {...rest} path={tip} end="tip" label={`${label} at the tip`} />
    </div>
  );
}

/** One quantity; its spoken label may say more than the visible one. */
export function QuantityRow({ label, spoken = label, ...rest }: QuantityInputProps & { spoken?: string }) {
  return (
    <div className={ROW}>
      <span className={`${LABEL} col-span-2`}>{label}</span>
      <QuantityInput {...rest} label={spoken} />
    </div>
  );
}

interface ChoiceRowProps {
  readonly path: string;
  readonly label: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
}

/** One of a few words. */
export function ChoiceRow({ path, label, options }: ChoiceRowProps) {
  const { errors, enabled, setValue } = usePlannerFields();
  const stored = useStored(path);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_10.875rem] items-start gap-x-1.5">
      <span className={LABEL} aria-hidden="true">
        {label}
      </span>
      <SelectField
        name={path}
        label={label}
        hideLabel
        options={options}
        disabled={!enabled}
        error={errors.get(path)}
        value={String(stored ?? '')}
        onChange={(event) => setValue(path, event.target.value)}
        className="font-semibold"
      />
    </div>
  );
}

/** Yes or no. */
export function CheckRow({ path, label }: { path: string; label: string }) {
  const { enabled, setValue } = usePlannerFields();
  const stored = useStored(path);
  return (
    <CheckboxField
      name={path}
      label={label}
      disabled={!enabled}
      checked={stored === true}
      onChange={(event) => setValue(path, event.target.checked)}
    />
  );
}

/** Brings a group of the plan in or takes it out: `null` is without it. */
export function GroupSwitch({ path, label, initial }: { path: string; label: string; initial: object }) {
  const { enabled, setValue } = usePlannerFields();
  const stored = useStored(path);
  const [last, setLast] = useState<unknown>(null);
  return (
    <CheckboxField
      name={path}
      label={label}
      disabled={!enabled}
      checked={stored !== null && stored !== undefined}
      onChange={(event) => {
        // What was typed comes back when the group does.
        if (!event.target.checked) setLast(stored);
        setValue(path, event.target.checked ? (last ?? initial) : null);
      }}
    />
  );
}
