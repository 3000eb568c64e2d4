import { useRef, useState } from 'react';
import { type CutSheet, type SheetDraft, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { useMe } from '#client/app/session.tsx';
import { useUnits } from '#client/app/units.ts';
import { ErrorState } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PrintedPlan } from '../views/static-plan.tsx';
import { Cautions } from './cautions.tsx';
import { Figures } from './figures.tsx';
import { countWords, FindingsList } from './findings-list.tsx';
import { type OpenedPlan, openPlan, planMirror, type PlanMirror } from './open-plan.ts';
import { PlanFields } from './plan-fields.tsx';
import { PlanStage } from './plan-stage.tsx';
import { PlannerFrame } from './planner-frame.tsx';
import { PlannerHeader } from './planner-header.tsx';
import { PlayerBar } from './player-bar.tsx';
import { SaveDialogs } from './save-dialogs.tsx';
import { usePlanner } from './use-planner.ts';

export interface PlannerProps {
  readonly sheet: CutSheet;
  /** The version that the plan stands on; later values of these props change nothing that is typed. */
  readonly version: SheetVersion;
  readonly draft: SheetDraft | null;
  readonly mayWrite: boolean;
}

/** A cut sheet being planned: form, drawing, run of the wire, findings and figures. */
export function Planner({ sheet, version, draft, mayWrite }: PlannerProps) {
  const { id } = useMe();
  const [mirror] = useState(() => planMirror(localStorage, id, sheet.id));
  const [opened] = useState(() => openPlan(version, draft, mirror.read()));
  const [base] = useState(version);
  return <OpenedPlanner sheet={sheet} base={base} opened={opened} mirror={mirror} mayWrite={mayWrite} />;
}

interface OpenedPlannerProps extends Pick<PlannerProps, 'sheet' | 'mayWrite'> {
  readonly base: SheetVersion;
  readonly opened: OpenedPlan;
  readonly mirror: PlanMirror;
}

function OpenedPlanner({ sheet, base, opened, mirror, mayWrite }: OpenedPlannerProps) {
  const formElement = useRef<HTMLFormElement>(null);
  const planner = usePlanner({ sheet, base, opened, mirror, mayWrite, formElement });
  const { planForm, sources, worked, findings, selection, run, saving, identity } = planner;
  const units = useUnits();
  const model = worked.output?.model ?? null;
  return (
    <PlannerFrame
      title={sheet.name}
      header={<Header planner={planner} sheet={sheet} mayWrite={mayWrite} />}
      form={<PlanFields ref={formElement} planner={planner} />}
      stage={
        <>
          {sources.error && <ErrorState error={sources.error} retry={sources.retry} />}
          {opened.from === 'browser' && (
            <Notice tone="caution">
              Opened from this browser: the server had not kept these changes yet.
            </Notice>
          )}
          <PlanStage
            {...{ model, identity }}
            position={run.position}
            selected={selection.selected}
            stale={worked.stale}
            refused={planner.refused}
            standing={worked.output ? countWords(findings) : null}
          />
          <PlayerBar cut={model?.cut ?? null} control={run} />
          <Cautions machine={planner.machine} ribMachine={planner.ribMachine} />
        </>
      }
      side={
        <>
          <Figures model={model} stale={worked.stale} refused={planner.refused !== null} />
          <FindingsList
            findings={findings}
            pending={worked.output === null}
            stale={worked.stale}
            selected={selection.selected}
            onSelect={selection.select}
          />
        </>
      }
    >
      {model && <PrintedPlan {...{ model, identity, units }} />}
      <SaveDialogs
        saving={saving}
        values={planForm.present}
        names={planner.names}
        basedOn={planner.basedOn}
        nextNumber={planner.nextNumber}
        findings={countWords(findings)}
      />
    </PlannerFrame>
  );
}

interface HeaderProps extends Pick<PlannerProps, 'sheet' | 'mayWrite'> {
  readonly planner: ReturnType<typeof usePlanner>;
}

function Header({ planner, sheet, mayWrite }: HeaderProps) {
  const { planForm, basedOn, nextNumber, dirty, keeping, askToSave } = planner;
  const { canUndo, canRedo, undo, redo } = planForm;
  return (
    <PlannerHeader
      sheetId={sheet.id}
      name={sheet.name}
      keeper={keeping}
      onUndo={undo}
      onRedo={redo}
      onSave={askToSave}
      {...{ basedOn, nextNumber, canUndo, canRedo, dirty, mayWrite }}
    />
  );
}
