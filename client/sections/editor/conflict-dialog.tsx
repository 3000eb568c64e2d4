import { type Shape } from '#geometry/shapes/shape.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Moment } from '#client/ui/moment.tsx';

interface ConflictDialogProps {
  /** The version that came in between. */
  readonly latest: SectionVersion;
  readonly basedOn: number;
  readonly shape: Shape;
  readonly description: string;
  readonly note: string;
  readonly busy: boolean;
  readonly onSaveOnTop: () => void;
  readonly onKeep: () => void;
}

/** Somebody saved in between. Nothing is lost: both are shown, and the person decides. */
export function ConflictDialog(props: ConflictDialogProps) {
  const { latest, basedOn, shape, description, note, busy, onSaveOnTop, onKeep } = props;
  return (
    <Dialog
      title={`Version ${latest.number} came in between`}
      onClose={onKeep}
      actions={
        <>
          <Button onClick={onKeep}>Keep as draft</Button>
          <Button variant="primary" busy={busy} onClick={onSaveOnTop}>
            {`Save on top of version ${latest.number}`}
          </Button>
        </>
      }
    >
      <p className="mb-4">
        {`${latest.author.name} saved version ${latest.number} (`}
        <Moment at={latest.createdAt} />
        {`) while your work stood on version ${basedOn}. Nothing is lost: look at both, then decide.`}
      </p>
      <div className="grid gap-4 sm:grid-cols-2">
        <Side
          title={`Version ${latest.number}, ${latest.author.name}`}
          shape={latest.shape}
          description={latest.description}
          note={latest.note}
        />
        <Side title="Your work, not saved" shape={shape} description={description} note={note} />
      </div>
      <p className="mt-4 text-xs text-graphite">
        {`Saved on top, your work becomes version ${latest.number + 1} and version ${latest.number} stays as it is. Kept as a draft, it stays on the sheet for you.`}
      </p>
    </Dialog>
  );
}

function Side({
  title,
  shape,
  description,
  note,
}: {
  title: string;
  shape: Shape;
  description: string;
  note: string;
}) {
  return (
    <section className="min-w-0 border border-rule bg-sheet p-3">
      <h3 className="mb-2 font-semibold">{title}</h3>
      <Thumbnail shape={shape} width={220} height={60} className="h-auto max-w-full" />
      <p className="mt-2 text-graphite">{description}</p>
      <p className="min-h-5 text-xs break-words">{note === '' ? 'No note.' : note}</p>
    </section>
  );
}
