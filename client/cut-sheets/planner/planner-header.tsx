import { Link } from 'react-router';
import { type KeeperState } from '#client/sections/editor/draft-keeper.ts';
import { DraftState } from '#client/sections/editor/draft-state.tsx';
import { Button, buttonClass } from '#client/ui/button.tsx';
import { sheetVersionPath } from '../paths.ts';

interface PlannerHeaderProps {
  readonly sheetId: string;
  readonly name: string;
  readonly basedOn: number;
  readonly dirty: boolean;
  readonly nextNumber: number;
  readonly keeper: KeeperState;
  readonly mayWrite: boolean;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  readonly onUndo: () => void;
  readonly onRedo: () => void;
  readonly onSave: () => void;
}

/** Which sheet it is, how it stands with its draft, and what can be done with it. */
export function PlannerHeader(props: PlannerHeaderProps) {
  const { sheetId, name, basedOn, dirty, nextNumber, keeper, mayWrite } = props;
  return (
    <header className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
      <div className="min-w-0 flex-1 basis-72 xl:flex xl:items-baseline xl:gap-4">
        <h1 className="truncate text-xl font-extrabold" title={name}>
          {name}
        </h1>
        <DraftState dirty={dirty} basedOn={basedOn} keeper={keeper} />
      </div>
      <div className="flex flex-wrap gap-2 max-sm:w-full max-sm:gap-1.5 max-sm:*:px-2 max-sm:*:text-xs max-sm:[&>:last-child]:grow">
        {mayWrite && (
          <>
            <Button disabled={!props.canUndo} onClick={props.onUndo} title="Undo (Ctrl Z)">
              Undo
            </Button>
            <Button disabled={!props.canRedo} onClick={props.onRedo} title="Redo (Ctrl Shift Z)">
              Redo
            </Button>
          </>
        )}
        <Link to={sheetVersionPath(sheetId, basedOn)} className={buttonClass()}>
          {`Version ${basedOn}: files, release…`}
        </Link>
        {mayWrite && (
          <Button variant="primary" disabled={!dirty} onClick={props.onSave} title="Save (Ctrl S)">
            {`Save as version ${nextNumber}`}
          </Button>
        )}
      </div>
    </header>
  );
}
