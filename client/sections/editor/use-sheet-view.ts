import {
  type Dispatch,
  type SetStateAction,
  useCallback,
  useLayoutEffect,
  useMemo,
  useRef,
  useState,
} from 'react';
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

export interface SheetControl {
  readonly transform: SheetTransform;
  readonly view: SheetView;
  readonly fit: () => void;
  /** Zooms by a factor about the middle of the sheet. */
  readonly zoom: (factor: number) => void;
  /** For the gestures on the sheet. */
  readonly setView: Dispatch<SetStateAction<SheetView>>;
}

export const ZOOM_STEP = 1.25;

/**
 * What part of the drawing is in sight.
 * @param ordinates Of the section as it is now; the fitted scale follows them only when the sheet is fitted again, or
 *   when they have outgrown the fitted sheet, and never while a handle is dragged.
 */
export function useSheetView(
  layout: SheetLayout,
  ordinates: Ordinates,
  exaggeration: Exaggeration,
  dragging: boolean,
): SheetControl {
  const [view, setView] = useState(FITTED);
  const [fitted, setFitted] = useState({ ordinates, exaggeration });
  if (fitted.exaggeration !== exaggeration) setFitted({ ordinates, exaggeration });
  const latest = useRef(ordinates);
  useLayoutEffect(() => {
    latest.current = ordinates;
  });
  const fit = useCallback(() => {
    setView(FITTED);
    setFitted({ ordinates: latest.current, exaggeration });
  }, [exaggeration]);
  const zoom = useCallback(
    (factor: number) => {
      const { chord, section } = layout;
      const middle = { x: (chord.left + chord.right) / 2, y: section.y + section.height / 2 };
      setView((before) => zoomAbout(before, layout, middle, factor));
    },
    [layout],
  );
  const transform = useMemo(
    () => sheetTransform(layout, fitted.ordinates, exaggeration, view),
    [layout, fitted, exaggeration, view],
  );
  if (
    view === FITTED &&
    !dragging &&
    fitted.ordinates !== ordinates &&
    outgrows(layout, transform, ordinates)
  )
    setFitted({ ordinates, exaggeration });
  return { transform, view, setView, fit, zoom };
}

/** Does the section reach out of its view? */
function outgrows({ section }: SheetLayout, { toY }: SheetTransform, { minY, maxY }: Ordinates): boolean {
  return toY(maxY) < section.y || toY(minY) > section.y + section.height;
}
