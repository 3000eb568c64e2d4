import { memo, useReducer } from 'react';
import { describeShape } from '#geometry/shapes/shape.ts';
import { useUnits } from '#client/app/units.ts';
import { PrintedSheet } from '#client/drawing/static-sheet.tsx';
import { EditorDialogs } from './editor-dialogs.tsx';
import { EditorFrame } from './editor-frame.tsx';
import { EditorHeader } from './editor-header.tsx';
import { reduceEditor, startState } from './editor-state.ts';
import { ghostOf } from './ghost.ts';
import { LiveState } from './live-state.ts';
import { OpenedNote } from './opened-note.tsx';
import { SectionVersions } from './section-versions.tsx';
import { SheetStage } from './sheet-stage.tsx';
import { SideColumn } from './side-column.tsx';
import {
  type SettledState,
  useWorkspace,
  useWorkspaceActions,
  type WorkspaceStart,
} from './use-workspace.ts';

/** The editor of one section for those who may write. */
export function EditorWorkspace(props: WorkspaceStart) {
  const [state, dispatch] = useReducer(reduceEditor, null, () => startState(props.start, props.base.number));
  return (
    <LiveState value={state}>
      <Workspace
        {...props}
        settled={state.drag ? state.drag.start : state.present}
        basedOn={state.basedOn}
        canUndo={state.past.length > 0}
        canRedo={state.future.length > 0}
        dispatch={dispatch}
      />
    </LiveState>
  );
}

const Workspace = memo(function Workspace(props: WorkspaceStart & SettledState) {
  const { section, from, settled, basedOn, canUndo, canRedo, dispatch } = props;
  const workspace = useWorkspace(props);
  const actions = useWorkspaceActions(dispatch, workspace);
  const { settings, setSettings, dirty, title, ghost } = workspace;
  return (
    <EditorFrame
      title={section.name}
      header={
        <EditorHeader
          {...{ dirty, basedOn, canUndo, canRedo }}
          sectionId={section.id}
          name={section.name}
          description={describeShape(settled.shape)}
          nextNumber={workspace.nextNumber}
          keeper={workspace.keeping}
          onUndo={actions.undo}
          onRedo={actions.redo}
          onExport={actions.openExport}
          onSave={actions.save}
        />
      }
      note={from === 'browser' && <OpenedNote />}
      stage={
        <SheetStage
          {...{ dispatch, settings, title, ghost }}
          onSettings={setSettings}
          enabled
          onSave={actions.save}
        />
      }
      strip={
        <SectionVersions
          {...{ dirty, dispatch, basedOn }}
          sectionId={section.id}
          shape={settled.shape}
          ghost={settings.ghost}
          onSettings={setSettings}
        />
      }
      side={<SideColumn {...{ settings, dispatch }} onSettings={setSettings} enabled />}
      print={
        <PrintedSheet {...settled} title={title} ghost={ghostOf(ghost, settings.ghost)} units={useUnits()} />
      }
    >
      <EditorDialogs
        {...workspace}
        present={settled}
        exporting={actions.exporting}
        onExportClose={actions.closeExport}
      />
    </EditorFrame>
  );
});
