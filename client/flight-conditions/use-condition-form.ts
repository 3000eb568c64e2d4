import { useMemo, useState } from 'react';
import { type FieldErrors, type Resolver, useForm, type UseFormReturn, useWatch } from 'react-hook-form';
import { type FlightCondition } from '#geometry/flow/flight-condition.ts';
import { useSaveCondition, useSetDefaultCondition } from '#client/api/flight-conditions.ts';
import { fieldErrors } from '#client/api/request.ts';
import { standingOf } from '#client/api/shop.ts';
import { type Units, useUnits } from '#client/app/units.ts';
import { useUnsaved } from '#client/shop/use-unsaved.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { levelTrainer } from '#server/contracts/flight-condition-samples.ts';
import {
  type ConditionInput,
  type StoredCondition,
  storedConditionSchema,
} from '#server/contracts/flight-conditions.ts';
import {
  type ConditionTexts,
  fieldAt,
  FIELDS,
  fieldsOf,
  readCondition,
  readForm,
  textsOf,
} from './form-values.ts';

export type ConditionFormApi = UseFormReturn<ConditionTexts, unknown, ConditionInput>;

const textsOfStored = (stored: StoredCondition | null, units: Units) =>
  textsOf(stored?.name ?? '', stored?.settings ?? levelTrainer, units);

/** What stands there now where it is other than what stands in the form. */
function differencesOf(texts: ConditionTexts, standing: StoredCondition, units: Units): string[] {
  const there = textsOfStored(standing, units);
  const fields = fieldsOf(there).flatMap((field) =>
    texts[field] === there[field]
      ? []
      : [`${FIELDS[field].label}: ${there[field] === '' ? 'free' : there[field]}`],
  );
  return [
    ...(texts.name === there.name ? [] : [`Name: ${there.name}`]),
    ...fields,
    ...(standing.archived ? ['It is in the archive.'] : []),
  ];
}

/** The form of a flight condition: its texts, what they say while typing, saving, and what to do when another saved in between. */
export function useConditionForm(stored: StoredCondition | null, onSaved: (now: StoredCondition) => void) {
  const units = useUnits();
  // What the form stands on: a change names its revision, however often the list is loaded anew.
  const [base, setBase] = useState(stored);
  const [standing, setStanding] = useState<StoredCondition | null>(null);
  const [saved, setSaved] = useState(false);
  const saving = useSaveCondition();
  const original = base?.settings ?? levelTrainer;
  const form: ConditionFormApi = useForm<ConditionTexts, unknown, ConditionInput>({
    defaultValues: textsOfStored(stored, units),
    resolver: resolverOf(original, units),
  });
  const choosing = useDefaultChoice(form);
  const texts = useWatch({ control: form.control }) as ConditionTexts;
  const unsaved = useUnsaved(form.formState.isDirty);

  const standOn = (now: StoredCondition) => {
    setBase(now);
    setStanding(null);
    form.reset(textsOfStored(now, units));
  };
  const send = async (wanted: Parameters<typeof saving.mutateAsync>[0], keepTexts = false) => {
    setSaved(false);
    try {
      const now = await saving.mutateAsync(wanted);
      (keepTexts ? setBase : standOn)(now);
      setSaved(!keepTexts);
      if (base === null) unsaved.release();
      onSaved(now);
    } catch (error) {
      const there = standingOf(error, storedConditionSchema);
      setStanding(there);
      if (there === null) showRefusal(form, error);
    }
  };
  const change = (revision: number | undefined) => (input: ConditionInput) =>
    base === null || revision === undefined
      ? send({ input })
      : send({ id: base.id, change: { ...input, revision } });
  return {
    form,
    texts,
    question: unsaved.question,
    figures: useLastReadable(texts, original, units),
    state: {
      standing,
      differences: standing ? differencesOf(texts, standing, units) : [],
      busy: saving.isPending || choosing.busy,
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
    setDefault: () => choosing.choose(base?.id),
  };
}

/** Making a condition the default, with the refusal said in the form. */
function useDefaultChoice(form: ConditionFormApi) {
  const choosing = useSetDefaultCondition();
  return {
    busy: choosing.isPending,
    choose: async (id: string | undefined) => {
      if (id === undefined) return;
      try {
        await choosing.mutateAsync(id);
      } catch (error) {
        form.setError('root', { message: `It did not become the default. ${sentenceOf(error)}` });
      }
    },
  };
}

/** The condition that the texts say; while they cannot be read the last one that could, marked as older. */
function useLastReadable(texts: ConditionTexts, original: FlightCondition, units: Units) {
  const read = useMemo(() => readCondition(texts, original, units).value, [texts, original, units]);
  const [last, setLast] = useState(read ?? original);
  if (read !== undefined && JSON.stringify(read) !== JSON.stringify(last)) setLast(read);
  return { condition: read ?? last, older: read === undefined };
}

function resolverOf(
  original: FlightCondition,
  units: Units,
): Resolver<ConditionTexts, unknown, ConditionInput> {
  return (texts) => {
    const read = readForm(texts, original, units);
    if (read.value !== undefined) return { values: read.value, errors: {} };
    const errors: FieldErrors<ConditionTexts> = {};
    for (const [field, message] of read.errors) {
      // What belongs to no field is said at the first one, rather than nowhere.
      errors[field === 'root' ? 'name' : field] ??= { type: 'value', message };
    }
    return { values: {}, errors };
  };
}

/** The server's answer, at its fields where it names any. */
function showRefusal(form: ConditionFormApi, error: unknown): void {
  for (const [path, message] of fieldErrors(error)) {
    const field = fieldAt(path.split('.'));
    if (field !== 'root') form.setError(field, { message });
  }
  form.setError('root', { message: `Not saved; what you typed is kept. ${sentenceOf(error)}` });
}
