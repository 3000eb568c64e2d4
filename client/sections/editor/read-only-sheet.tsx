import { useReducer, useState } from 'react';
import { type Section, type SectionVersion } from '#server/contracts/sections.ts';
import { useMay } from '#client/app/session.tsx';
import { useUnits } from '#client/app/units.ts';
import { PrintedSheet } from '#client/drawing/static-sheet.tsx';
import { Button } from '#client/ui/button.tsx';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { ExportPanel } from '#client/versions/export-panel.tsx';
import { EditorFrame } from './editor-frame.tsx';
import { ghostOf } from './ghost.ts';
import { type EditorAction, reduceEditor, startState } from './editor-state.ts';
import { LiveState } from './live-state.ts';
import { FIRST_CHORD_MM } from './present.ts';
import { SectionVersions } from './section-versions.tsx';
import { SheetStage } from './sheet-stage.tsx';
import { SideColumn } from './side-column.tsx';
import { useSettings } from './use-settings.ts';
import { useGhost, useTitle } from './use-standing.ts';

/** The sheet of the newest version that a reader may see: to look at, measure and export. */
export function ReadOnlySheet({ section, version }: { section: Section; version: SectionVersion }) {
  const [state, dispatch] = useReducer(onlyChord, null, () =>
    startState({ shape: version.shape, chordMm: FIRST_CHORD_MM, equalNose: false }, version.number),
  );
  const [settings, setSettings] = useSettings();
  const [exporting, setExporting] = useState(false);
  const ghost = useGhost(section.id, settings.ghost);
  const title = useTitle(section, version.shape, version, false);
  const mayDownload = useMay('files.download');
  const units = useUnits();
  const { present } = state;
  return (
    <LiveState value={state}>
      <EditorFrame
        title={section.name}
        header={
          <ReaderHeader
            name={section.name}
            version={version}
            onExport={mayDownload ? () => setExporting(true) : undefined}
          />
        }
        stage={
          <SheetStage {...{ dispatch, settings, title, ghost }} onSettings={setSettings} enabled={false} />
        }
        strip={
          <SectionVersions
            sectionId={section.id}
            shape={version.shape}
            dirty={false}
            basedOn={version.number}
            ghost={settings.ghost}
            onSettings={setSettings}
            dispatch={dispatch}
          />
        }
        side={<SideColumn settings={settings} onSettings={setSettings} enabled={false} dispatch={dispatch} />}
        print={
          <PrintedSheet {...present} title={title} ghost={ghostOf(ghost, settings.ghost)} units={units} />
        }
      >
        {exporting && (
          <ExportPanel version={version} chordMm={present.chordMm} onClose={() => setExporting(false)} />
        )}
      </EditorFrame>
    </LiveState>
  );
}

interface ReaderHeaderProps {
  readonly name: string;
  readonly version: SectionVersion;
  readonly onExport: (() => void) | undefined;
}

function ReaderHeader({ name, version, onExport }: ReaderHeaderProps) {
  const size = useMay('sections.read') ? 'normal' : 'large';
  return (
    <header className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
      <div className="flex min-w-0 flex-1 basis-72 flex-wrap items-baseline gap-x-3">
        <h1 className="min-w-0 text-xl font-extrabold break-words">{name}</h1>
        <span className="text-graphite">{version.description}</span>
        <span>{`version ${version.number}`}</span>
        <StatusMark status={version.status} />
      </div>
      {onExport && (
        <Button variant="primary" size={size} onClick={onExport}>
          Export…
        </Button>
      )}
    </header>
  );
}

/** A reader sets the chord that the sheet is drawn at, and nothing else. */
function onlyChord(
  state: ReturnType<typeof startState>,
  action: EditorAction,
): ReturnType<typeof startState> {
  return action.type === 'set' && action.field === 'chordMm' ? reduceEditor(state, action) : state;
}
