import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { noteSchema } from '#server/contracts/common.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextAreaField } from '#client/ui/text-field.tsx';
import { differencesOf, type Names } from './plan-differences.ts';
import { type PlanValues } from './plan-values.ts';
import { type useSheetSave } from './use-sheet-save.ts';

const formSchema = z.object({ note: noteSchema });

interface SaveDialogsProps {
  readonly saving: ReturnType<typeof useSheetSave>;
  readonly values: PlanValues;
  readonly basedOn: number;
  readonly nextNumber: number;
  /** What the ids in the values stand for. */
  readonly names: Names;
  /** How the findings stand: "0 errors, 1 caution, 2 notes". */
  readonly findings: string;
}

/** The dialogs of saving: the note, and a save that met another one. */
export function SaveDialogs(props: SaveDialogsProps) {
  const { saving, values, basedOn, names } = props;
  const { save } = saving;
  if (save.step === 'asking') return <SaveDialog {...props} refusal={save.refusal} />;
  if (save.step === 'conflict')
    return <ConflictDialog latest={save.latest} {...{ values, basedOn, saving, names }} />;
  return null;
}

function SaveDialog({
  saving,
  basedOn,
  nextNumber,
  findings,
  refusal,
}: SaveDialogsProps & { refusal: string | null }) {
  const { note, busy } = saving;
  const form = useForm({ defaultValues: { note }, resolver: zodResolver(formSchema) });
  const submit = form.handleSubmit((fields) => saving.run(fields.note));
  const close = () => saving.close(form.getValues('note'));
  return (
    <Dialog
      title={`Save as version ${nextNumber}`}
      width="narrow"
      onClose={close}
      actions={
        <>
          <Button onClick={close}>Not yet</Button>
          <Button variant="primary" busy={busy} type="submit" form="save-sheet-version">
            {busy ? 'Saving…' : `Save version ${nextNumber}`}
          </Button>
        </>
      }
    >
      <form id="save-sheet-version" onSubmit={(event) => void submit(event)} className="flex flex-col gap-3">
        <p className="text-graphite">{`Based on version ${basedOn}; ${findings}.`}</p>
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
          A version does not change any more, and pins its section versions, machine and foam as they are now.
        </p>
        {refusal !== null && (
          <Notice tone="error">{`Not saved: ${refusal} Your plan is kept; try again.`}</Notice>
        )}
      </form>
    </Dialog>
  );
}

interface ConflictDialogProps {
  /** The version that came in between. */
  readonly latest: SheetVersion;
  readonly values: PlanValues;
  readonly basedOn: number;
  readonly saving: SaveDialogsProps['saving'];
  readonly names: Names;
}

/** Somebody saved in between. Nothing is lost: what differs is shown, and the person decides. */
function ConflictDialog({ latest, values, basedOn, saving, names }: ConflictDialogProps) {
  const known = new Map([...names, ...namesOf(latest)]);
  const differences = differencesOf(latest.plan, values, known);
  return (
    <Dialog
      title={`Version ${latest.number} came in between`}
      width="wide"
      onClose={() => saving.close(saving.note)}
      actions={
        <>
          <Button onClick={() => saving.close(saving.note)}>Keep as draft</Button>
          <Button variant="primary" busy={saving.busy} onClick={() => saving.saveOnTop(latest)}>
            {`Save on top of version ${latest.number}`}
          </Button>
        </>
      }
    >
      <p className="mb-3">
        {`${latest.author.name} saved version ${latest.number} (`}
        <Moment at={latest.createdAt} />
        {`) while your plan stood on version ${basedOn}. Nothing is lost: look at what differs, then decide.`}
      </p>
      <div className="max-h-[50dvh] overflow-auto" tabIndex={0} role="region" aria-label="What differs">
        <table className="w-full text-xs">
          <thead className="text-left text-graphite">
            <tr>
              <th className="py-1 pr-3 font-normal">Value</th>
              <th className="py-1 pr-3 text-right font-normal">{`Version ${latest.number}`}</th>
              <th className="py-1 text-right font-normal">Your plan</th>
            </tr>
          </thead>
          <tbody>
            {differences.map(({ place, theirs, yours }) => (
              <tr key={place} className="border-t border-hair">
                <td className="py-1 pr-3">{place}</td>
                <td className="py-1 pr-3 text-right">{theirs}</td>
                <td className="py-1 text-right font-semibold">{yours}</td>
              </tr>
            ))}
          </tbody>
        </table>
        {differences.length === 0 && <p>Both plans say the same.</p>}
      </div>
    </Dialog>
  );
}

function namesOf({
  root,
  tip,
  machine,
  material,
  ribMachine,
  ribMaterial,
}: SheetVersion): [string, string][] {
  return [
    ...[root, tip].map(({ sectionId, sectionName }): [string, string] => [sectionId, sectionName]),
    ...[machine, material, ribMachine, ribMaterial].flatMap((of): [string, string][] =>
      of ? [[of.id, of.name]] : [],
    ),
  ];
}
