import { type UseFormReturn } from 'react-hook-form';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextAreaField, TextField } from '#client/ui/text-field.tsx';
import { type ItemInput } from '#client/api/shop.ts';
import { type FieldSpec } from './fields.ts';
import { type ItemTexts, keyOf } from './form-values.ts';

export type ItemFormApi = UseFormReturn<ItemTexts, unknown, ItemInput>;

const YES_NO = [
  { value: 'yes', label: 'yes' },
  { value: 'no', label: 'no' },
];

/** One setting, typed as its kind demands. */
export function SettingField({ spec, form }: { spec: FieldSpec; form: ItemFormApi }) {
  const name = `values.${keyOf(spec.path)}` as const;
  const error = form.formState.errors.values?.[keyOf(spec.path)]?.message;
  const common = { label: spec.label, hint: spec.hint, error, ...form.register(name) };
  if (spec.as === 'lines') return <TextAreaField {...common} className="col-span-full" spellCheck={false} />;
  if (spec.as === 'choice') return <SelectField {...common} options={spec.options} />;
  if (spec.as === 'yes-no') return <SelectField {...common} options={YES_NO} />;
  return (
    <TextField
      {...common}
      autoComplete="off"
      spellCheck={false}
      inputMode={spec.as === 'whole' ? 'numeric' : 'text'}
    />
  );
}
