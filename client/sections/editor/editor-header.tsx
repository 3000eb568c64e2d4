import { memo, type ReactNode } from 'react';
import { Button } from '#client/ui/button.tsx';
import { type KeeperState } from './draft-keeper.ts';
import { DraftState } from './draft-state.tsx';
import { SectionName } from './section-name.tsx';

interface EditorHeaderProps {
  readonly sectionId: string;
  readonly name: string;
  readonly description: string;
  readonly dirty: boolean;
  readonly basedOn: number;
  /** Number that the next version gets, as far as is known. */
  readonly nextNumber: number;
  readonly keeper: KeeperState;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  readonly onUndo: () => void;
  readonly onRedo: () => void;
  readonly onExport: () => void;
  readonly onSave: () => void;
  readonly children?: ReactNode;
}

/** What is on the sheet, how it stands with its draft, and what can be done with it. */
export const EditorHeader = memo(function EditorHeader(props: EditorHeaderProps) {
  const { sectionId, name, description, dirty, basedOn, nextNumber, keeper, canUndo, canRedo } = props;
  const { onUndo, onRedo, onExport, onSave } = props;
  return (
    <header className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 print:hidden">
      <div className="min-w-0 flex-1 basis-72">
        <SectionName sectionId={sectionId} name={name} />
        {/* One line whatever it says, so that the sheet below keeps its place while values change. */}
        <div className="flex min-w-0 items-baseline gap-x-3 max-sm:flex-col">
          <span className="max-w-full min-w-0 shrink-[999] truncate text-graphite" title={description}>
            {description}
          </span>
          <DraftState dirty={dirty} basedOn={basedOn} keeper={keeper} />
        </div>
      </div>
      <div className="flex flex-wrap gap-2 max-sm:w-full max-sm:gap-1.5 max-sm:*:px-2 max-sm:*:text-xs max-sm:[&>:last-child]:grow">
        <Button disabled={!canUndo} onClick={onUndo} title="Undo (Ctrl Z)">
          Undo
        </Button>
        <Button disabled={!canRedo} onClick={onRedo} title="Redo (Ctrl Shift Z)">
          Redo
        </Button>
        <Button onClick={onExport}>Export…</Button>
        <Button variant="primary" disabled={!dirty} onClick={onSave} title="Save (Ctrl S)">
          {`Save as version ${nextNumber}`}
        </Button>
      </div>
    </header>
  );
});
