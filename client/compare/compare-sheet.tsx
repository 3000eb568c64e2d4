import { memo, useId, useMemo } from 'react';
import { formatLength, type Units, useUnits } from '#client/app/units.ts';
import { SheetFrame } from '#client/drawing/sheet-frame.tsx';
import { StationLabels, StationLines } from '#client/drawing/sheet-grid.tsx';
import { SheetRemarks } from '#client/drawing/sheet-remarks.tsx';
import { scaleText } from '#client/drawing/sheet-view.ts';
import { type TitleCell, TitleGrid } from '#client/drawing/title-block.tsx';
import { type Size, useSize } from '#client/drawing/use-sheet-size.ts';
import { type Choice } from './choice.ts';
import { type Compared } from './comparison.ts';
import { DeviationsView } from './deviations-view.tsx';
import { Legend, OutlinesView } from './outlines-view.tsx';
import { planSheet, type SheetPlan } from './sheet-plan.ts';
import { ALIGNMENT_NAMES, largestWords, magnificationWords, nameOf } from './words.ts';
import '#client/drawing/printed-sheet.css';

export interface CompareSheetProps {
  readonly compared: readonly Compared[];
  readonly choice: Choice;
  /** The workshop. */
  readonly owner: string;
}

/** A4 landscape without its margins, in CSS pixels: 277 mm × 190 mm. */
const A4 = { width: 1047, height: 718, scale: 1 } as const;
const FIRST_SIZE = { width: 960, height: 640, scale: 1 } as const;

/** The drawing sheet of a comparison: on screen as wide as its place, in print on A4 landscape. */
export function CompareSheet(props: CompareSheetProps) {
  const units = useUnits();
  const [box, size] = useSize<HTMLDivElement>(FIRST_SIZE);
  return (
    <>
      <div ref={box} className="aspect-[5/8] w-full border border-rule bg-sheet sm:aspect-[3/2] print:hidden">
        <SheetDrawing {...props} units={units} size={size} />
      </div>
      <div className="printed-sheet hidden print:block" aria-hidden="true">
        <SheetDrawing {...props} units={units} size={A4} printed />
      </div>
    </>
  );
}

interface SheetDrawingProps extends CompareSheetProps {
  readonly units: Units;
  readonly size: Size;
  readonly printed?: boolean;
}

const SheetDrawing = memo(function SheetDrawing(props: SheetDrawingProps) {
  const { compared, choice, owner, units, size, printed = false } = props;
  const { chordMm, magnification } = choice;
  const clip = useId();
  const plan = useMemo(() => planSheet(size, compared, magnification), [size, compared, magnification]);
  const { layout, transform } = plan;
  return (
    <svg
      viewBox={`0 0 ${layout.width} ${layout.height}`}
      width={layout.width * layout.scale}
      height={layout.height * layout.scale}
      role="img"
      aria-label={`Drawing sheet: ${compared.map(nameOf).join(', ')} laid on each other`}
      className="block h-auto max-w-full"
    >
      <SheetFrame layout={layout} />
      <clipPath id={clip}>
        <rect {...layout.drawing} />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        <StationLines layout={layout} transform={transform} />
        <OutlinesView plan={plan} compared={compared} />
        <DeviationsView plan={plan} compared={compared} chordMm={chordMm} units={units} />
        <StationLabels layout={layout} transform={transform} />
      </g>
      <Legend plan={plan} compared={compared} />
      <SheetRemarks layout={layout} remarks={remarksOf(props, plan)} />
      <TitleGrid layout={layout} cells={cellsOf({ plan, choice, owner, units, printed })} />
    </svg>
  );
});

function remarksOf({ compared, choice, units }: SheetDrawingProps, plan: SheetPlan): string[] {
  const others = compared.filter(({ deviation }) => deviation !== null);
  return [
    ...(others.length === 0 ? [] : [magnificationWords(plan.magnification)]),
    ...(plan.leaves ? ['What is larger runs out of the view.'] : []),
    ...(plan.layout.compact ? [] : others).map(
      (one) => `${one.tag}: ${largestWords(one, choice.chordMm, units)}.`,
    ),
  ];
}

interface CellsInput {
  readonly plan: SheetPlan;
  readonly choice: Choice;
  readonly owner: string;
  readonly units: Units;
  readonly printed: boolean;
}

function cellsOf({ plan, choice, owner, units, printed }: CellsInput): TitleCell[] {
  const scale = scaleText(plan.transform.chordPixels, choice.chordMm);
  return [
    { label: 'Title', text: 'Comparison of versions', from: 0, width: 1, row: 0, size: 16 },
    { label: 'Chord', text: formatLength(choice.chordMm, units), from: 0, width: 0.34, row: 1 },
    { label: 'Scale', text: printed ? `about ${scale}` : scale, from: 0.34, width: 0.33, row: 1 },
    { label: 'Deviation', text: `×${plan.magnification}`, from: 0.67, width: 0.33, row: 1 },
    { label: 'Aligned by', text: ALIGNMENT_NAMES[choice.alignment], from: 0, width: 0.5, row: 2 },
    { label: 'Owner', text: owner, from: 0.5, width: 0.5, row: 2 },
  ];
}
