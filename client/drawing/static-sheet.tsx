import { memo, useId, useMemo } from 'react';
import { type Shape } from '#geometry/shapes/shape.ts';
import { formatLength, type Units, useUnits } from '#client/app/units.ts';
import { layoutDimensions } from './dimension-layout.ts';
import { DimensionLines, DimensionText } from './dimension-lines.tsx';
import { DistributionView } from './distribution-view.tsx';
import { drawSection, type SectionDrawing } from './section-drawing.ts';
import { dimensionRoom, sectionDimensions } from './section-dimensions.ts';
import { ChordLine, GhostLines, SectionLines } from './section-lines.tsx';
import { SheetFrame } from './sheet-frame.tsx';
import { StationLabels, StationLines } from './sheet-grid.tsx';
import { SheetRemarks } from './sheet-remarks.tsx';
import { sheetLayout, type SheetLayout } from './sheet-layout.ts';
import { FITTED, sheetTransform, type SheetTransform } from './sheet-view.ts';
import { scaleWords, sheetRemarks } from './sheet-words.ts';
import { TitleBlock, type TitleBlockFields } from './title-block.tsx';
import { type Size, useSize } from './use-sheet-size.ts';
import './printed-sheet.css';

export { type TitleBlockFields } from './title-block.tsx';

export interface StaticSheetProps {
  readonly shape: Shape;
  readonly chordMm: number;
  readonly title: TitleBlockFields;
  /** Another version behind the section, with its number. */
  readonly ghost?: { readonly shape: Shape; readonly number: number } | undefined;
}

/** A4 landscape without its margins, in CSS pixels: 277 mm × 190 mm. */
const A4 = { width: 1047, height: 718, scale: 1 } as const;

/** The drawing sheet without handles: fills the width of its place on screen, and A4 or A3 landscape in print. */
export function StaticSheet(props: StaticSheetProps) {
  const units = useUnits();
  const [box, size] = useSize<HTMLDivElement>({ width: 960, height: 640, scale: 1 });
  return (
    <>
      <div ref={box} className="aspect-[4/5] w-full border border-rule bg-sheet sm:aspect-[3/2] print:hidden">
        <SheetDrawing {...props} units={units} size={size} />
      </div>
      <PrintedSheet {...props} units={units} />
    </>
  );
}

/** The sheet as it is printed: one page, light, at its own layout; not shown on screen. */
export function PrintedSheet(props: StaticSheetProps & { readonly units: Units }) {
  return (
    <div className="printed-sheet hidden print:block" aria-hidden="true">
      <SheetDrawing {...props} size={A4} printed />
    </div>
  );
}

interface SheetDrawingProps extends StaticSheetProps {
  readonly units: Units;
  readonly size: Size;
  readonly printed?: boolean;
}

const SheetDrawing = memo(function SheetDrawing(props: SheetDrawingProps) {
  const { shape, chordMm, title, ghost, units, size, printed = false } = props;
  const drawing = useMemo(() => drawSection(shape), [shape]);
  const layout = useMemo(() => sheetLayout(size), [size]);
  const transform = useMemo(
    () => sheetTransform(layout, drawing.measures.extents, 1, FITTED),
    [layout, drawing],
  );
  const scale = scaleWords(transform, chordMm, 1);
  return (
    <svg
      viewBox={`0 0 ${layout.width} ${layout.height}`}
      width={layout.width * layout.scale}
      height={layout.height * layout.scale}
      role="img"
      aria-label={`Drawing sheet of ${title.title}, ${title.designation}`}
      className="block h-auto max-w-full"
    >
      <SheetFrame layout={layout} />
      <SheetViews
        drawing={drawing}
        layout={layout}
        transform={transform}
        chordMm={chordMm}
        units={units}
        ghost={ghost}
      />
      <SheetRemarks
        layout={layout}
        remarks={[
          ...sheetRemarks({
            units,
            exaggeration: 1,
            gridMm: null,
            comb: false,
            ghost: ghost?.number ?? null,
          }),
          ...(printed ? ['Print at 100 % and check the chord with a rule.', ...standingOf(title)] : []),
        ]}
      />
      <TitleBlock
        layout={layout}
        fields={title}
        chord={formatLength(chordMm, units)}
        scale={printed ? `about ${scale}` : scale}
      />
    </svg>
  );
});

/** Paper outlives the screen: a sheet that is not in force says so itself. */
function standingOf({ status }: TitleBlockFields): string[] {
  if (status === 'released') return [];
  return [
    status === 'draft' ? 'Draft: not released, do not cut from it.' : `As ${status}: do not cut from it.`,
  ];
}

interface SheetViewsProps {
  readonly drawing: SectionDrawing;
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly chordMm: number;
  readonly units: Units;
  readonly ghost: StaticSheetProps['ghost'];
}

function SheetViews({ drawing, layout, transform, chordMm, units, ghost }: SheetViewsProps) {
  const clip = useId();
  const dimensions = useMemo(
    () =>
      layoutDimensions(
        sectionDimensions({ drawing, transform, chordMm, units }),
        dimensionRoom(layout, drawing, transform, []),
      ),
    [drawing, transform, chordMm, units, layout],
  );
  return (
    <>
      <clipPath id={clip}>
        <rect {...layout.drawing} />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        <StationLines layout={layout} transform={transform} />
        <SectionLines drawing={drawing} transform={transform} />
        {ghost && <GhostLines drawing={drawSection(ghost.shape)} transform={transform} />}
        <ChordLine transform={transform} />
        <DimensionLines dimensions={dimensions} live={NONE} />
        {dimensions.map((dimension) => (
          <DimensionText key={dimension.id} dimension={dimension} className="fill-ink" />
        ))}
        <DistributionView
          view="thickness"
          layout={layout}
          transform={transform}
          drawing={drawing}
          chordMm={chordMm}
          units={units}
        />
        <StationLabels layout={layout} transform={transform} />
      </g>
    </>
  );
}

const NONE: readonly never[] = [];
