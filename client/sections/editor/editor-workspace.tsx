import { describeShape } from '#geometry/shapes/shape.ts';
import { useUnits } from '#client/app/units.ts';
import { PrintedSheet } from '#client/drawing/static-sheet.tsx';
import { EditorDialogs } from './editor-dialogs.tsx';
import { EditorFrame } from './editor-frame.tsx';
import { EditorHeader } from './editor-header.tsx';
import { ghostOf } from './ghost.ts';
import { OpenedNote } from './opened-note.tsx';
import { SectionVersions } from './section-versions.tsx';
import { SheetStage } from './sheet-stage.tsx';
import { SideColumn } from './side-column.tsx';
import { useWorkspace, useWorkspaceActions, type WorkspaceStart } from './use-workspace.ts';

/** The editor of one section for those who may write. */
export function EditorWorkspace(props: WorkspaceStart) {
  const { section, from } = props;
  const workspace = useWorkspace(props);
  const actions = useWorkspaceActions(workspace);
  const { state, dispatch, settings, setSettings, settled, dirty, title, ghost } = workspace;
  return (
    <EditorFrame
      title={section.name}
      header={<Header section={section} workspace={workspace} actions={actions} />}
      note={from === 'browser' && <OpenedNote />}
      stage={
        <SheetStage
          {...{ state, dispatch, settings, title, ghost }}
          onSettings={setSettings}
          enabled
          onSave={actions.save}
        />
      }
      strip={
        <SectionVersions
          {...{ dirty, dispatch }}
          sectionId={section.id}
          shape={settled.shape}
          basedOn={state.basedOn}
          ghost={settings.ghost}
          onSettings={setSettings}
        />
      }
      side={
        <SideColumn
          present={state.present}
          notice={state.notice}
          station={settings.station}
          enabled
          dispatch={dispatch}
        />
      }
      print={<Print workspace={workspace} />}
    >
      <EditorDialogs
        {...workspace}
        present={settled}
        exporting={actions.exporting}
        onExportClose={actions.closeExport}
      />
    </EditorFrame>
  );
}

interface HeaderProps {
  readonly section: WorkspaceStart['section'];
  readonly workspace: ReturnType<typeof useWorkspace>;
  readonly actions: ReturnType<typeof useWorkspaceActions>;
}

function Header({ section, workspace, actions }: HeaderProps) {
  const { state, settled, dirty, nextNumber, keeping } = workspace;
  return (
    <EditorHeader
      sectionId={section.id}
      name={section.name}
      description={describeShape(settled.shape)}
      dirty={dirty}
      basedOn={state.basedOn}
      nextNumber={nextNumber}
      keeper={keeping}
      canUndo={state.past.length > 0}
      canRedo={state.future.length > 0}
      onUndo={actions.undo}
      onRedo={actions.redo}
      onExport={actions.openExport}
      onSave={actions.save}
    />
  );
}

function Print({ workspace }: { workspace: ReturnType<typeof useWorkspace> }) {
  const { settled, title, ghost, settings } = workspace;
  const units = useUnits();
  return <PrintedSheet {...settled} title={title} ghost={ghostOf(ghost, settings.ghost)} units={units} />;
}
