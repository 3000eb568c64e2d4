import { type RefObject, useId, useMemo, useState } from 'react';
import { type Shape } from '#geometry/shapes/shape.ts';
import { formatLength, type Units, useUnits } from '#client/app/units.ts';
import { layoutDimensions } from '#client/drawing/dimension-layout.ts';
import { type PlacedSectionDimension } from '#client/drawing/dimension-lines.tsx';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { dimensionRoom, sectionDimensions } from '#client/drawing/section-dimensions.ts';
import { SheetFrame } from '#client/drawing/sheet-frame.tsx';
import { gridStepMm } from '#client/drawing/sheet-grid.tsx';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { SheetRemarks } from '#client/drawing/sheet-remarks.tsx';
import { scaleWords, sheetRemarks } from '#client/drawing/sheet-words.ts';
import { TitleBlock, type TitleBlockFields } from '#client/drawing/title-block.tsx';
import { DimensionButtons, isTyped, type TypedDimensionId } from './dimension-buttons.tsx';
import { DimensionInput } from './dimension-input.tsx';
import { dimensionValue } from './dimension-value.ts';
import { type EditorAction, type EditorState } from './editor-state.ts';
import { handleIds, type HandleId } from './handle-ids.ts';
import { handlePoint } from './handle-points.ts';
import { dimensionsOf } from './handle-words.ts';
import { Handles } from './handles.tsx';
import { type SheetSettings } from './sheet-settings.ts';
import { SheetViews } from './sheet-views.tsx';
import { type SheetControl } from './use-sheet-view.ts';

export interface EditorSheetProps {
  readonly element: RefObject<SVGSVGElement | null>;
  readonly layout: SheetLayout;
  readonly control: SheetControl;
  readonly state: EditorState;
  readonly dispatch: (action: EditorAction) => void;
  readonly settings: SheetSettings;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
  readonly title: TitleBlockFields;
  readonly ghost: Shape | null;
  /** False for readers: the sheet shows the section and changes nothing. */
  readonly enabled: boolean;
}

/** The drawing sheet as a form: the section with its handles and live dimensions, and the view along the chord. */
export function EditorSheet(props: EditorSheetProps) {
  const { element, layout, control, state, dispatch, settings, title, enabled } = props;
  const { chordMm } = state.present;
  const { transform } = control;
  const units = useUnits();
  const [selected, setSelected] = useState<HandleId | null>(null);
  const dimensions = useDimensions(props, units);
  const typing = useTyping(dimensions, element);
  const gridMm = settings.grid ? gridStepMm(transform, chordMm, units) : null;
  const remarks = useMemo(() => sheetRemarks({ ...settings, units, gridMm }), [settings, units, gridMm]);
  return (
    <div className="relative h-full w-full" data-testid="sheet">
      <svg
        ref={element}
        viewBox={`0 0 ${layout.width} ${layout.height}`}
        width={layout.width * layout.scale}
        height={layout.height * layout.scale}
        role="group"
        aria-label="Drawing sheet"
        className="block touch-pan-y select-none data-panning:cursor-grabbing data-panning:[&_[data-handle]]:pointer-events-none"
      >
        <SheetFrame layout={layout} />
        <Drawing
          {...props}
          units={units}
          gridMm={gridMm}
          dimensions={dimensions}
          selected={selected}
          typing={typing}
        />
        <SheetRemarks layout={layout} remarks={remarks} />
        <TitleBlock
          layout={layout}
          fields={title}
          chord={formatLength(chordMm, units)}
          scale={scaleWords(transform, chordMm, settings.exaggeration)}
        />
        {enabled && (
          <Handles
            {...{ layout, transform, state, dispatch, selected, units }}
            snap={settings.snap}
            onSelect={setSelected}
          />
        )}
      </svg>
      {typing.dimension && (
        <DimensionInput
          key={typing.dimension.id}
          dimension={typing.dimension}
          layout={layout}
          present={state.present}
          value={dimensionValue(state.present, typing.dimension.id)}
          onCommit={(field, value) => dispatch({ type: 'set', field, value })}
          onLeave={typing.leave}
        />
      )}
    </div>
  );
}

interface DrawingProps extends EditorSheetProps {
  readonly units: Units;
  readonly gridMm: number | null;
  readonly dimensions: readonly PlacedSectionDimension[];
  readonly selected: HandleId | null;
  readonly typing: ReturnType<typeof useTyping>;
}

/** Both views and the texts of the dimensions, cut off at the frame. */
function Drawing(props: DrawingProps) {
  const {
    layout,
    control,
    state,
    settings,
    onSettings,
    ghost,
    enabled,
    units,
    gridMm,
    dimensions,
    selected,
    typing,
  } = props;
  const { shape, chordMm } = state.present;
  const clip = useId();
  const inHand = state.drag?.handle ?? selected;
  const live = useMemo(() => (enabled ? dimensionsOf(inHand, shape) : []), [enabled, inHand, shape]);
  return (
    <>
      <clipPath id={clip}>
        <rect {...layout.drawing} />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        <SheetViews
          {...{ layout, settings, onSettings, units, chordMm, ghost, gridMm, dimensions, live }}
          transform={control.transform}
          drawing={drawSection(shape)}
        />
        <DimensionButtons
          dimensions={dimensions}
          live={live}
          editing={typing.dimension?.id ?? null}
          enabled={enabled}
          onEdit={typing.start}
        />
      </g>
    </>
  );
}

/** The dimensions of the section as it is now, each at its place. */
function useDimensions({ state, control, layout, enabled }: EditorSheetProps, units: Units) {
  const { shape, chordMm } = state.present;
  const inHand = state.drag?.handle ?? null;
  const { transform } = control;
  return useMemo(() => {
    const drawing = drawSection(shape);
    const handles = enabled ? handleIds(shape).flatMap((handle) => handlePoint(shape, handle) ?? []) : [];
    // The tag beside the pointer says what a leader of the handle in hand would say.
    const said = dimensionsOf(inHand, shape);
    const specs = sectionDimensions({ drawing, transform, chordMm, units }).filter(
      ({ id, kind }) => kind !== 'leader' || !said.includes(id),
    );
    return layoutDimensions(specs, dimensionRoom(layout, drawing, transform, handles));
  }, [shape, chordMm, units, transform, layout, enabled, inHand]);
}

/** Which dimension is being typed; Tab goes through them in their order. */
function useTyping(dimensions: readonly PlacedSectionDimension[], element: RefObject<SVGSVGElement | null>) {
  const [id, setId] = useState<TypedDimensionId | null>(null);
  const typed = dimensions.filter(isTyped);
  const at = typed.findIndex((dimension) => dimension.id === id);
  const leave = (step: -1 | 0 | 1) => {
    const next = step === 0 || at < 0 ? undefined : typed[at + step];
    setId(next?.id ?? null);
    if (!next && id !== null) focusDimension(element.current, id);
  };
  return { dimension: typed[at], start: setId, leave };
}

/** After typing, the focus goes back to the dimension, once it is a button again. */
function focusDimension(svg: SVGSVGElement | null, id: string): void {
  requestAnimationFrame(() => {
    if (document.activeElement === document.body)
      svg?.querySelector<SVGElement>(`[data-dimension="${id}"]`)?.focus();
  });
}
