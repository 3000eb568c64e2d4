import { useCallback, useMemo, useReducer, useState } from 'react';
import { type Section, type SectionVersion } from '#server/contracts/sections.ts';
import { type DraftMirror } from './draft-mirror.ts';
import { reduceEditor, startState } from './editor-state.ts';
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

/** What the editor of one section holds: the state that undo knows, its draft on the server, and saving it. */
export function useWorkspace({ section, base, start, from, mirror }: WorkspaceStart) {
  const [state, dispatch] = useReducer(reduceEditor, null, () => startState(start, base.number));
  const { present, drag, basedOn } = state;
  const [settings, setSettings] = useSettings();
  const [keeper, keeping] = useDraftKeeper(section.id, mirror);
  const saving = useSave({ sectionId: section.id, state, dispatch, keeper });
  const version = useStandingVersion(section.id, basedOn, base);
  const ghost = useGhost(section.id, settings.ghost);

  // During a drag, everything but the sheet and the list shows the section as it was when the drag began.
  const settled = drag ? drag.start : present;
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
  return {
    state,
    dispatch,
    settings,
    setSettings,
    keeping,
    saving,
    version,
    ghost,
    settled,
    dirty,
    title,
    nextNumber,
  };
}

/** The buttons of the header as steady functions, so that it is left alone while a handle is dragged. */
export function useWorkspaceActions({ dispatch, saving, dirty }: ReturnType<typeof useWorkspace>) {
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
