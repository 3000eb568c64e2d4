import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { noteSchema } from '#server/contracts/common.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextAreaField } from '#client/ui/text-field.tsx';

const formSchema = z.object({ note: noteSchema });

interface SaveDialogProps {
  readonly number: number;
  readonly basedOn: number;
  readonly shape: Shape;
  readonly description: string;
  /** The note as typed before, kept when a save did not go through. */
  readonly note: string;
  readonly busy: boolean;
  /** Why the last try did not go through; everything typed is kept. */
  readonly refusal: string | null;
  readonly onSave: (note: string) => void;
  readonly onClose: (note: string) => void;
}

/** Asks for a note and saves what is on the sheet as the next version. */
export function SaveDialog(props: SaveDialogProps) {
  const { number, basedOn, shape, description, note, busy, refusal, onSave, onClose } = props;
  const form = useForm({ defaultValues: { note }, resolver: zodResolver(formSchema) });
  const submit = form.handleSubmit((fields) => {
    onSave(fields.note);
  });
  return (
    <Dialog
      title={`Save as version ${number}`}
      width="narrow"
      onClose={() => {
        onClose(form.getValues('note'));
      }}
      actions={
        <>
          <Button
            onClick={() => {
              onClose(form.getValues('note'));
            }}
          >
            Not yet
          </Button>
          <Button variant="primary" busy={busy} type="submit" form="save-version">
            {busy ? 'Saving…' : `Save version ${number}`}
          </Button>
        </>
      }
    >
      <form
        id="save-version"
        onSubmit={(event) => {
          void submit(event);
        }}
        className="flex flex-col gap-3"
      >
        <div className="flex items-center gap-4">
          <Thumbnail shape={shape} width={150} height={44} className="shrink-0" />
          <p className="min-w-0 text-graphite">{`${description}, based on version ${basedOn}`}</p>
        </div>
        <TextAreaField
          label="What changed, and why (may stay empty)"
          error={form.formState.errors.note?.message}
          autoFocus
          onKeyDown={(event) => {
            if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) void submit(event);
          }}
          {...form.register('note')}
        />
        <p className="text-xs text-graphite">
          A version does not change any more. It can be opened, laid over and restored at any time.
        </p>
        {refusal !== null && (
          <Notice tone="error">{`Not saved: ${refusal} Your work is kept; try again.`}</Notice>
        )}
      </form>
    </Dialog>
  );
}
