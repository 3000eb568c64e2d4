import { zodResolver } from '@hookform/resolvers/zod';
import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { type FormEvent, useRef } from 'react';
import { useForm } from 'react-hook-form';
import { Link, useNavigate } from 'react-router';
import { v4 } from 'uuid';
import { z } from 'zod';
import { beginningPlan } from '#server/contracts/beginning-plan.ts';
import { itemNameSchema, purposeSchema } from '#server/contracts/common.ts';
import { useCreateCutSheet } from '#client/api/cut-sheets.ts';
import { fieldErrors } from '#client/api/request.ts';
import { sectionsQuery } from '#client/api/sections.ts';
import { kerfsQuery, machinesQuery, materialsQuery } from '#client/api/shop.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { sheetPath } from '../paths.ts';

const formSchema = z.object({
  name: itemNameSchema,
  purpose: purposeSchema,
  rootSection: z.string().min(1, 'Choose the section of the root.'),
  tipSection: z.string(),
  machine: z.string(),
  material: z.string(),
});
type NewSheetForm = z.infer<typeof formSchema>;

/** Everything that a new sheet can be begun with; null while it is on its way. */
function useChoices() {
  const sections = useInfiniteQuery(sectionsQuery({ status: 'released', sort: 'name', limit: 100 }));
  const machines = useQuery(machinesQuery());
  const materials = useQuery(materialsQuery());
  const kerfs = useQuery(kerfsQuery());
  const error = sections.error ?? machines.error ?? materials.error ?? kerfs.error;
  const choices =
    sections.data && machines.data && materials.data && kerfs.data
      ? {
          sections: sections.data.pages
            .flatMap((page) => page.items)
            .flatMap(({ id, name, releasedNumber }) =>
              releasedNumber === null ? [] : [{ id, name, number: releasedNumber }],
            ),
          machines: machines.data.filter(
            ({ archived, settings }) => !archived && (settings.kind === 'wire' || settings.kind === 'bow'),
          ),
          materials: materials.data.filter(({ archived, settings }) => !archived && settings.kind === 'foam'),
          kerfs: kerfs.data,
        }
      : null;
  return { choices, error };
}
type Choices = NonNullable<ReturnType<typeof useChoices>['choices']>;

/** Makes a cut sheet with version 1 and goes to its plan. */
export default function NewSheetDialog({ onClose }: { onClose: () => void }) {
  const { choices, error } = useChoices();
  return (
    <Dialog title="New cut sheet" onClose={onClose}>
      {error !== null && <Notice tone="error">{sentenceOf(error)}</Notice>}
      {choices === null && error === null && (
        <p className="text-graphite">Looking up sections and machines…</p>
      )}
      {choices?.sections.length === 0 && (
        <p>
          No section is released yet. <Link to="/sections">Release one</Link> first: a cut sheet is planned
          from released sections.
        </p>
      )}
      {choices !== null && choices.sections.length > 0 && <NewSheet choices={choices} onClose={onClose} />}
    </Dialog>
  );
}

function NewSheet({ choices, onClose }: { readonly choices: Choices; readonly onClose: () => void }) {
  const { form, submit } = useNewSheet(choices);
  const { errors, isSubmitting } = form.formState;
  const sections = choices.sections.map(({ id, name, number }) => ({
    value: id,
    label: `${name} v${String(number)}`,
  }));
  const named = (items: readonly { readonly id: string; readonly name: string }[]) =>
    items.map(({ id, name }) => ({ value: id, label: name }));
  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <TextField
        label="Purpose (optional)"
        autoComplete="off"
        error={errors.purpose?.message}
        {...form.register('purpose')}
      />
      <div className="grid gap-4 sm:grid-cols-2">
        <SelectField
          label="Section at the root"
          options={sections}
          error={errors.rootSection?.message}
          {...form.register('rootSection')}
        />
        <SelectField
          label="Section at the tip"
          options={[{ value: '', label: 'As at the root' }, ...sections]}
          {...form.register('tipSection')}
        />
        <SelectField
          label="Machine"
          options={[{ value: '', label: 'None: by hand' }, ...named(choices.machines)]}
          {...form.register('machine')}
        />
        <SelectField label="Foam" options={named(choices.materials)} {...form.register('material')} />
      </div>
      {errors.root?.message !== undefined && <Notice tone="error">{errors.root.message}</Notice>}
      <div className="flex flex-wrap justify-end gap-2">
        <Button onClick={onClose}>Cancel</Button>
        <Button variant="primary" type="submit" busy={isSubmitting}>
          {isSubmitting ? 'Making…' : 'Make the cut sheet'}
        </Button>
      </div>
    </form>
  );
}

function useNewSheet(choices: Choices) {
  const navigate = useNavigate();
  const create = useCreateCutSheet();
  // One key for what this dialog makes: pressing again after a lost answer does not make a second sheet.
  const intended = useRef<{ key: string; as: string } | null>(null);
  const form = useForm<NewSheetForm>({
    resolver: zodResolver(formSchema),
    defaultValues: {
      name: '',
      purpose: '',
      rootSection: choices.sections[0]?.id ?? '',
      tipSection: '',
      machine: choices.machines[0]?.id ?? '',
      material: choices.materials[0]?.id ?? '',
    },
  });
  const make = async (typed: NewSheetForm) => {
    const sheet = { name: typed.name, purpose: typed.purpose, plan: planOf(typed, choices) };
    const as = JSON.stringify(sheet);
    if (intended.current?.as !== as) intended.current = { key: v4(), as };
    try {
      const made = await create.mutateAsync({ ...sheet, key: intended.current.key });
      await navigate(sheetPath(made.id));
    } catch (error) {
      const fields = fieldErrors(error);
      for (const field of ['name', 'purpose'] as const) {
        const message = fields.get(field);
        if (message !== undefined) form.setError(field, { message });
      }
      form.setError('root', {
        message: `The cut sheet was not made; what you typed is kept. ${sentenceOf(error)}`,
      });
    }
  };
  return { form, submit: (event: FormEvent) => void form.handleSubmit(make)(event) };
}

function planOf(typed: NewSheetForm, { sections, machines, materials, kerfs }: Choices) {
  const end = (id: string) => {
    const section = sections.find((one) => one.id === id);
    return { sectionId: id, versionNumber: section?.number ?? 1 };
  };
  const kerf = kerfs.find((one) => one.machineId === typed.machine && one.materialId === typed.material);
  return beginningPlan({
    root: end(typed.rootSection),
    tip: end(typed.tipSection === '' ? typed.rootSection : typed.tipSection),
    machine: machines.find(({ id }) => id === typed.machine) ?? null,
    material: materials.find(({ id }) => id === typed.material) ?? null,
    kerfMm: kerf?.kerfMm ?? null,
  });
}
