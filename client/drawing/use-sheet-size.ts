import { type RefObject, useLayoutEffect, useRef, useState } from 'react';

export interface Size {
  readonly width: number;
  readonly height: number;
  /** How much larger than 16 px the text of the page is: the sheet is drawn larger by as much. */
  readonly scale: number;
}

/** No scale is taken that would leave the sheet narrower than this, in its own pixels. */
const NARROWEST = 320;

/** The size of an element in CSS pixels, kept up to date; `first` until it has been measured. */
export function useSize<Element extends HTMLElement>(
  first: Size,
): readonly [RefObject<Element | null>, Size] {
  const element = useRef<Element>(null);
  const [size, setSize] = useState(first);
  useLayoutEffect(() => {
    const { current } = element;
    if (!current) return;
    const take = (width: number, height: number) => {
      if (width > 0 && height > 0) {
        const scale = Math.max(1, Math.min(rootScale(), width / NARROWEST));
        setSize((before) =>
          before.width === width && before.height === height && before.scale === scale
            ? before
            : { width, height, scale },
        );
      }
    };
    take(current.clientWidth, current.clientHeight);
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => {
      take(current.clientWidth, current.clientHeight);
    });
    observer.observe(current);
    return () => {
      observer.disconnect();
    };
  }, []);
  return [element, size];
}

/** Size of the root's text over the usual 16 px: grows on very large screens and with the person's own setting. */
function rootScale(): number {
  const pixels = Number.parseFloat(getComputedStyle(document.documentElement).fontSize);
  return Number.isFinite(pixels) ? pixels / 16 : 1;
}
