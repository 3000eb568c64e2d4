import { type RefObject, useLayoutEffect, useRef, useState } from 'react';

export interface Size {
  readonly width: number;
  readonly height: number;
}

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
        setSize((before) =>
          before.width === width && before.height === height ? before : { width, height },
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
