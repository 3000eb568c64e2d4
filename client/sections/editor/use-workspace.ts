import { useCallback, useMemo, useState } from 'react';
import { type Section, type SectionVersion } from '#server/contracts/sections.ts';
import { type DraftMirror } from './draft-mirror.ts';
import { type EditorAction } from './editor-state.ts';
import { type Present, sameShape } from './present.ts';
import { useDraftKeeper } from './use-draft-keeper.ts';
import { useSave } from './use-save.ts';
import { useSettings } from './use-settings.ts';
import { useGhost, useKeeping, useStandingVersion, useTitle } from './use-standing.ts';

export interface WorkspaceStart {
  readonly section: Section;
  /** The version that the work starts from. */
  readonly base: SectionVersion;
  readonly start: Present;
  /** Where the work on the sheet came from: only a copy in this browser is news to the server. */
  readonly from: 'server' | 'browser' | 'none';
  readonly mirror: DraftMirror;
}

/** The state of the editor as the last finished step left it: a drag changes none of this. */
export interface SettledState {
  readonly settled: Present;
  readonly basedOn: number;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  readonly dispatch: (action: EditorAction) => void;
}

/** What stands around the sheet: the draft on the server, the version that the work stands on, and saving. */
export function useWorkspace({
  section,
  base,
  start,
  from,
  mirror,
  settled,
  basedOn,
  dispatch,
}: WorkspaceStart & SettledState) {
  const [settings, setSettings] = useSettings();
  const [keeper, keeping] = useDraftKeeper(section.id, mirror);
  const saving = useSave({ sectionId: section.id, shape: settled.shape, basedOn, dispatch, keeper });
  const version = useStandingVersion(section.id, basedOn, base);
  const ghost = useGhost(section.id, settings.ghost);
  const dirty = useMemo(() => !sameShape(settled.shape, version.shape), [settled.shape, version.shape]);
  useKeeping(
    keeper,
    settled,
    basedOn,
    dirty,
    from === 'browser' ? null : { present: start, basedOn: base.number },
  );
  const title = useTitle(section, settled.shape, version, dirty);
  const nextNumber = Math.max(section.versionCount, version.number, section.latest.number) + 1;
  return { settings, setSettings, keeping, saving, version, ghost, dirty, title, nextNumber };
}

/** What the buttons of the header do. */
export function useWorkspaceActions(
  dispatch: SettledState['dispatch'],
  { saving, dirty }: ReturnType<typeof useWorkspace>,
) {
  const [exporting, setExporting] = useState(false);
  const { ask } = saving;
  return {
    exporting,
    save: useCallback(() => {
      if (dirty) ask();
    }, [dirty, ask]),
    undo: useCallback(() => {
      dispatch({ type: 'undo' });
    }, [dispatch]),
    redo: useCallback(() => {
      dispatch({ type: 'redo' });
    }, [dispatch]),
    openExport: useCallback(() => {
      setExporting(true);
    }, []),
    closeExport: useCallback(() => {
      setExporting(false);
    }, []),
  };
}
