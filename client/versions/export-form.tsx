import { Controller, type UseFormReturn, useWatch } from 'react-hook-form';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { SegmentedControl } from '#client/ui/segmented-control.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { type ExportFields } from './export-fields.ts';
import { LayersField } from './layers-field.tsx';
import { LengthField } from './length-field.tsx';

type Form = UseFormReturn<ExportFields>;

const formats = [
  { value: 'dxf', label: 'DXF' },
  { value: 'dat', label: 'dat' },
  { value: 'svg', label: 'SVG' },
] as const;

/** What the file is to be: only the fields that concern the chosen format are shown. */
export function ExportForm({ form }: { readonly form: Form }) {
  const format = useWatch({ control: form.control, name: 'format' });
  return (
    <div className="flex flex-col gap-4">
      <Controller
        control={form.control}
        name="format"
        render={({ field }) => (
          <SegmentedControl label="Format" segments={formats} value={field.value} onChange={field.onChange} />
        )}
      />
      {format === 'dat' ? (
        <CoordinateFields form={form} />
      ) : (
        <DrawingFields form={form} dxf={format === 'dxf'} />
      )}
    </div>
  );
}

function DrawingFields({ form, dxf }: { readonly form: Form; readonly dxf: boolean }) {
  return (
    <>
      <LengthField form={form} name="chordMm" />
      <LengthField form={form} name="toleranceMm" />
      <LayersField form={form} />
      {dxf && (
        <>
          <SelectField label="DXF release" options={releases} {...form.register('release')} />
          <CheckboxField
            label="Arcs instead of straight pieces"
            hint="For controllers that run arcs; the arcs keep to the same tolerance."
            {...form.register('arcs')}
          />
        </>
      )}
    </>
  );
}

const releases = [
  { value: 'r2000', label: 'R2000, unit written in the file' },
  { value: 'r12', label: 'R12, for old controllers' },
] as const;

function CoordinateFields({ form }: { readonly form: Form }) {
  const [unitChord, spacing] = useWatch({ control: form.control, name: ['unitChord', 'spacing'] });
  const { errors } = form.formState;
  return (
    <>
      <CheckboxField
        label="Unit chord"
        hint="Coordinates as fractions of chord, without a unit."
        {...form.register('unitChord')}
      />
      {!unitChord && (
        <>
          <LengthField form={form} name="chordMm" />
          <SelectField label="Spacing of the points" options={spacings} {...form.register('spacing')} />
        </>
      )}
      {!unitChord && spacing === 'tolerance' ? (
        <LengthField form={form} name="toleranceMm" />
      ) : (
        <TextField
          label="Points per surface"
          inputMode="numeric"
          autoComplete="off"
          error={errors.points?.message}
          {...form.register('points')}
        />
      )}
      <SelectField label="Order" options={orders} {...form.register('order')} />
      <div className="grid grid-cols-2 gap-3">
        <TextField
          label="Decimals"
          inputMode="numeric"
          autoComplete="off"
          error={errors.decimals?.message}
          {...form.register('decimals')}
        />
        <SelectField label="Line end" options={newlines} {...form.register('newline')} />
      </div>
    </>
  );
}

const spacings = [
  { value: 'cosine', label: 'Cosine: dense at nose and edge' },
  { value: 'tolerance', label: 'Fewest within a tolerance' },
] as const;
const orders = [
  { value: 'round', label: 'Round, from the upper trailing edge' },
  { value: 'surfaces', label: 'Surface by surface, from the nose' },
] as const;
const newlines = [
  { value: 'lf', label: 'LF' },
  { value: 'crlf', label: 'CR LF' },
] as const;
