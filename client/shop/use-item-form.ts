import { useState } from 'react';
import { type FieldErrors, type Resolver, useForm, useWatch } from 'react-hook-form';
import { fieldErrors } from '#client/api/request.ts';
import { type ItemInput, type ShopItem, type ShopSort, standingOf, useSaveItem } from '#client/api/shop.ts';
import { type Units, useUnits } from '#client/app/units.ts';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { balsa, extrudedFoam, handBow, laser, router, wireBench } from '#server/contracts/shop-samples.ts';
import { machineSchema, materialSchema } from '#server/contracts/shop.ts';
import {
  fieldsOf,
  type ItemKind,
  type ItemSettings,
  type ItemTexts,
  placeOf,
  readItem,
  textOf,
  textsOf,
} from './form-values.ts';
import { type ItemFormApi } from './setting-field.tsx';
import { useUnsaved } from './use-unsaved.tsx';

/** What an empty form of each kind begins with. */
export const startingSettings: Readonly<Record<ItemKind, ItemSettings>> = {
  wire: wireBench,
  bow: handBow,
  laser,
  router,
  foam: extrudedFoam,
  sheet: balsa,
};

function textsOfItem(sort: ShopSort, item: ShopItem | null, units: Units): ItemTexts {
  const settings = item?.settings ?? startingSettings[sort === 'machine' ? 'wire' : 'foam'];
  return { name: item?.name ?? '', kind: settings.kind, values: textsOf(settings, units) };
}

/** What stands there now where it is other than what stands in the form. */
function differencesOf(texts: ItemTexts, standing: ShopItem, units: Units): string[] {
  const there = textsOf(standing.settings, units);
  const fields = fieldsOf(standing.settings.kind).flatMap((spec) => {
    const text = textOf(spec, standing.settings, units);
    const key = spec.path.replaceAll('.', '-');
    return texts.values[key] === there[key] ? [] : [`${spec.label}: ${text === '' ? 'nothing' : text}`];
  });
  return [
    ...(texts.name === standing.name ? [] : [`Name: ${standing.name}`]),
    ...fields,
    ...(standing.archived ? ['It is in the archive.'] : []),
  ];
}

/** The form of a machine or material: its texts, saving, and what to do when another saved in between. */
export function useItemForm(sort: ShopSort, item: ShopItem | null, onSaved: (item: ShopItem) => void) {
  const units = useUnits();
  // What the form stands on: a change names its revision, however often the lists are loaded anew.
  const [base, setBase] = useState(item);
  const [standing, setStanding] = useState<ShopItem | null>(null);
  const [saved, setSaved] = useState(false);
  const saving = useSaveItem(sort);
  const form: ItemFormApi = useForm<ItemTexts, unknown, ItemInput>({
    defaultValues: textsOfItem(sort, item, units),
    resolver: resolverOf(sort, base?.settings ?? null, units),
  });
  const texts = useWatch({ control: form.control }) as ItemTexts;
  const unsaved = useUnsaved(form.formState.isDirty);

  const standOn = (now: ShopItem) => {
    setBase(now);
    setStanding(null);
    form.reset(textsOfItem(sort, now, units));
  };
  const send = async (wanted: Parameters<typeof saving.mutateAsync>[0], keepTexts = false) => {
    setSaved(false);
    try {
      const now = await saving.mutateAsync(wanted);
      if (keepTexts) setBase(now);
      else standOn(now);
      setSaved(!keepTexts);
      if (base === null) unsaved.release();
      onSaved(now);
    } catch (error) {
      const there = standingOf<ShopItem>(error, sort === 'machine' ? machineSchema : materialSchema);
      setStanding(there);
      if (there === null) showRefusal(form, error);
    }
  };
  const change = (revision: number | undefined) => (input: ItemInput) =>
    base === null || revision === undefined
      ? send({ input })
      : send({ id: base.id, change: { ...input, revision } });
  return {
    form,
    question: unsaved.question,
    kind: texts.kind,
    state: {
      standing,
      differences: standing ? differencesOf(texts, standing, units) : [],
      busy: saving.isPending,
      saved,
      archived: base?.archived ?? false,
    },
    save: change(base?.revision),
    saveMine: change(standing?.revision),
    takeTheirs: () => {
      if (standing) standOn(standing);
    },
    setArchived: async (archived: boolean) => {
      if (base) await send({ id: base.id, change: { revision: base.revision, archived } }, true);
    },
  };
}

function resolverOf(
  sort: ShopSort,
  original: ItemSettings | null,
  units: Units,
): Resolver<ItemTexts, unknown, ItemInput> {
  return (texts) => {
    const read = readItem(sort, texts, original, units);
    if (read.input) return { values: read.input, errors: {} };
    const errors: FieldErrors<ItemTexts> = {};
    const values: Record<string, { type: string; message: string }> = {};
    for (const [key, message] of read.errors) {
      // What belongs to no field is said at the first one, rather than nowhere.
      if (key === 'name' || key === 'root') errors.name ??= { type: 'value', message };
      else values[key] = { type: 'value', message };
    }
    if (Object.keys(values).length > 0) errors.values = values;
    return { values: {}, errors };
  };
}

/** The server's answer, at its fields where it names any. */
function showRefusal(form: ItemFormApi, error: unknown): void {
  const kind = form.getValues('kind');
  for (const [path, message] of fieldErrors(error)) {
    const key = placeOf(path.split('.'), kind);
    if (key === 'root') continue;
    form.setError(key === 'name' ? 'name' : `values.${key}`, { message });
  }
  form.setError('root', { message: `Not saved; what you typed is kept. ${sentenceOf(error)}` });
}
