import { useMemo } from 'react';
import { useMe } from '#client/app/session.tsx';
import { type Units, useUnits } from '#client/app/units.ts';
import { type Size, useSize } from '#client/drawing/use-sheet-size.ts';
import { type CorePlan } from '#geometry/cutting/planner.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { PlanDrawing } from './plan-drawing.tsx';
import { planLayout } from './plan-layout.ts';
import { modelOf, type PlanModel } from './plan-model.ts';
import { type PlanIdentity } from './plan-title-block.tsx';
import '#client/drawing/printed-sheet.css';

interface ModelSheetProps {
  readonly model: PlanModel;
  readonly identity: PlanIdentity;
}

/** A4 landscape without its margins, in CSS pixels: 277 mm × 190 mm. */
const A4 = { width: 1047, height: 718, scale: 1 } as const;

/** The drawing of a saved version alone: fills the width of its place on screen, and one A4 or A3 landscape in print. */
export function PlanSheet({ core, version }: { readonly core: CorePlan; readonly version: SheetVersion }) {
  const units = useUnits();
  const { workshop } = useMe();
  const model = useMemo(() => modelOf(core), [core]);
  const identity = useMemo(() => identityOf(version, workshop.name), [version, workshop.name]);
  const [box, size] = useSize<HTMLDivElement>({ width: 960, height: 640, scale: 1 });
  return (
    <>
      <div
        ref={box}
        className="aspect-[1/2] w-full overflow-hidden border border-rule bg-sheet sm:aspect-[3/2] print:hidden"
      >
        <SizedPlan {...{ model, identity, units, size }} />
      </div>
      <PrintedPlan {...{ model, identity, units }} />
    </>
  );
}

function SizedPlan({ size, ...rest }: ModelSheetProps & { units: Units; size: Size }) {
  const layout = useMemo(() => planLayout(size), [size]);
  return <PlanDrawing {...rest} layout={layout} />;
}

const PRINT_LAYOUT = planLayout(A4);

/** The sheet as it is printed: one page, light, at its own layout; not shown on screen. */
export function PrintedPlan({ model, identity, units }: ModelSheetProps & { readonly units: Units }) {
  return (
    <div className="printed-sheet hidden print:block" aria-hidden="true">
      <PlanDrawing {...{ model, identity, units }} layout={PRINT_LAYOUT} remarks={printedRemarks(identity)} />
    </div>
  );
}

/** Paper outlives the screen: a sheet that is not in force says so itself, and what can hurt is said on it. */
function printedRemarks({ status, shortCode }: PlanIdentity): string[] {
  return [
    ...(status === 'released' ? [] : [`${STANDING[status]}: do not cut from it.`]),
    ...(shortCode === null ? [] : [`Code ${shortCode}.`]),
    'Hot wire burns, fumes harm: ventilate.',
    'Dry run with a cold wire first.',
  ];
}

const STANDING = {
  draft: 'Draft, not released',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
} as const;

/** What the title block says of a saved version. */
export function identityOf(version: SheetVersion, owner: string): PlanIdentity {
  const section = ({ sectionName, versionNumber }: SheetVersion['root']) =>
    `${sectionName} v${versionNumber}`;
  return {
    title: version.sheetName,
    version: String(version.number),
    status: version.status,
    root: section(version.root),
    tip: section(version.tip),
    author: version.author.name,
    date: version.createdAt,
    checksum: version.checksum,
    shortCode: version.shortCode,
    owner,
  };
}
