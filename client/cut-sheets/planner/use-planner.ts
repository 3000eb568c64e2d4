import { useEffect, useMemo, useRef, useState } from 'react';
import { type Finding } from '#geometry/cutting/findings.ts';
import { cutSheetEndpoints } from '#server/contracts/cut-sheet-endpoints.ts';
import { type CutSheet, type SheetPlan, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { type MachineKind } from '#server/contracts/shop.ts';
import { keepSheetDraft, type SheetDraftInput } from '#client/api/cut-sheets.ts';
import { useMe } from '#client/app/session.tsx';
import { type DraftKeeper } from '#client/sections/editor/draft-keeper.ts';
import { useKeeper } from '#client/sections/editor/use-draft-keeper.ts';
import { type PlanIdentity } from '../views/plan-title-block.tsx';
import { useWorked } from '../views/use-worked.ts';
import { secondsOfLine } from '../views/wire-position.ts';
import { focusPath } from './focus-path.ts';
import { type Names } from './plan-differences.ts';
import { type OpenedPlan, type PlanMirror } from './open-plan.ts';
import { type PlanErrors, type PlanValues, sameValues } from './plan-values.ts';
import { fieldsOf, usePlanForm } from './use-plan-form.ts';
import { usePlanInput } from './use-plan-input.ts';
import { type PlanSources, usePlanSources } from './use-plan-sources.ts';
import { usePlannerKeys } from './use-planner-keys.ts';
import { usePlayer } from './use-player.ts';
import { useSheetSave } from './use-sheet-save.ts';

interface PlannerStart {
  readonly sheet: CutSheet;
  /** The version that the plan was opened on. */
  readonly base: SheetVersion;
  readonly opened: OpenedPlan;
  readonly mirror: PlanMirror;
  readonly mayWrite: boolean;
  readonly formElement: { readonly current: HTMLFormElement | null };
}

const NO_FINDINGS: readonly Finding[] = [];

/** Everything of the planner: its form, what is worked out from it, the run of the wire, the draft and saving. */
export function usePlanner({ sheet, base, opened, mirror, mayWrite, formElement }: PlannerStart) {
  const planForm = usePlanForm(opened.values);
  const { present, read } = planForm;
  const [version, setVersion] = useState(base);
  const [basedOn, setBasedOn] = useState(opened.basedOn);
  const sources = usePlanSources(present, version);
  const input = usePlanInput(useLastGood(read.plan, base.plan), sources, sheet.name, basedOn);
  const worked = useWorked(input);
  const findings = useFindings(worked.output?.findings ?? NO_FINDINGS, read.errors);
  const run = usePlayer(worked.output?.model?.cut ?? null);
  const selection = useSelection(findings, formElement, (line) => {
    const cut = worked.output?.model?.cut;
    const seconds = cut ? secondsOfLine(cut, line) : null;
    if (seconds !== null) run.dispatch({ type: 'seek', seconds });
  });
  const dirty = !sameValues(present, version.plan);
  const [keeper, keeping] = useKeeper<SheetDraftInput>(mirror, {
    keep: (draft) => keepSheetDraft(sheet.id, draft),
    address: cutSheetEndpoints.keepSheetDraft.path.replace(':sheetId', sheet.id),
  });
  useKeepingPlan(keeper, present, basedOn, opened);
  const saving = useSheetSave({
    sheetId: sheet.id,
    plan: read.plan,
    basedOn,
    keeper,
    onSaved: (saved) => {
      setVersion(saved);
      setBasedOn(saved.number);
    },
  });
  const askToSave = () => {
    const [wrong] = read.errors.keys();
    if (wrong !== undefined && formElement.current) focusPath(formElement.current, wrong);
    else if (dirty && mayWrite) saving.ask();
  };
  usePlannerKeys({ onUndo: planForm.undo, onRedo: planForm.redo, onSave: askToSave });
  return {
    planForm,
    fields: fieldsOf(planForm, findings, mayWrite),
    sources,
    worked,
    findings,
    selection,
    run,
    keeping,
    saving,
    askToSave,
    dirty,
    basedOn,
    nextNumber: Math.max(sheet.versionCount, sheet.latest.number, version.number) + 1,
    refused: refusedWords(read.errors.size, worked.error !== null),
    names: namesOf(sources),
    machine: kindOf(sources, version, present['machineId']),
    ribMachine: present['ribs'] === null ? null : kindOf(sources, version, present['ribMachineId']),
    identity: useIdentity(sheet.name, version, sources, dirty, basedOn),
  };
}

/** The kind of a machine; until the machines are fetched, as far as the version tells. */
function kindOf({ machines }: PlanSources, version: SheetVersion, id: unknown): MachineKind | null {
  if (machines) return machines.find((machine) => machine.id === id)?.settings.kind ?? null;
  return [version.machine, version.ribMachine].find((machine) => machine?.id === id)?.kind ?? null;
}

function namesOf({ root, tip, machines, materials }: PlanSources): Names {
  return new Map([
    ...[root, tip].map(({ sectionId, name }) => [sectionId, name ?? sectionId] as const),
    ...[...(machines ?? []), ...(materials ?? [])].map(({ id, name }) => [id, name] as const),
  ]);
}

/** Why the drawing is not of what the form says; null when it is. */
function refusedWords(errors: number, failed: boolean): string | null {
  if (failed)
    return 'The plan could not be worked out in this browser: keep it as a draft and load the page again.';
  if (errors === 0) return null;
  return `${errors === 1 ? 'One value is' : `${errors} values are`} not usable: the drawing shows the last plan that was.`;
}

/** The last plan that the schema took; at first that of the version. */
function useLastGood(plan: SheetPlan | null, first: SheetPlan): SheetPlan {
  const [last, setLast] = useState(plan ?? first);
  if (plan && plan !== last) setLast(plan);
  return plan ?? last;
}

/** What the schema refuses are findings too, and stand before those of the last plan that it took. */
function useFindings(worked: readonly Finding[], errors: PlanErrors): readonly Finding[] {
  return useMemo(
    () => [
      ...[...errors].map(([path, message]): Finding => ({
        severity: 'error',
        code: 'bad-value',
        path,
        message,
      })),
      ...worked,
    ],
    [worked, errors],
  );
}

/** The finding that is selected, as long as it stands: it is shown on the sheet, and its field gets the focus. */
function useSelection(
  findings: readonly Finding[],
  form: { readonly current: HTMLFormElement | null },
  seekLine: (line: number) => void,
) {
  const [wanted, setWanted] = useState<Finding | null>(null);
  const selected = findings.find(({ code, path }) => code === wanted?.code && path === wanted.path) ?? null;
  return {
    selected: wanted && (findings.includes(wanted) ? wanted : selected),
    select: (finding: Finding | null) => {
      setWanted(finding);
      if (!finding) return;
      if (finding.at?.line !== undefined) seekLine(finding.at.line);
      if (form.current) focusPath(form.current, finding.path);
    },
  };
}

/** Hands every change to the keeper; what was opened is kept already, unless it came from this browser. */
function useKeepingPlan(
  keeper: DraftKeeper<SheetDraftInput>,
  present: PlanValues,
  basedOn: number,
  opened: OpenedPlan,
): void {
  const last = useRef(opened.from === 'browser' ? null : opened.values);
  useEffect(() => {
    if (last.current !== null && sameValues(last.current, present)) return;
    last.current = present;
    keeper.change({ basedOn, values: present });
  }, [keeper, present, basedOn]);
}

/** The title block: of the saved version, or of unsaved work on it. */
function useIdentity(
  title: string,
  version: SheetVersion,
  sources: PlanSources,
  dirty: boolean,
  basedOn: number,
): PlanIdentity {
  const me = useMe();
  const [now] = useState(() => new Date().toISOString());
  const { root, tip } = sources;
  return useMemo(
    () => ({
      title,
      version: dirty ? `draft on ${basedOn}` : String(version.number),
      status: dirty ? 'draft' : version.status,
      root: `${root.name ?? '…'} v${root.versionNumber}`,
      tip: `${tip.name ?? '…'} v${tip.versionNumber}`,
      author: dirty ? me.name : version.author.name,
      date: dirty ? now : version.createdAt,
      checksum: dirty ? null : version.checksum,
      shortCode: dirty ? null : version.shortCode,
      owner: me.workshop.name,
    }),
    [title, version, dirty, basedOn, me, now, root.name, root.versionNumber, tip.name, tip.versionNumber],
  );
}
