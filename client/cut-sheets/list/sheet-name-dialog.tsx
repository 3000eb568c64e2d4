import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { itemNameSchema, purposeSchema } from '#server/contracts/common.ts';
import { type CutSheet } from '#server/contracts/cut-sheets.ts';
import { useChangeCutSheet } from '#client/api/cut-sheets.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextField } from '#client/ui/text-field.tsx';

const nameFormSchema = z.object({ name: itemNameSchema, purpose: purposeSchema });

export default function SheetNameDialog({ sheet, onClose }: { sheet: CutSheet; onClose: () => void }) {
  const change = useChangeCutSheet(sheet.id);
  const form = useForm({
    resolver: zodResolver(nameFormSchema),
    defaultValues: { name: sheet.name, purpose: sheet.purpose },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((typed) => change.mutate(typed, { onSuccess: onClose }));
  return (
    <Dialog
      title="Name and purpose"
      width="narrow"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form="sheet-name" busy={change.isPending}>
            Save
          </Button>
        </>
      }
    >
      <form
        id="sheet-name"
        noValidate
        onSubmit={(event) => void submit(event)}
        className="flex flex-col gap-4"
      >
        <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
        <TextField
          label="Purpose"
          autoComplete="off"
          error={errors.purpose?.message}
          {...form.register('purpose')}
        />
        {change.isError && <Notice tone="error">{sentenceOf(change.error)}</Notice>}
      </form>
    </Dialog>
  );
}
