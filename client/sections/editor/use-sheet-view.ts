import { type RefObject, useCallback, useMemo, useState } from 'react';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import {
  type Exaggeration,
  FITTED,
  type Ordinates,
  type SheetTransform,
  sheetTransform,
  type SheetView,
  zoomAbout,
} from '#client/drawing/sheet-view.ts';
import { useSheetGestures } from './use-sheet-gestures.ts';

export interface SheetControl {
  readonly transform: SheetTransform;
  readonly view: SheetView;
  readonly fit: () => void;
  /** Zooms by a factor about the middle of the sheet. */
  readonly zoom: (factor: number) => void;
  readonly panning: boolean;
}

export const ZOOM_STEP = 1.25;

/**
 * What part of the drawing is in sight.
 * @param ordinates Of the section as it is now; the fitted scale follows them only when the sheet is fitted again, so
 *   that nothing moves while a handle is dragged.
 */
export function useSheetView(
  element: RefObject<SVGSVGElement | null>,
  layout: SheetLayout,
  ordinates: Ordinates,
  exaggeration: Exaggeration,
): SheetControl {
  const [view, setView] = useState(FITTED);
  const [fitted, setFitted] = useState({ ordinates, exaggeration });
  if (fitted.exaggeration !== exaggeration) setFitted({ ordinates, exaggeration });
  const fit = useCallback(() => {
    setView(FITTED);
    setFitted({ ordinates, exaggeration });
  }, [ordinates, exaggeration]);
  const zoom = useCallback(
    (factor: number) => {
      const { chord, section } = layout;
      const middle = { x: (chord.left + chord.right) / 2, y: section.y + section.height / 2 };
      setView((before) => zoomAbout(before, layout, middle, factor));
    },
    [layout],
  );
  const panning = useSheetGestures(element, layout, setView, fit);
  const transform = useMemo(
    () => sheetTransform(layout, fitted.ordinates, exaggeration, view),
    [layout, fitted, exaggeration, view],
  );
  return { transform, view, fit, zoom, panning };
}
