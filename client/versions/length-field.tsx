import { Controller, type UseFormReturn } from 'react-hook-form';
import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import { formatLength, useUnits } from '#client/app/units.ts';
import { QuantityField } from '#client/ui/quantity-field.tsx';
import { type ExportFields } from './export-fields.ts';

const lengths = {
  chordMm: { label: 'Chord', ...LENGTH_LIMITS.chordMm, decimals: 2 },
  toleranceMm: { label: 'Tolerance', ...LENGTH_LIMITS.toleranceMm, decimals: 3 },
} as const;

interface LengthFieldProps {
  readonly form: UseFormReturn<ExportFields>;
  readonly name: keyof typeof lengths;
}

/** A length of the export form, typed in the person's unit or any other; beside it the same in the other unit. */
export function LengthField({ form, name }: LengthFieldProps) {
  const other = useUnits() === 'mm' ? 'inch' : 'mm';
  const chordMm = form.getValues('chordMm');
  return (
    <Controller
      control={form.control}
      name={name}
      render={({ field, fieldState }) => (
        <QuantityField
          {...lengths[name]}
          kind="length"
          chordMm={chordMm}
          value={field.value}
          onCommit={field.onChange}
          secondary={formatLength(field.value, other, lengths[name].decimals)}
          error={fieldState.error?.message}
        />
      )}
    />
  );
}
