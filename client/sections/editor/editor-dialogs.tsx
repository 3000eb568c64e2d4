import { type SectionVersion } from '#server/contracts/sections.ts';
import { describeShape } from '#geometry/shapes/shape.ts';
import { ConflictDialog } from './conflict-dialog.tsx';
import { ExportDoor } from './export-door.tsx';
import { type Present } from './present.ts';
import { SaveDialog } from './save-dialog.tsx';
import { type useSave } from './use-save.ts';

interface EditorDialogsProps {
  readonly saving: ReturnType<typeof useSave>;
  readonly present: Present;
  /** The version that the work stands on. */
  readonly version: SectionVersion;
  readonly nextNumber: number;
  readonly dirty: boolean;
  readonly exporting: boolean;
  readonly onExportClose: () => void;
}

/** The dialogs of the editor: saving, a save that met another one, and the export. */
export function EditorDialogs(props: EditorDialogsProps) {
  const { saving, present, version, nextNumber, dirty, exporting, onExportClose } = props;
  const { save, note, busy } = saving;
  const common = {
    shape: present.shape,
    description: describeShape(present.shape),
    basedOn: version.number,
    note,
    busy,
  };
  if (save.step === 'asking') {
    return (
      <SaveDialog
        {...common}
        number={nextNumber}
        refusal={save.refusal}
        onSave={saving.run}
        onClose={saving.close}
      />
    );
  }
  if (save.step === 'conflict') {
    return (
      <ConflictDialog
        {...common}
        latest={save.latest}
        onSaveOnTop={() => {
          saving.saveOnTop(save.latest);
        }}
        onKeep={() => {
          saving.close(note);
        }}
      />
    );
  }
  if (!exporting) return null;
  return (
    <ExportDoor
      version={version}
      chordMm={present.chordMm}
      dirty={dirty}
      onSaveFirst={() => {
        onExportClose();
        saving.ask();
      }}
      onClose={onExportClose}
    />
  );
}
