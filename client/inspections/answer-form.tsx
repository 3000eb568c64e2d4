import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { inspectionAnswerSchema } from '#server/contracts/cutting-list.ts';
import { useAnswerInspection } from '#client/api/cutting-list.ts';
import { fieldErrors } from '#client/api/request.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextAreaField } from '#client/ui/text-field.tsx';

/** What is to be done with a part out of tolerance; it leaves the desks with this. */
export function AnswerForm({ inspectionId }: { readonly inspectionId: string }) {
  const answer = useAnswerInspection(inspectionId);
  const announce = useAnnounce();
  const form = useForm({
    resolver: zodResolver(inspectionAnswerSchema.pick({ note: true })),
    defaultValues: { note: '' },
  });
  const decide = (decision: 'accepted' | 'rejected') =>
    form.handleSubmit(({ note }) => {
      answer.mutate({ decision, note }, { onSuccess: () => announce(`The part is ${decision}.`) });
    });
  return (
    <form noValidate className="flex max-w-[56rem] flex-col gap-3">
      <TextAreaField
        label="What is to be done with the part"
        required
        rows={2}
        maxLength={500}
        error={form.formState.errors.note?.message ?? fieldErrors(answer.error).get('note')}
        {...form.register('note')}
      />
      {answer.isError && <Notice tone="error">{sentenceOf(answer.error)} What you typed is kept.</Notice>}
      <div className="flex flex-wrap gap-2">
        <Button busy={answer.isPending} onClick={(event) => void decide('accepted')(event)}>
          Accept the part
        </Button>
        <Button variant="danger" busy={answer.isPending} onClick={(event) => void decide('rejected')(event)}>
          Reject the part
        </Button>
      </div>
    </form>
  );
}
