import {
  type Dispatch,
  type ReactNode,
  type SetStateAction,
  useCallback,
  useEffect,
  useEffectEvent,
  useMemo,
  useRef,
  useState,
} from 'react';
import { useUnits } from '#client/app/units.ts';
import { FITTED, type SheetView, zoomAbout } from '#client/drawing/sheet-view.ts';
import { useSize } from '#client/drawing/use-sheet-size.ts';
import { SheetGestures } from '#client/sections/editor/sheet-gestures.ts';
import { ZOOM_STEP } from '#client/sections/editor/use-sheet-view.ts';
import { Button } from '#client/ui/button.tsx';
import { type Finding } from '#geometry/cutting/findings.ts';
import { HighlightMarks, highlightsOf, middleOf } from '../views/highlight.tsx';
import { PlanDrawing, type PlanDrawingProps } from '../views/plan-drawing.tsx';
import { planLayout, type PlanLayout, UNZOOMED, zoomOf } from '../views/plan-layout.ts';
import { type PlanModel } from '../views/plan-model.ts';
import { type PlanIdentity } from '../views/plan-title-block.tsx';
import { sceneOf } from '../views/scene.ts';
import { viewPlaces } from '../views/view-places.ts';
import { type WirePosition } from '../views/wire-position.ts';
import { SHEET_PLACE } from './planner-frame.tsx';
import { useZoomKeys } from './use-planner-keys.ts';

interface PlanStageProps {
  readonly model: PlanModel | null;
  readonly identity: PlanIdentity;
  readonly position: WirePosition | null;
  readonly selected: Finding | null;
  /** A newer plan is being worked out. */
  readonly stale: boolean;
  /** Why what is drawn is not what the form says; null when it is. */
  readonly refused: ReactNode;
  /** How the findings stand, in a few words. */
  readonly standing: string | null;
}

/** The sheet in its place, with zoom and the marks of the finding that is selected. */
export function PlanStage({ model, identity, position, selected, stale, refused, standing }: PlanStageProps) {
  const units = useUnits();
  const [box, size] = useSize<HTMLDivElement>({ width: 680, height: 600, scale: 1 });
  const layout = useMemo(() => planLayout(size), [size]);
  const svg = useRef<SVGSVGElement>(null);
  const { view, setView, zoom, fit } = useZoom(layout);
  const shown = useMemo(() => zoomOf(layout, view), [layout, view]);
  useZoomKeys(zoom, fit);
  useZoomToFinding(model, selected, layout, setView);
  const over = useCallback<NonNullable<PlanDrawingProps['over']>>(
    (scene, places) =>
      selected && (
        <HighlightMarks
          highlights={highlightsOf(selected, scene)}
          severity={selected.severity}
          scene={scene}
          places={places}
        />
      ),
    [selected],
  );
  return (
    <>
      <ZoomRow percent={Math.round(view.zoom * 100)} onZoom={zoom} onFit={fit}>
        {refused ?? (stale && model ? 'Working out the newest values…' : standing)}
      </ZoomRow>
      <div ref={box} data-place="sheet" className={SHEET_PLACE}>
        {model ? (
          <>
            <SheetGestures element={svg} layout={layout} setView={setView} fit={fit} />
            <PlanDrawing
              element={svg}
              {...{ model, layout, identity, units, position, over }}
              zoom={shown}
              dimmed={refused !== null}
            />
          </>
        ) : (
          <p role="status" className="p-6 text-graphite">
            {refused ?? 'Working out the plan…'}
          </p>
        )}
      </div>
    </>
  );
}

function useZoom(layout: PlanLayout) {
  const [view, setView] = useState(FITTED);
  const fit = useCallback(() => setView(FITTED), []);
  const zoom = useCallback(
    (factor: number) => {
      const { x, y, width, height } = layout.drawing;
      setView((before) => zoomAbout(before, layout, { x: x + width / 2, y: y + height / 2 }, factor));
    },
    [layout],
  );
  return { view, setView, zoom, fit };
}

const NEAR = 2.4;

/** Brings the first place of a finding into the middle when it is selected, and the whole sheet back when it no longer is. */
function useZoomToFinding(
  model: PlanModel | null,
  selected: Finding | null,
  layout: PlanLayout,
  setView: Dispatch<SetStateAction<SheetView>>,
): void {
  const show = useEffectEvent((finding: Finding | null) => {
    const scene = model && sceneOf(model);
    const middle =
      scene && finding
        ? middleOf(highlightsOf(finding, scene), scene, viewPlaces(scene, layout, UNZOOMED))
        : null;
    setView(middle ? viewOn(layout, middle) : FITTED);
  });
  useEffect(() => show(selected), [selected]);
}

/** The view that has a pixel of the fitted sheet in its middle. */
function viewOn(layout: PlanLayout, { x, y }: { readonly x: number; readonly y: number }): SheetView {
  const unmoved = zoomOf(layout, { zoom: NEAR, panX: 0, panY: 0 });
  const { drawing } = layout;
  return {
    zoom: NEAR,
    panX: drawing.x + drawing.width / 2 - NEAR * x - unmoved.dx,
    panY: drawing.y + drawing.height / 2 - NEAR * y - unmoved.dy,
  };
}

interface ZoomRowProps {
  readonly percent: number;
  readonly onZoom: (factor: number) => void;
  readonly onFit: () => void;
  readonly children: ReactNode;
}

/** The row over the sheet: what is to be said of the drawing, and zoom. */
function ZoomRow({ percent, onZoom, onFit, children }: ZoomRowProps) {
  return (
    <div role="toolbar" aria-label="Sheet" className="flex h-7 items-center gap-1 pointer-coarse:h-11">
      <p role="status" className="min-w-0 flex-1 truncate text-xs text-graphite">
        {children}
      </p>
      <Button
        size="small"
        aria-label="Zoom out"
        onClick={() => onZoom(1 / ZOOM_STEP)}
        className="w-7 pointer-coarse:size-11"
      >
        −
      </Button>
      <output className="w-14 text-center text-xs text-graphite">{`${percent} %`}</output>
      <Button
        size="small"
        aria-label="Zoom in"
        onClick={() => onZoom(ZOOM_STEP)}
        className="w-7 pointer-coarse:size-11"
      >
        +
      </Button>
      <Button size="small" onClick={onFit} className="pointer-coarse:h-11">
        Fit
      </Button>
    </div>
  );
}
