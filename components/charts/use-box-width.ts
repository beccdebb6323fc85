'use client';

import { type RefObject, useEffect, useRef, useState } from 'react';

/** The width drawn for before the page knows its own: on the server, and in print. */
const FIRST_PX = 720;
const LEAST_PX = 280;

interface MeasuredBox {
  box: RefObject<HTMLDivElement | null>;
  /** Whole CSS pixels. */
  width: number;
}

/** How wide a box is, so that a drawing in it can keep its letters at their size. */
export function useBoxWidth(): MeasuredBox {
  const box = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(FIRST_PX);
  useEffect(() => {
    const element = box.current;
    if (!element) return;
    const watcher = new ResizeObserver(([entry]) => {
      const measured = Math.floor(entry?.contentRect.width ?? 0);
      if (measured > 0) setWidth(Math.max(LEAST_PX, measured));
    });
    watcher.observe(element);
    return () => watcher.disconnect();
  }, []);
  return { box, width };
}
