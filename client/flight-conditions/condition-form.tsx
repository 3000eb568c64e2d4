import { type FormEvent, type ReactNode } from 'react';
import { Button } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { StandingNotice } from '#client/shop/standing-notice.tsx';
import { type StoredCondition } from '#server/contracts/flight-conditions.ts';
import { FIELDS, type QuantityField } from './form-values.ts';
import { type ConditionFormApi, type useConditionForm } from './use-condition-form.ts';

export interface ConditionFormProps {
  /** Null for a new one. */
  stored: StoredCondition | null;
  api: ReturnType<typeof useConditionForm>;
}

const WINGS = [
  { value: 'span', label: 'span and chord' },
  { value: 'area', label: 'its area' },
];
const FLIGHTS = [
  { value: 'speed', label: 'given speed' },
  { value: 'lift', label: 'given lift' },
];
const SURFACES = [
  { value: 'smooth', label: 'smooth' },
  { value: 'forced', label: 'transition set' },
];

/** A flight condition with all its fields. */
export function ConditionForm({ stored, api }: ConditionFormProps) {
  const { form, texts, question, state, save, saveMine, takeTheirs } = api;
  const submit = (event: FormEvent) => void form.handleSubmit(save)(event);
  const { errors } = form.formState;
  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <Group title="Aircraft">
        <Quantity field="massKg" form={form} />
        <SelectField label="Wing given by" options={WINGS} {...form.register('wing')} />
        {texts.wing === 'area' ? (
          <Quantity field="areaM2" form={form} className="col-span-full" />
        ) : (
          <>
            <Quantity field="spanM" form={form} />
            <Quantity field="meanChordMm" form={form} />
          </>
        )}
        <Quantity field="rootChordMm" form={form} />
        <Quantity field="tipChordMm" form={form} />
      </Group>
      <Group title="Level flight">
        <SelectField label="Level flight at" options={FLIGHTS} {...form.register('flight')} />
        <Quantity field={texts.flight === 'speed' ? 'speedMS' : 'liftCoefficient'} form={form} />
        <Quantity field="altitudeM" form={form} />
        <Quantity field="temperatureOffsetC" form={form} />
      </Group>
      <Group title="Surface and air">
        <SelectField label="Surface" options={SURFACES} {...form.register('surface')} />
        <Quantity field="turbulencePercent" form={form} />
        {texts.surface === 'forced' && (
          <>
            <Quantity field="tripUpper" form={form} />
            <Quantity field="tripLower" form={form} />
          </>
        )}
      </Group>
      {state.standing && (
        <StandingNotice
          who={state.standing.updatedBy.name}
          at={state.standing.updatedAt}
          differences={state.differences}
          onTakeTheirs={takeTheirs}
          onSaveMine={() => void form.handleSubmit(saveMine)()}
          busy={state.busy}
        />
      )}
      {errors.root?.message !== undefined && <Notice tone="error">{errors.root.message}</Notice>}
      {state.saved && !form.formState.isDirty && <Notice tone="good">Saved.</Notice>}
      <Actions stored={stored} api={api} />
      {question}
    </form>
  );
}

function Actions({ stored, api }: ConditionFormProps) {
  const { state, setArchived, setDefault } = api;
  const isDefault = stored?.isDefault === true;
  return (
    <div className="flex flex-wrap items-center justify-between gap-2">
      <Button variant="primary" type="submit" busy={state.busy}>
        {stored === null ? 'Make the condition' : 'Save'}
      </Button>
      {isDefault && (
        <p className="text-xs text-graphite">The default stays in use until another one is it.</p>
      )}
      {stored !== null && !isDefault && (
        <div className="flex flex-wrap gap-2">
          {!state.archived && (
            <Button busy={state.busy} onClick={() => void setDefault()}>
              Make it the default
            </Button>
          )}
          <Button busy={state.busy} onClick={() => void setArchived(!state.archived)}>
            {state.archived ? 'Take back from the archive' : 'Archive'}
          </Button>
        </div>
      )}
    </div>
  );
}

function Group({ title, children }: { title: string; children: ReactNode }) {
  return (
    <fieldset className="min-w-0">
      <legend className="mb-2 w-full border-b border-rule pb-1 text-xs font-semibold text-graphite uppercase">
        {title}
      </legend>
      <div className="grid grid-cols-2 items-start gap-3">{children}</div>
    </fieldset>
  );
}

interface QuantityProps {
  field: QuantityField;
  form: ConditionFormApi;
  className?: string;
}

function Quantity({ field, form, className }: QuantityProps) {
  const { label, hint } = FIELDS[field];
  return (
    <TextField
      label={label}
      hint={hint}
      className={className}
      error={form.formState.errors[field]?.message}
      autoComplete="off"
      spellCheck={false}
      {...form.register(field)}
    />
  );
}
