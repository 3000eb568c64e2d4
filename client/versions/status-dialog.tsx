import { zodResolver } from '@hookform/resolvers/zod';
import { type ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { releaseSchema, withdrawSchema } from '#server/contracts/sections.ts';
import { fieldErrors } from '#client/api/request.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextAreaField } from '#client/ui/text-field.tsx';

const STEPS = {
  release: {
    schema: releaseSchema,
    verb: 'Release',
    done: 'is released.',
    label: 'Why it is good to cut (optional)',
    variant: 'primary',
  },
  withdraw: {
    schema: withdrawSchema,
    verb: 'Withdraw',
    done: 'is withdrawn.',
    label: 'Why it is withdrawn',
    variant: 'danger',
  },
} as const;

interface StatusAction {
  readonly error: unknown;
  readonly isPending: boolean;
  readonly mutate: (
    step: { readonly number: number; readonly reason: string },
    then: { readonly onSuccess: () => void },
  ) => void;
}

interface StatusDialogProps {
  readonly step: keyof typeof STEPS;
  readonly number: number;
  /** What the step means for what is cut. */
  readonly children: ReactNode;
  readonly action: StatusAction;
  readonly onClose: () => void;
}

/** Releases or withdraws a version; the reason is what the people at the machines will read. */
export function StatusDialog({ step, number, children, action, onClose }: StatusDialogProps) {
  const { schema, verb, done, label, variant } = STEPS[step];
  const announce = useAnnounce();
  const form = useForm({ resolver: zodResolver(schema), defaultValues: { reason: '' } });
  const { error, isPending, mutate } = action;
  const submit = form.handleSubmit(({ reason = '' }) => {
    const onSuccess = () => {
      announce(`Version ${String(number)} ${done}`);
      onClose();
    };
    mutate({ number, reason }, { onSuccess });
  });
  return (
    <Dialog title={`${verb} version ${String(number)}`} onClose={onClose}>
      <form noValidate className="flex flex-col gap-4" onSubmit={(event) => void submit(event)}>
        <div>{children}</div>
        <TextAreaField
          label={label}
          required={step === 'withdraw'}
          maxLength={500}
          error={form.formState.errors.reason?.message ?? fieldErrors(error).get('reason')}
          {...form.register('reason')}
        />
        {error !== null && <Refused error={error} />}
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" variant={variant} busy={isPending}>
            {verb} version {number}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

/** What the server said, field by field where it named any. */
function Refused({ error }: { readonly error: unknown }) {
  const fields = [...fieldErrors(error)].filter(([path]) => path !== 'reason');
  return (
    <Notice tone="error">
      {sentenceOf(error)} Nothing was changed; what you typed is kept.
      {fields.length > 0 && (
        <ul className="mt-1 list-disc pl-5">
          {fields.map(([path, message]) => (
            <li key={path}>{message}</li>
          ))}
        </ul>
      )}
    </Notice>
  );
}
