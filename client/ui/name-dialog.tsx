import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { purposeSchema } from '#server/contracts/common.ts';
import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';
import { sentenceOf } from './error-state.tsx';
import { Notice } from './notice.tsx';
import { TextField } from './text-field.tsx';

interface Named {
  readonly name: string;
  readonly purpose: string;
}

interface NameDialogProps {
  readonly named: Named;
  /** What a name of this thing must be. */
  readonly nameSchema: z.ZodType<string, string>;
  readonly change: {
    readonly error: unknown;
    readonly isPending: boolean;
    readonly mutate: (typed: Named, then: { readonly onSuccess: () => void }) => void;
  };
  readonly onClose: () => void;
}

/** Name and purpose of a section or a cut sheet. */
export default function NameDialog({ named, nameSchema, change, onClose }: NameDialogProps) {
  const form = useForm({
    resolver: zodResolver(z.object({ name: nameSchema, purpose: purposeSchema })),
    defaultValues: { name: named.name, purpose: named.purpose },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((typed) => {
    change.mutate(typed, { onSuccess: onClose });
  });
  return (
    <Dialog
      title="Name and purpose"
      width="narrow"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form="name-form" busy={change.isPending}>
            Save
          </Button>
        </>
      }
    >
      <form
        id="name-form"
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
        {change.error !== null && <Notice tone="error">{sentenceOf(change.error)}</Notice>}
      </form>
    </Dialog>
  );
}
