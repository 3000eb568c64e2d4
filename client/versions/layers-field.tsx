import { Controller, type UseFormReturn } from 'react-hook-form';
import { type Layer, LAYERS } from '#geometry/formats/options.ts';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { type ExportFields } from './export-fields.ts';

/** Which layers the drawing carries; a cutter usually wants the outline alone. */
export function LayersField({ form }: { readonly form: UseFormReturn<ExportFields> }) {
  return (
    <Controller
      control={form.control}
      name="layers"
      render={({ field, fieldState }) => (
        <fieldset>
          <legend className="text-xs text-graphite">Layers</legend>
          <div className="grid grid-cols-2 gap-x-3">
            {LAYERS.map((layer) => (
              <CheckboxField
                key={layer}
                label={layer}
                checked={field.value.includes(layer)}
                onChange={(event) => field.onChange(toggled(field.value, layer, event.target.checked))}
              />
            ))}
          </div>
          {fieldState.error && (
            <p role="alert" className="text-xs text-brick">
              {fieldState.error.message}
            </p>
          )}
        </fieldset>
      )}
    />
  );
}

function toggled(layers: readonly Layer[], layer: Layer, on: boolean): Layer[] {
  return LAYERS.filter((other) => (other === layer ? on : layers.includes(other)));
}
