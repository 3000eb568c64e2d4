import { Controller, type UseFormReturn, useWatch } from 'react-hook-form';
import { QuantityField } from '#client/ui/quantity-field.tsx';
import { type Segment, SegmentedControl } from '#client/ui/segmented-control.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { CST_LIMITS } from '#geometry/shapes/cst.ts';
import { NACA4_LIMITS } from '#geometry/shapes/naca4.ts';
import { type NewSectionForm, type Start } from './new-section-form.ts';

const STARTS: readonly Segment<Start>[] = [
  { value: 'designation', label: 'Digits' },
  { value: 'values', label: 'Values' },
  { value: 'free', label: 'Free form' },
];
const EDGES = [
  { value: 'open', label: 'Open, as published' },
  { value: 'closed', label: 'Closed to an edge' },
] as const;
const ORDERS = Array.from({ length: CST_LIMITS.order.max - CST_LIMITS.order.min + 1 }, (_, index) => {
  const order = String(CST_LIMITS.order.min + index);
  return { value: order, label: order };
});
/** A quantity in mm needs a chord; a new section has none yet, so mm are taken on a round one. */
const CHORD_MM = 100;
const VALUES = [
  { name: 'maxCamber', label: 'Camber', decimals: 2 },
  { name: 'maxCamberPosition', label: 'Camber position', decimals: 1 },
  { name: 'maxThickness', label: 'Thickness', decimals: 2 },
] as const;

/** From what the new shape begins: a designation, 4-digit values, or a free form fitted to a designation. */
export function StartFields({ form }: { form: UseFormReturn<NewSectionForm> }) {
  const { control, formState, register } = form;
  const start = useWatch({ control, name: 'start' });
  return (
    <>
      <Controller
        control={control}
        name="start"
        render={({ field }) => (
          <SegmentedControl
            label="Start from"
            segments={STARTS}
            value={field.value}
            onChange={field.onChange}
          />
        )}
      />
      {start === 'values' ? (
        <ValueFields form={form} />
      ) : (
        <TextField
          label="4-digit designation"
          inputMode="text"
          autoComplete="off"
          spellCheck={false}
          error={formState.errors.designation?.message}
          {...register('designation')}
        />
      )}
      <div className="grid gap-4 sm:grid-cols-2">
        <SelectField label="Trailing edge" options={EDGES} {...register('trailingEdge')} />
        {start === 'free' && (
          <SelectField
            label="Order of both surfaces"
            options={ORDERS}
            error={formState.errors.order?.message}
            {...register('order', { valueAsNumber: true })}
          />
        )}
      </div>
    </>
  );
}

function ValueFields({ form }: { form: UseFormReturn<NewSectionForm> }) {
  return (
    <div className="flex flex-col gap-1">
      {VALUES.map(({ name, label, decimals }) => (
        <Controller
          key={name}
          control={form.control}
          name={name}
          render={({ field, fieldState }) => (
            <QuantityField
              label={label}
              kind="fraction"
              chordMm={CHORD_MM}
              {...NACA4_LIMITS[name]}
              decimals={decimals}
              value={field.value}
              onCommit={field.onChange}
              error={fieldState.error?.message}
            />
          )}
        />
      ))}
    </div>
  );
}
