import { useState } from 'react';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { ExportPanel } from '#client/versions/export-panel.tsx';

interface ExportDoorProps {
  readonly version: SectionVersion;
  readonly chordMm: number;
  /** There are changes on the sheet that no version has. */
  readonly dirty: boolean;
  readonly onSaveFirst: () => void;
  readonly onClose: () => void;
}

/** Files are made of saved versions only: with unsaved changes on the sheet, says so before the export opens. */
export function ExportDoor({ version, chordMm, dirty, onSaveFirst, onClose }: ExportDoorProps) {
  const [asked, setAsked] = useState(dirty);
  if (!asked) return <ExportPanel version={version} chordMm={chordMm} onClose={onClose} />;
  return (
    <Dialog
      title={`Export version ${version.number}`}
      width="narrow"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onSaveFirst}>Save first…</Button>
          <Button
            variant="primary"
            onClick={() => {
              setAsked(false);
            }}
          >
            {`Export version ${version.number}`}
          </Button>
        </>
      }
    >
      <p>
        {`Files are made of saved versions. What is exported is version ${version.number} as it was saved; the changes on your sheet are not in it.`}
      </p>
    </Dialog>
  );
}
