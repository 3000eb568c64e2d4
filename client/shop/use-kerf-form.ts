import { useState } from 'react';
import { type FieldErrors, type Resolver, useForm } from 'react-hook-form';
import { fieldErrors } from '#client/api/request.ts';
import { standingOf, useSaveKerf } from '#client/api/shop.ts';
import { useUnits } from '#client/app/units.ts';
import { sentenceOf } from '#client/ui/error-state.tsx';
import {
  type Kerf,
  type KerfInput,
  kerfSchema,
  type Machine,
  type Material,
} from '#server/contracts/shop.ts';
import { KERF_FIELDS, type KerfTexts, readKerf, textsOfKerf } from './kerf-values.ts';

/** The form of a kerf: its texts, saving, and what to do when another set it in between. */
export function useKerfForm(machine: Machine, material: Material, kerf: Kerf | null) {
  const units = useUnits();
  const [base, setBase] = useState(kerf);
  const [standing, setStanding] = useState<Kerf | null>(null);
  const [saved, setSaved] = useState(false);
  const saving = useSaveKerf({ machineId: machine.id, materialId: material.id });
  const byHand = machine.settings.kind === 'bow';
  const usual = !byHand && material.settings.kind === 'foam' ? material.settings.feedMmMin : null;
  const resolver: Resolver<KerfTexts, unknown, KerfInput> = (texts) => {
    const read = readKerf(texts, { original: base, byHand, units });
    if (read.input) return { values: read.input, errors: {} };
    const errors: FieldErrors<KerfTexts> = {};
    for (const [field, message] of read.errors) errors[field] = { type: 'value', message };
    return { values: {}, errors };
  };
  const form = useForm<KerfTexts, unknown, KerfInput>({
    defaultValues: textsOfKerf(kerf, usual, units),
    resolver,
  });
  const standOn = (now: Kerf) => {
    setBase(now);
    setStanding(null);
    form.reset(textsOfKerf(now, usual, units));
  };
  const send = async (input: KerfInput) => {
    setSaved(false);
    try {
      standOn(await saving.mutateAsync(input));
      setSaved(true);
    } catch (error) {
      const there = standingOf(error, kerfSchema);
      setStanding(there);
      if (there !== null) return;
      const messages = fieldErrors(error);
      for (const field of KERF_FIELDS) {
        const message = messages.get(field);
        if (message !== undefined) form.setError(field, { message });
      }
      form.setError('root', { message: `Not saved; what you typed is kept. ${sentenceOf(error)}` });
    }
  };
  return {
    form,
    units,
    byHand,
    base,
    standing,
    saved,
    busy: saving.isPending,
    save: send,
    saveMine: (input: KerfInput) => send({ ...input, revision: standing?.revision ?? null }),
    takeTheirs: () => {
      if (standing) standOn(standing);
    },
  };
}
