import { zodResolver } from '@hookform/resolvers/zod';
import { type FormEvent, useMemo, useRef } from 'react';
import { type UseFormReturn, useForm, useWatch } from 'react-hook-form';
import { useNavigate } from 'react-router';
import { v4 } from 'uuid';
import { fieldErrors } from '#client/api/request.ts';
import { useCreateSection } from '#client/api/sections.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { NEW_SECTION, type NewSectionForm, newSectionFormSchema, startingShape } from './new-section-form.ts';
import { ShapePreview } from './shape-preview.tsx';
import { StartFields } from './start-fields.tsx';

/** Makes a section with version 1 and goes to its sheet. */
export default function NewSectionDialog({ onClose }: { onClose: () => void }) {
  const form = useForm<NewSectionForm>({
    resolver: zodResolver(newSectionFormSchema),
    defaultValues: NEW_SECTION,
  });
  const { submit, busy } = useMakeSection(form);
  const { errors } = form.formState;
  return (
    <Dialog
      title="New section"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form="new-section" busy={busy}>
            {busy ? 'Making…' : 'Make the section'}
          </Button>
        </>
      }
    >
      <form id="new-section" noValidate onSubmit={submit} className="flex flex-col gap-4">
        <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
        <TextField
          label="Purpose (optional)"
          autoComplete="off"
          error={errors.purpose?.message}
          {...form.register('purpose')}
        />
        <StartFields form={form} />
        <Preview form={form} />
        {errors.root?.message !== undefined && <Notice tone="error">{errors.root.message}</Notice>}
      </form>
    </Dialog>
  );
}

function Preview({ form }: { form: UseFormReturn<NewSectionForm> }) {
  const [start, designation, maxCamber, maxCamberPosition, maxThickness, trailingEdge, order] = useWatch({
    control: form.control,
    name: ['start', 'designation', 'maxCamber', 'maxCamberPosition', 'maxThickness', 'trailingEdge', 'order'],
  });
  const starting = useMemo(
    () =>
      startingShape({ start, designation, maxCamber, maxCamberPosition, maxThickness, trailingEdge, order }),
    [start, designation, maxCamber, maxCamberPosition, maxThickness, trailingEdge, order],
  );
  return <ShapePreview starting={starting} />;
}

function useMakeSection(form: UseFormReturn<NewSectionForm>) {
  const navigate = useNavigate();
  const create = useCreateSection();
  // One key for what this dialog makes: pressing again after a lost answer does not make a second section.
  const intended = useRef<{ key: string; as: string } | null>(null);

  const make = async (typed: NewSectionForm) => {
    const starting = startingShape(typed);
    if (starting.shape === null) {
      form.setError(starting.field, { message: starting.message }, { shouldFocus: true });
      return;
    }
    const section = { name: typed.name, purpose: typed.purpose, shape: starting.shape };
    const as = JSON.stringify(section);
    if (intended.current?.as !== as) intended.current = { key: v4(), as };
    try {
      const made = await create.mutateAsync({ ...section, key: intended.current.key });
      await navigate(`/sections/${made.id}`);
    } catch (error) {
      const fields = fieldErrors(error);
      for (const field of ['name', 'purpose'] as const) {
        const message = fields.get(field);
        if (message !== undefined) form.setError(field, { message });
      }
      form.setError('root', {
        message: `The section was not made; what you typed is kept. ${sentenceOf(error)}`,
      });
    }
  };
  return {
    submit: (event: FormEvent) => void form.handleSubmit(make)(event),
    busy: form.formState.isSubmitting,
  };
}
