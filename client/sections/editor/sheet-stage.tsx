import { useMemo, useRef } from 'react';
import { type Shape } from '#geometry/shapes/shape.ts';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { sheetLayout } from '#client/drawing/sheet-layout.ts';
import { type TitleBlockFields } from '#client/drawing/title-block.tsx';
import { useSize } from '#client/drawing/use-sheet-size.ts';
import { EditorSheet } from './editor-sheet.tsx';
import { type EditorAction } from './editor-state.ts';
import { useLiveState } from './live-state.ts';
import { NoticeLine } from './notice-line.tsx';
import { SheetGestures } from './sheet-gestures.ts';
import { type SheetSettings } from './sheet-settings.ts';
import { SheetTools } from './sheet-tools.tsx';
import { useEditorKeys } from './use-editor-keys.ts';
import { useSheetView } from './use-sheet-view.ts';

interface SheetStageProps {
  readonly dispatch: (action: EditorAction) => void;
  readonly settings: SheetSettings;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
  readonly title: TitleBlockFields;
  readonly ghost: Shape | null;
  readonly enabled: boolean;
  readonly onSave?: (() => void) | undefined;
}

/** The sheet in its place, with the row of tools above it and the part of the drawing that is in sight. */
export function SheetStage(props: SheetStageProps) {
  const { dispatch, settings, onSettings, title, ghost, enabled, onSave } = props;
  const state = useLiveState();
  const { shape } = state.present;
  const [box, size] = useSize<HTMLDivElement>({ width: 960, height: 600, scale: 1 });
  const { exaggeration, secondView } = settings;
  const second = secondView === 'none' ? 'none' : exaggeration > 1 ? 'small' : 'full';
  const layout = useMemo(() => sheetLayout(size, second), [size, second]);
  const svg = useRef<SVGSVGElement>(null);
  const control = useSheetView(
    layout,
    drawSection(shape).measures.extents,
    exaggeration,
    state.drag !== null,
  );
  useEditorKeys({
    dispatch,
    dragging: state.drag !== null,
    onSave,
    onZoom: control.zoom,
    onFit: control.fit,
  });
  const notice = <NoticeLine notice={state.notice} chordMm={state.present.chordMm} layout={layout} />;
  return (
    <>
      <SheetTools
        settings={settings}
        onSettings={onSettings}
        zoomPercent={Math.round(control.view.zoom * 100)}
        onZoom={control.zoom}
        onFit={control.fit}
      />
      <div
        ref={box}
        data-place="sheet"
        className="h-[min(34rem,150vw)] min-h-110 w-full shrink-0 relative overflow-hidden border border-rule bg-sheet lg:h-auto lg:flex-1"
      >
        <SheetGestures element={svg} layout={layout} setView={control.setView} fit={control.fit} />
        <EditorSheet
          element={svg}
          layout={layout}
          control={control}
          state={state}
          dispatch={dispatch}
          settings={settings}
          onSettings={onSettings}
          title={title}
          ghost={ghost}
          enabled={enabled}
        />
        {enabled && !layout.compact && notice}
      </div>
      {enabled && layout.compact && notice}
    </>
  );
}
