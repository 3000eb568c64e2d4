import { useGesture } from '@use-gesture/react';
import { type Dispatch, memo, type RefObject, type SetStateAction, useEffect, useState } from 'react';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { panBy, type SheetView, zoomAbout } from '#client/drawing/sheet-view.ts';

const WHEEL_STEP = 0.0016;
/** A wheel that counts lines instead of pixels. */
const LINE_PIXELS = 16;

interface PinchMemo {
  readonly spread: number;
  readonly x: number;
  readonly y: number;
}

interface SheetGesturesProps {
  readonly element: RefObject<SVGSVGElement | null>;
  readonly layout: SheetLayout;
  readonly setView: Dispatch<SetStateAction<SheetView>>;
  readonly fit: () => void;
}

/**
 * The gestures on the sheet: wheel and pinch zoom about the pointer; a drag on empty paper, with the middle button or
 * with the space bar held pans; a double click fits. One finger up or down is left to the page, which scrolls.
 * Shows nothing; it is a component so that its listeners stay while the sheet is drawn anew. The sheet carries
 * `data-panning` while the paper is moved, or would be by the next drag.
 */
export const SheetGestures = memo(function SheetGestures({
  element,
  layout,
  setView,
  fit,
}: SheetGesturesProps) {
  const space = useSpaceKey();
  const { scale } = layout;
  const [panning, setPanning] = useState(false);
  useGesture(
    {
      onDrag: ({ delta: [dx, dy], movement, event, first, last, pinching, cancel, tap }) => {
        if (pinching || (first && (!pansFrom(event, space) || scrolls(event, movement)))) {
          cancel();
          return;
        }
        if (first) setPanning(true);
        if (!tap) setView((before) => panBy(before, layout, dx / scale, dy / scale));
        if (last) setPanning(false);
      },
      onDragEnd: () => {
        setPanning(false);
      },
      onWheel: ({ event, delta: [, dy] }) => {
        event.preventDefault();
        const pixel = pixelOf(element, event.clientX, event.clientY, scale);
        setView((before) => zoomAbout(before, layout, pixel, wheelFactor(event, dy)));
      },
      onPinch: ({ origin: [x, y], offset: [spread], memo, event, first }) => {
        event.preventDefault();
        const last = first ? { spread, x, y } : (memo as PinchMemo);
        const pixel = pixelOf(element, x, y, scale);
        setView((before) =>
          zoomAbout(
            panBy(before, layout, (x - last.x) / scale, (y - last.y) / scale),
            layout,
            pixel,
            spread / last.spread,
          ),
        );
        return { spread, x, y } satisfies PinchMemo;
      },
      onDoubleClick: ({ event }) => {
        if (isPaper(event.target)) fit();
      },
    },
    {
      target: element,
      eventOptions: { passive: false },
      drag: { pointer: { keys: false, buttons: [1, 4] }, filterTaps: true },
      pinch: { scaleBounds: { min: 1e-3, max: 1e3 } },
    },
  );
  const shown = panning || space;
  useEffect(() => {
    element.current?.toggleAttribute('data-panning', shown);
  }, [element, shown]);
  return null;
});

function wheelFactor({ deltaMode }: WheelEvent, dy: number): number {
  return Math.exp(-dy * WHEEL_STEP * (deltaMode === WheelEvent.DOM_DELTA_LINE ? LINE_PIXELS : 1));
}

/** Is the space bar held down outside of fields, buttons and handles? */
function useSpaceKey(): boolean {
  const [held, setHeld] = useState(false);
  useEffect(() => {
    const down = (event: KeyboardEvent) => {
      if (
        event.key !== ' ' ||
        event.defaultPrevented ||
        event.ctrlKey ||
        event.metaKey ||
        takesSpace(event.target)
      )
        return;
      event.preventDefault();
      setHeld(true);
    };
    const up = (event: KeyboardEvent) => {
      if (event.key === ' ') setHeld(false);
    };
    const away = () => {
      setHeld(false);
    };
    window.addEventListener('keydown', down);
    window.addEventListener('keyup', up);
    window.addEventListener('blur', away);
    return () => {
      window.removeEventListener('keydown', down);
      window.removeEventListener('keyup', up);
      window.removeEventListener('blur', away);
    };
  }, []);
  return held;
}

function takesSpace(target: EventTarget | null): boolean {
  const takers =
    'input, textarea, select, button, a, summary, dialog, [role="button"], [role="switch"], [role="slider"]';
  return target instanceof Element && target.closest(takers) !== null;
}

const MIDDLE_BUTTON = 4;

function pansFrom(event: Event, space: boolean): boolean {
  return space || (event instanceof MouseEvent && event.buttons === MIDDLE_BUTTON) || isPaper(event.target);
}

/** One finger up or down: the page's own, from its first pixel. */
function scrolls(event: Event, [x, y]: readonly [number, number]): boolean {
  return event instanceof PointerEvent && event.pointerType === 'touch' && Math.abs(y) > Math.abs(x);
}

/** Empty paper: neither a handle nor a dimension that can be pressed. */
function isPaper(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('[data-handle], [role="button"]') === null;
}

/** The pixel of the sheet under a place of the window. */
function pixelOf(
  element: RefObject<SVGSVGElement | null>,
  x: number,
  y: number,
  scale: number,
): { x: number; y: number } {
  const box = element.current?.getBoundingClientRect();
  return { x: (x - (box?.left ?? 0)) / scale, y: (y - (box?.top ?? 0)) / scale };
}
