import { type FormEvent, useId } from 'react';
import { type ShopItem, type ShopSort } from '#client/api/shop.ts';
import { useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { machineKinds, materialKinds } from '#server/contracts/shop.ts';
import { KindCautions } from './cautions.tsx';
import { FIELDS } from './fields.ts';
import { type ItemKind, textsOf } from './form-values.ts';
import { type ItemFormApi, SettingField } from './setting-field.tsx';
import { StandingNotice } from './standing-notice.tsx';
import { startingSettings, useItemForm } from './use-item-form.ts';
import { KIND_WORDS } from './words.ts';

export interface ItemFormProps {
  sort: ShopSort;
  /** Null for a new one. */
  item: ShopItem | null;
  onSaved: (item: ShopItem) => void;
}

/** A machine or material with all its settings. */
export function ItemForm({ sort, item, onSaved }: ItemFormProps) {
  const formId = useId();
  const itemForm = useItemForm(sort, item, onSaved);
  const { form, question, kind, state, save, saveMine, takeTheirs, setArchived } = itemForm;
  const submit = (event: FormEvent) => void form.handleSubmit(save)(event);
  const { errors } = form.formState;
  return (
    <form id={formId} noValidate onSubmit={submit} className="flex flex-col gap-5">
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      {item === null && <KindField sort={sort} form={form} />}
      <KindCautions kind={kind} />
      {FIELDS[kind].map(({ title, fields }) => (
        <fieldset key={title} className="min-w-0">
          <legend className="mb-2 w-full border-b border-rule pb-1 text-xs font-semibold text-graphite uppercase">
            {title}
          </legend>
          <div className="grid grid-cols-2 items-start gap-x-3 gap-y-3">
            {fields.map((spec) => (
              <SettingField key={spec.path} spec={spec} form={form} />
            ))}
          </div>
        </fieldset>
      ))}
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
      <div className="flex flex-wrap justify-between gap-2">
        <Button variant="primary" type="submit" busy={state.busy}>
          {item === null ? `Make the ${sort}` : 'Save'}
        </Button>
        {item && (
          <Button busy={state.busy} onClick={() => void setArchived(!state.archived)}>
            {state.archived ? 'Take back from the archive' : 'Archive'}
          </Button>
        )}
      </div>
      {question}
    </form>
  );
}

function KindField({ sort, form }: { sort: ShopSort; form: ItemFormApi }) {
  const units = useUnits();
  const kinds: readonly ItemKind[] = sort === 'machine' ? machineKinds : materialKinds;
  return (
    <SelectField
      label="Kind"
      options={kinds.map((value) => ({ value, label: KIND_WORDS[value] }))}
      hint="The kind stays as it is later on."
      {...form.register('kind', {
        onChange: (event: { target: { value: ItemKind } }) => {
          form.setValue('values', textsOf(startingSettings[event.target.value], units), {
            shouldDirty: true,
          });
          form.clearErrors();
        },
      })}
    />
  );
}
